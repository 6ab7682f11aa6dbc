//! How long a star's life takes to compute and to ask.

#![expect(clippy::expect_used, reason = "a measurement that cannot start has failed")]

use criterion::{Criterion, criterion_group, criterion_main};
use longember::physics::star::{StarInput, Track};
use std::hint::black_box;

fn life(mass_msun: f64) -> Track {
    Track::compute(StarInput { mass_msun, metallicity_dex: 0.0 }).expect("in range")
}

/// Ages spread evenly over the logarithm, the same in every run.
fn ages() -> Vec<f64> {
    let mut place = 0.37_f64;
    (0..4096)
        .map(|_| {
            place = (place * 7.13 + 0.11).fract();
            10.0_f64.powf(6.0 + 8.0 * place)
        })
        .collect()
}

fn star(c: &mut Criterion) {
    for mass in [1.0, 5.0, 25.0] {
        c.bench_function(&format!("whole life of {mass} solar masses"), |b| b.iter(|| life(black_box(mass))));
    }
    let (track, ages) = (life(1.0), ages());
    let mut index = 0;
    c.bench_function("state at a random age", |b| {
        b.iter(|| {
            index = (index + 1) % ages.len();
            track.state_at(black_box(ages[index]))
        });
    });
}

criterion_group!(benches, star);
criterion_main!(benches);
