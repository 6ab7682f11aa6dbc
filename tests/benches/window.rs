//! From an edit to redrawn curves, and one frame of the window's logic, both without a display.

#![expect(clippy::expect_used, reason = "a measurement that cannot start has failed")]

use criterion::{Criterion, criterion_group, criterion_main};
use longember::document::built_in;
use longember::figure::curves::Curve;
use longember::figure::{Samples, ribbon::LightRange, ribbon::Ribbon};
use longember::system::{History, PlanetSpecification, TimeAxis, TimeScale, Water};
use longember::window::software::Canvas;
use longember::window::{Command, Edit, Longember};
use std::hint::black_box;
use std::ops::ControlFlow;

/// Places at which the window reads a view.
const PLACES: usize = 700;

/// The whole way from a changed scenario to what the curves page draws, with five planets.
fn edit_to_curves(criterion: &mut Criterion) {
    let scenario = built_in::demo().scenario().expect("the demo is sound");
    criterion.bench_function("edit to curves, five planets", |bencher| {
        bencher.iter(|| {
            let history = History::compute(black_box(scenario.system.clone())).expect("the demo can be computed");
            let axis = TimeAxis::new(&history, TimeScale::Paced);
            let samples = Samples::new(&history, &axis, 0.0, 1.0, PLACES);
            let ribbon = Ribbon::new(&samples, LightRange::of(&samples));
            let charts: Vec<_> = Curve::ALL.iter().map(|curve| curve.chart(&samples)).collect();
            (ribbon, charts)
        });
    });
    let many = {
        let mut system = scenario.system.clone();
        let pattern = system.planets.clone();
        system.planets = (0..20)
            .map(|index| PlanetSpecification {
                name: format!("Planet {index}"),
                semi_major_axis_au: 0.3 * 1.25_f64.powi(index),
                water: Some(Water::default()),
                ..pattern[2].clone()
            })
            .collect();
        system
    };
    criterion.bench_function("whole history, twenty planets with seas", |bencher| {
        bencher.iter(|| History::compute(black_box(many.clone())));
    });
    for (name, system) in [("five planets", scenario.system.clone()), ("twenty planets with seas", many)] {
        let earlier = History::compute(system.clone()).expect("it can be computed");
        let mut step = 0_u32;
        criterion.bench_function(&format!("edit of one planet to curves, {name}"), |bencher| {
            bencher.iter(|| {
                step = (step + 1) % 100;
                let mut edited = system.clone();
                edited.planets[2].mass_mearth *= 1.0 + 0.001 * f64::from(step);
                let go_on = &mut |_: f64| ControlFlow::Continue(());
                let history = History::compute_after(Some(&earlier), edited, go_on).expect("it can be computed");
                let axis = TimeAxis::new(&history, TimeScale::Paced);
                let samples = Samples::new(&history, &axis, 0.0, 1.0, PLACES);
                let ribbon = Ribbon::new(&samples, LightRange::of(&samples));
                let charts: Vec<_> = Curve::ALL.iter().map(|curve| curve.chart(&samples)).collect();
                (ribbon, charts)
            });
        });
    }
    criterion.bench_function("whole history, five planets", |bencher| {
        bencher.iter(|| History::compute(black_box(scenario.system.clone())));
    });
}

/// Layout and shapes of one frame while the moment is dragged along the strip.
fn one_frame(criterion: &mut Criterion) {
    let context = egui::Context::default();
    let scenario = built_in::demo().scenario().expect("the demo is sound");
    let mut program = Longember::for_tests(&context, scenario).expect("the demo can be computed");
    let input = || egui::RawInput {
        screen_rect: Some(egui::Rect::from_min_size(egui::Pos2::ZERO, egui::vec2(1280.0, 800.0))),
        ..egui::RawInput::default()
    };
    let end_yr = program.workspace.history.shown_until_yr();
    let mut step = 0_u32;
    criterion.bench_function("one frame of the window's logic, 1280 x 800", |bencher| {
        bencher.iter(|| {
            step = (step + 1) % 1000;
            program.workspace.moment_yr = end_yr * f64::from(step) / 1000.0;
            let output = context.run_ui(input(), |ui| program.root_ui(ui));
            black_box(context.tessellate(output.shapes.clone(), 1.0));
            output.drop_without_applying_deltas();
        });
    });
}

/// A whole frame as it reaches the screen without OpenGL, up to the pixels, while the moment is dragged along the strip.
fn one_painted_frame(criterion: &mut Criterion) {
    const SIZE: [usize; 2] = [1280, 800];
    let context = egui::Context::default();
    let scenario = built_in::demo().scenario().expect("the demo is sound");
    let mut program = Longember::for_tests(&context, scenario).expect("the demo can be computed");
    let input = || egui::RawInput {
        screen_rect: Some(egui::Rect::from_min_size(egui::Pos2::ZERO, egui::vec2(SIZE[0] as f32, SIZE[1] as f32))),
        ..egui::RawInput::default()
    };
    let end_yr = program.workspace.history.shown_until_yr();
    let mut canvas = Canvas::default();
    let mut step = 0_u32;
    let mut frame = || {
        step = (step + 1) % 1000;
        program.workspace.moment_yr = end_yr * f64::from(step) / 1000.0;
        let mut output = context.run_ui(input(), |ui| program.root_ui(ui));
        let primitives = context.tessellate(output.shapes, output.pixels_per_point);
        let ground = program.workspace.palette().ground;
        canvas.paint(SIZE, output.pixels_per_point, ground, &primitives, &mut output.textures_delta);
        canvas.pixels()[SIZE[0] * SIZE[1] / 2]
    };
    criterion.bench_function("one whole frame on the processor, 1280 x 800", |bencher| bencher.iter(&mut frame));
}

/// One frame right after an edit of one of twenty planets with seas: the edit, and a frame while it is computed elsewhere.
fn frame_of_an_edit(criterion: &mut Criterion) {
    let context = egui::Context::default();
    let mut scenario = built_in::demo().scenario().expect("the demo is sound");
    scenario.system.planets = (0..20)
        .map(|index| PlanetSpecification {
            name: format!("Planet {index}"),
            semi_major_axis_au: 0.3 * 1.25_f64.powi(index),
            water: Some(Water::default()),
            ..PlanetSpecification::default()
        })
        .collect();
    let mut program = Longember::for_tests(&context, scenario.clone()).expect("it can be computed");
    let mut step = 0_u32;
    criterion.bench_function("edit of one of twenty planets and the frame after it", |bencher| {
        bencher.iter(|| {
            step = (step + 1) % 1000;
            scenario.system.planets[7].mass_mearth = 1.0 + 0.001 * f64::from(step);
            let edit = Edit { label: "Change".to_owned(), scenario: Box::new(scenario.clone()) };
            program.perform(&context, Command::Edit(edit));
            let input = egui::RawInput {
                screen_rect: Some(egui::Rect::from_min_size(egui::Pos2::ZERO, egui::vec2(1280.0, 800.0))),
                ..egui::RawInput::default()
            };
            let output = context.run_ui(input, |ui| program.root_ui(ui));
            black_box(context.tessellate(output.shapes.clone(), 1.0));
            output.drop_without_applying_deltas();
        });
    });
}

criterion_group!(benches, edit_to_curves, one_frame, one_painted_frame, frame_of_an_edit);
criterion_main!(benches);
