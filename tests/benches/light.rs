//! How long a colour, a correlated temperature and a sky take.

use criterion::{Criterion, criterion_group, criterion_main};
use longember::physics::light::{
    Atmosphere, SkyScene, WHITE_D65, blackbody_swatch, correlated_temperature, measured_dwarf_colour, sky,
    visual_photometry,
};
use std::hint::black_box;

fn light(criterion: &mut Criterion) {
    // Different temperatures, so that neither branch prediction nor a cached answer flatters the figure.
    let temperatures_k: Vec<f64> = (0..1024).map(|step| 800.0 * 1.0054_f64.powi(step)).collect();
    let mut next = 0;
    criterion.bench_function("blackbody to sRGB", |bencher| {
        bencher.iter(|| {
            next = (next + 389) % temperatures_k.len();
            blackbody_swatch(black_box(temperatures_k[next]))
        });
    });
    criterion.bench_function("correlated temperature", |bencher| {
        bencher.iter(|| correlated_temperature(black_box(WHITE_D65)));
    });
    criterion.bench_function("measured dwarf colour", |bencher| {
        bencher.iter(|| measured_dwarf_colour(black_box(3210.0)));
    });
    criterion.bench_function("visual photometry", |bencher| {
        bencher.iter(|| visual_photometry(black_box(5772.0), black_box(4.4)));
    });
    let scene = SkyScene {
        star_temperature_k: 4000.0,
        irradiance_w_m2: 1000.0,
        altitude_deg: 30.0,
        atmosphere: Atmosphere::EARTH,
    };
    criterion.bench_function("clear sky", |bencher| bencher.iter(|| sky(black_box(&scene))));
}

criterion_group!(benches, light);
criterion_main!(benches);
