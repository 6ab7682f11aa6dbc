//! How long a colour, a correlated temperature, a sky and a whole track of them take.

use criterion::{Criterion, criterion_group, criterion_main};
use longember::physics::light::{
    Atmosphere, ClearAir, SkyScene, VisibleSpectrum, WHITE_D65, blackbody_swatch, correlated_temperature,
    measured_dwarf_colour, screen_colour, sky, visual_photometry,
};
use std::hint::black_box;

/// Nodes of a long track.
const NODES: i32 = 2000;
/// Planets whose skies are wanted at every node.
const PLANETS: i32 = 5;

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

fn track(criterion: &mut Criterion) {
    // From a white dwarf's glare down to an ember, as a long track runs through them.
    let temperatures_k: Vec<f64> = (0..NODES).map(|node| 900.0 * 1.0023_f64.powi((node * 389) % NODES)).collect();
    let airs: Vec<Atmosphere> = (0..PLANETS)
        .map(|planet| Atmosphere { surface_pressure_bar: 0.1 * 3.0_f64.powi(planet), ..Atmosphere::EARTH })
        .collect();
    criterion.bench_function("colour of a 2000-node track with sky for five planets", |bencher| {
        bencher.iter(|| {
            let airs: Vec<_> = airs.iter().filter_map(|air| ClearAir::new(air, 30.0).ok()).collect();
            let mut shown = 0_u32;
            for temperature_k in black_box(&temperatures_k) {
                let swatch = blackbody_swatch(*temperature_k);
                let Ok(spectrum) = VisibleSpectrum::of_blackbody(*temperature_k) else { continue };
                shown += u32::from(swatch.srgb[1]);
                for air in &airs {
                    let colour = air.sky(&spectrum, 1000.0).ok().and_then(|sky| screen_colour(sky.dome));
                    shown += colour.map_or(0, |colour| u32::from(colour.srgb[1]));
                }
            }
            shown
        });
    });
}

criterion_group!(benches, light, track);
criterion_main!(benches);
