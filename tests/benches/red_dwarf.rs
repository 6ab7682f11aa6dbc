//! How long a red dwarf's whole life takes to compute.

use criterion::{Criterion, criterion_group, criterion_main};
use longember::physics::star::convective::{ConvectiveInput, Options, Resolution, SurfaceOpacity, compute_with};
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

criterion_group!(benches, lives);
criterion_main!(benches);
