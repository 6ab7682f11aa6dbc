//! How long a red dwarf's whole life takes to compute, and what it is made of: gas, opacity, structures.

use criterion::{Criterion, Throughput, criterion_group, criterion_main};
use longember::physics::star::convective::{
    ConvectiveInput, Options, Resolution, StarMatter, SurfaceOpacity, YoungStar, compute_with,
};
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

/// Density (g cm⁻³) and temperature (K) met in a red dwarf's life: photospheres, envelopes, burning cores, white dwarfs.
const MET: [[f64; 2]; 12] = [
    [1e-5, 2800.0],
    [1e-5, 4500.0],
    [1e-3, 6000.0],
    [1e-7, 9000.0],
    [0.1, 3e4],
    [1.0, 1e5],
    [10.0, 4e5],
    [150.0, 1.57e7],
    [400.0, 4.57e6],
    [1e3, 1e5],
    [3e4, 1e6],
    [1e5, 1e4],
];

/// The three pieces of which every step is made; each with its slopes, as the solver asks for them.
fn pieces(criterion: &mut Criterion) {
    let input = ConvectiveInput { mass_msun: 0.10, metallicity_dex: 0.0 };
    let (Ok(matter), Ok(star)) =
        (StarMatter::new(input, SurfaceOpacity::Modern), YoungStar::new(input, Options::default()))
    else {
        return;
    };
    // The solver starts each search from the last structure: a state some per cent away.
    let similar =
        MET.map(|[density_g_cm3, temperature_k]| matter.gas(1.02 * density_g_cm3, 0.99 * temperature_k, None));
    let states: Vec<_> =
        MET.iter().filter_map(|[density, temperature]| matter.gas(*density, *temperature, None)).collect();
    assert_eq!(states.len(), MET.len(), "every state has its gas");
    let mut group = criterion.benchmark_group("red dwarf, pieces");
    group.throughput(Throughput::Elements(MET.len() as u64));
    group.bench_function("equation of state, 12 states", |bencher| {
        bencher.iter(|| {
            for ([density_g_cm3, temperature_k], similar) in black_box(MET).into_iter().zip(&similar) {
                black_box(matter.gas(density_g_cm3, temperature_k, similar.as_ref()));
            }
        });
    });
    group.bench_function("opacity, 12 states", |bencher| {
        bencher.iter(|| {
            for state in black_box(&states) {
                black_box(matter.opacity_cm2_g(state));
            }
        });
    });
    group.throughput(Throughput::Elements(1));
    let corrections = star.step_corrections().unwrap_or(0);
    let label =
        format!("one step, two structures of {} shells, corrected {corrections} times in the second", star.shells());
    group.bench_function(label, |bencher| bencher.iter(|| black_box(&star).step_corrections()));
    group.finish();
}

criterion_group!(benches, pieces, lives, quick_looks, moments);
criterion_main!(benches);
