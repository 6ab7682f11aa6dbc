//! How long planets take: a whole life with climate, one moment, one climate curve.

#[path = "../invariants/planet_track.rs"]
mod planet_track;

use criterion::{Criterion, criterion_group, criterion_main};
use longember::physics::planet::climate::{ClimateCurve, ClimateTables, IceLineModel, WaterWorldAir};
use longember::physics::planet::{CarbonCycle, OrbitInput, PlanetHistory, PlanetInput, WaterWorld};
use std::hint::black_box;

fn planet(semi_major_axis_au: f64, carbon: CarbonCycle) -> PlanetInput {
    let orbit = OrbitInput { semi_major_axis_au, eccentricity: 0.0167, mass_mearth: 1.0, radius_rearth: 1.0 };
    PlanetInput { water: Some(WaterWorld { carbon, ..WaterWorld::default() }), ..PlanetInput::usual(orbit) }
}

fn lives(criterion: &mut Criterion) {
    let track = planet_track::sun_like(2000);
    for (name, a_au) in [("venus", 0.723), ("earth", 1.0), ("mars", 1.524), ("jupiter_moon", 5.2)] {
        for carbon in [CarbonCycle::default(), CarbonCycle::Held] {
            let input = planet(a_au, carbon);
            criterion.bench_function(&format!("life_{name}_{}", carbon.key()), |bencher| {
                bencher.iter(|| PlanetHistory::walk(black_box(&input), black_box(&track)));
            });
        }
    }
}

/// A planet's whole history with its thresholds worked out first, and with thresholds known from an earlier one.
fn with_thresholds(criterion: &mut Criterion) {
    let track = planet_track::sun_like(2000);
    for carbon in [CarbonCycle::default(), CarbonCycle::Held] {
        let input = planet(1.0, carbon);
        criterion.bench_function(&format!("climate history, cold, {}", carbon.key()), |bencher| {
            bencher.iter(|| PlanetHistory::walk(black_box(&input), black_box(&track)));
        });
        let mut tables = ClimateTables::default();
        let Ok(_) = PlanetHistory::walk_with(&input, &track, &mut tables) else { return };
        criterion.bench_function(&format!("climate history, thresholds known, {}", carbon.key()), |bencher| {
            bencher.iter(|| PlanetHistory::walk_with(black_box(&input), black_box(&track), &mut tables));
        });
    }
}

fn other_stars(criterion: &mut Criterion) {
    for (name, track, a_au) in
        [("red_dwarf", planet_track::red_dwarf(2000), 0.05), ("supernova", planet_track::exploding(2000), 50.0)]
    {
        let input = planet(a_au, CarbonCycle::default());
        criterion.bench_function(&format!("life_{name}"), |bencher| {
            bencher.iter(|| PlanetHistory::walk(black_box(&input), black_box(&track)));
        });
    }
}

fn moments(criterion: &mut Criterion) {
    let track = planet_track::sun_like(2000);
    for carbon in [CarbonCycle::default(), CarbonCycle::Held] {
        let Ok(history) = PlanetHistory::walk(&planet(1.0, carbon), &track) else { return };
        let star = track[500];
        criterion.bench_function(&format!("moment_{}", carbon.key()), |bencher| {
            bencher.iter(|| history.at(black_box(&star)));
        });
    }
    let Ok(model) = IceLineModel::new(&WaterWorldAir::default(), 5772.0) else { return };
    criterion.bench_function("one equilibrium", |bencher| {
        bencher.iter(|| model.from_warm(black_box(1.0)));
    });
    criterion.bench_function("climate_curve", |bencher| {
        bencher.iter(|| ClimateCurve::follow(black_box(&model), 1.2));
    });
}

criterion_group!(planets, lives, with_thresholds, other_stars, moments);
criterion_main!(planets);
