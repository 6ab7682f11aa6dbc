//! How long a red dwarf's whole life takes to compute.

use criterion::{Criterion, criterion_group, criterion_main};
use longember::physics::star::convective::{ConvectiveInput, Options, Resolution, SurfaceOpacity, compute_with};
use longember::physics::star::{LifeOptions, StarInput, WholeLife};
use std::hint::black_box;
use std::ops::ControlFlow;

fn lives(criterion: &mut Criterion) {
    let mut group = criterion.benchmark_group("red dwarf, whole life");
    group.sample_size(10);
    for (label, mass_msun, resolution) in [
        ("0.10 coarse", 0.10, Resolution::Coarse),
        ("0.10", 0.10, Resolution::Standard),
        ("0.16", 0.16, Resolution::Standard),
        ("0.20", 0.20, Resolution::Standard),
    ] {
        let options = Options { resolution, surface: SurfaceOpacity::Modern };
        group.bench_function(label, |bencher| {
            bencher.iter(|| {
                let input = black_box(ConvectiveInput { mass_msun, metallicity_dex: 0.0 });
                compute_with(input, options, &mut |_| ControlFlow::Continue(()))
            });
        });
    }
    group.finish();
}

fn quick_looks(criterion: &mut Criterion) {
    let mut group = criterion.benchmark_group("red dwarf, quick look");
    for (label, mass_msun, metallicity_dex) in
        [("0.127", 0.127, 0.0), ("0.27, metal-poor", 0.27, -0.7), ("0.45", 0.45, 0.0)]
    {
        group.bench_function(label, |bencher| {
            bencher.iter(|| {
                WholeLife::quick_look(black_box(StarInput { mass_msun, metallicity_dex }), LifeOptions::default())
            });
        });
    }
    group.finish();
}

fn moments(criterion: &mut Criterion) {
    let input = StarInput { mass_msun: 0.16, metallicity_dex: 0.0 };
    let Some(life) = WholeLife::quick_look(input, LifeOptions::default()) else { return };
    criterion.bench_function("red dwarf, state at an age", |bencher| {
        bencher.iter(|| life.state_at(black_box(1.88e12)));
    });
}

criterion_group!(benches, lives, quick_looks, moments);
criterion_main!(benches);
