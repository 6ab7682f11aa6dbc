//! What a person sees: every page in every theme, painted by the processor and looked at pixel by pixel.
//!
//! No picture is kept to compare with: a page is compared with itself at twice the scale, and with what its theme says.

use crate::driver::Driver;
use egui::epaint::{FontsView, ImageDelta};
use egui::{TextureId, TextureOptions, TexturesDelta, Vec2, vec2};
use longember::document::{Scenario, Theme, built_in};
use longember::window::software::Canvas;
use longember::window::{Command, Page, contrast};
use std::collections::HashSet;

/// The smallest window that is still whole, points.
const SIZE: Vec2 = vec2(960.0, 600.0);

fn scenario() -> Scenario {
    built_in::demo().scenario().expect("sound")
}

/// Paints the frame that the window shows after one more step.
fn painted(driver: &mut Driver, canvas: &mut Canvas, scale: f32) {
    driver.harness.step();
    let output = driver.harness.output();
    let ground = driver.workspace().palette().ground;
    let primitives = driver.harness.ctx.tessellate(output.shapes.clone(), output.pixels_per_point);
    let pixels = [(SIZE.x * scale) as usize, (SIZE.y * scale) as usize];
    // The window uses no texture but the letters; their changes in earlier frames are gone, the whole is not.
    let letters = driver.harness.ctx.fonts(|fonts: &FontsView<'_>| fonts.image());
    let mut textures = TexturesDelta::default();
    let whole = ImageDelta::full(letters, TextureOptions::LINEAR);
    textures.set.insert(TextureId::default(), std::iter::once(whole).collect());
    canvas.paint(pixels, output.pixels_per_point, ground, &primitives, &mut textures);
}

fn channels(pixel: u32) -> [f32; 3] {
    [16, 8, 0].map(|shift| ((pixel >> shift) & 255) as f32)
}

/// A picture of twice the scale, each pixel the mean of four.
fn halved(canvas: &Canvas) -> Vec<[f32; 3]> {
    let [width, height] = canvas.size();
    let pixel = |x: usize, y: usize| channels(canvas.pixels()[y * width + x]);
    let mean = |x: usize, y: usize| {
        let four = [pixel(x, y), pixel(x + 1, y), pixel(x, y + 1), pixel(x + 1, y + 1)];
        std::array::from_fn(|channel| four.iter().map(|pixel| pixel[channel]).sum::<f32>() / 4.0)
    };
    (0..height / 2).flat_map(|y| (0..width / 2).map(move |x| (2 * x, 2 * y))).map(|(x, y)| mean(x, y)).collect()
}

/// A blur over nine pixels: letters and lines of text are set a little differently at another scale.
fn blurred(picture: &[[f32; 3]], width: usize) -> Vec<[f32; 3]> {
    let height = picture.len() / width;
    let at = |x: usize, y: usize| {
        let columns = x.saturating_sub(4)..(x + 5).min(width);
        let rows = y.saturating_sub(4)..(y + 5).min(height);
        let mut sum = [0.0; 3];
        let mut count = 0.0;
        for row in rows {
            for column in columns.clone() {
                for (total, channel) in sum.iter_mut().zip(picture[row * width + column]) {
                    *total += channel;
                }
                count += 1.0;
            }
        }
        sum.map(|total| total / count)
    };
    (0..height).step_by(4).flat_map(|y| (0..width).step_by(4).map(move |x| (x, y))).map(|(x, y)| at(x, y)).collect()
}

#[test]
fn every_page_is_seen_in_every_theme_and_looks_alike_at_twice_the_scale() {
    let mut drivers = [1.0, 2.0].map(|scale| (Driver::sized(scenario(), SIZE, scale), Canvas::default(), scale));
    for theme in Theme::ALL {
        for page in Page::ALL {
            let mut pictures = Vec::new();
            for (driver, canvas, scale) in &mut drivers {
                driver.tell(Command::SetTheme(theme));
                driver.tell(Command::ShowPage(page));
                driver.harness.remove_cursor();
                driver.harness.run_steps(3);
                painted(driver, canvas, *scale);
                let ground = driver.workspace().palette().ground;
                let is_ground = |pixel: &u32| channels(*pixel) == [ground.r(), ground.g(), ground.b()].map(f32::from);
                let share = canvas.pixels().iter().filter(|pixel| is_ground(pixel)).count() as f32
                    / canvas.pixels().len() as f32;
                assert!((0.02..0.75).contains(&share), "{theme:?}, {page:?}: {share} of the window is bare ground");
                let colours: HashSet<u32> = canvas.pixels().iter().copied().collect();
                assert!(colours.len() > 60, "{theme:?}, {page:?}: only {} colours", colours.len());
                let strongest = colours.iter().map(|colour| {
                    let [r, g, b] = channels(*colour).map(|channel| channel as u8);
                    contrast(egui::Color32::from_rgb(r, g, b), ground)
                });
                assert!(strongest.fold(0.0, f32::max) > 4.5, "{theme:?}, {page:?}: nothing can be read");
                pictures.push(if *scale > 1.5 {
                    halved(canvas)
                } else {
                    canvas.pixels().iter().map(|pixel| channels(*pixel)).collect()
                });
            }
            let [once, twice] = [0, 1].map(|index| blurred(&pictures[index], SIZE.x as usize));
            let differences = once.iter().zip(&twice).map(|(first, second)| {
                first.iter().zip(second).map(|(first, second)| (first - second).abs()).fold(0.0, f32::max)
            });
            let far_off = differences.filter(|difference| *difference > 40.0).count() as f32 / once.len() as f32;
            assert!(far_off < 0.04, "{theme:?}, {page:?}: {far_off} of the window differs between the scales");
        }
    }
}

#[test]
fn the_same_window_is_painted_the_same() {
    let pictures = [0, 1].map(|_| {
        let (mut driver, mut canvas) = (Driver::sized(scenario(), SIZE, 1.0), Canvas::default());
        driver.harness.remove_cursor();
        painted(&mut driver, &mut canvas, 1.0);
        canvas.rgb()
    });
    assert!(pictures[0].iter().collect::<HashSet<_>>().len() > 30, "something is painted");
    assert!(pictures[0] == pictures[1], "two runs of one window differ");
}
