//! Follows red dwarfs of every mass and metallicity through their whole lives and looks whether each is sound.
//!
//! ```text
//! cargo run --release --example red_dwarf_sweep
//! cargo run --release --example red_dwarf_sweep -- 0.10 0.20
//! ```
//!
//! Masses 0.07 to 0.45 (or between the two that are named), [Fe/H] −1.2 to +0.2, both surfaces: some 300 lives, about
//! twenty minutes of one core. One line a star; fails if any life is not followed to the black dwarf within a bounded
//! number of steps, or holds a number that cannot be.

use longember::physics::star::convective::{
    ConvectiveError, ConvectiveInput, Ending, Life, Options, Resolution, SurfaceOpacity, compute_with,
};
use std::io::Write;
use std::ops::ControlFlow;
use std::process::ExitCode;

/// Masses between which the sweep steps, solar masses, and its step.
const MASSES_MSUN: [f64; 2] = [0.07, 0.45];
const MASS_STEP_MSUN: f64 = 0.013;
/// Metallicities, dex.
const METALLICITIES_DEX: [f64; 5] = [-1.2, -0.8, -0.4, 0.0, 0.2];
/// Steps after which a life counts as hung.
const MOST_STEPS: usize = 4000;

fn main() -> ExitCode {
    let mut asked = std::env::args().skip(1).map(|argument| argument.parse::<f64>());
    let (least, most) = match (asked.next(), asked.next()) {
        (None, None) => (MASSES_MSUN[0], MASSES_MSUN[1]),
        (Some(Ok(least)), Some(Ok(most))) if least <= most => (least, most),
        _ => {
            say("name no masses or two, the smaller first, such as 0.10 0.20");
            return ExitCode::from(2);
        }
    };
    let (mut count, mut failures) = (0, 0);
    for surface in [SurfaceOpacity::Modern, SurfaceOpacity::Of1997] {
        for metallicity_dex in METALLICITIES_DEX {
            for mass_msun in masses(least, most) {
                count += 1;
                let input = ConvectiveInput { mass_msun, metallicity_dex };
                match followed(input, surface) {
                    Ok(words) => say(&format!("{mass_msun:.3} {metallicity_dex:+.1} {surface:?}: {words}")),
                    Err(words) => {
                        failures += 1;
                        say(&format!("{mass_msun:.3} {metallicity_dex:+.1} {surface:?}: FAILED, {words}"));
                    }
                }
            }
        }
    }
    say(&format!("{count} stars, {failures} failures"));
    if failures == 0 { ExitCode::SUCCESS } else { ExitCode::FAILURE }
}

fn masses(least: f64, most: f64) -> impl Iterator<Item = f64> {
    let steps = ((most - least) / MASS_STEP_MSUN).ceil().max(0.0) as usize;
    (0..=steps).map(move |step| (least + MASS_STEP_MSUN * step as f64).min(most))
}

/// One life in a few words, or what is wrong with it.
fn followed(input: ConvectiveInput, surface: SurfaceOpacity) -> Result<String, String> {
    let options = Options { resolution: Resolution::Standard, surface };
    let mut steps = 0;
    let mut count = |_: f64| {
        steps += 1;
        if steps > MOST_STEPS { ControlFlow::Break(()) } else { ControlFlow::Continue(()) }
    };
    let life = match compute_with(input, options, &mut count) {
        Ok(life) => life,
        Err(ConvectiveError::BrownDwarf { .. }) => return Ok(format!("brown dwarf after {steps} steps")),
        Err(ConvectiveError::Cancelled) => return Err(format!("not done after {MOST_STEPS} steps")),
        Err(error) => return Err(error.to_string()),
    };
    if life.ending != Ending::BlackDwarf {
        return Err(format!("given up as a giant after {steps} steps"));
    }
    unsound(&life).map_or_else(|| Ok(summary(&life, steps)), Err)
}

fn summary(life: &Life, steps: usize) -> String {
    let spent = life.nodes.iter().find(|node| node.core_hydrogen_fraction < 0.01).map_or(0.0, |node| node.age_yr);
    let largest = life.nodes.iter().filter(|node| node.age_yr > 0.0).map(|node| node.radius_rsun).fold(0.0, f64::max);
    let end = life.nodes.last().map_or(0.0, |node| node.mass_msun);
    format!("{steps} steps, core spent at {spent:.3e} yr, largest {largest:.2} R, white dwarf of {end:.3} M")
}

/// The first thing that cannot be, if there is any.
fn unsound(life: &Life) -> Option<String> {
    for node in &life.nodes {
        let positive = [
            node.mass_msun,
            node.luminosity_lsun,
            node.radius_rsun,
            node.effective_temperature_k,
            node.core_temperature_k,
            node.core_density_g_cm3,
            node.core_degeneracy_ratio(),
        ];
        let shares = [node.core_hydrogen_fraction, node.mean_hydrogen_fraction, node.still_core_mass_fraction];
        let is_sound = node.age_yr.is_finite()
            && positive.iter().all(|value| value.is_finite() && *value > 0.0)
            && shares.iter().all(|share| (0.0..=1.0).contains(share));
        if !is_sound {
            return Some(format!("{node:?}"));
        }
    }
    let layers = || life.profiles.iter().flat_map(|profile| &profile.layers);
    if !layers().all(|layer| layer.temperature_k > 0.0 && layer.pressure_bar.is_finite()) {
        return Some("a layer without temperature or pressure".to_owned());
    }
    let turned = life.nodes.windows(2).find(|pair| pair[1].age_yr <= pair[0].age_yr);
    turned.map(|pair| format!("age stands still at {:e} yr", pair[0].age_yr))
}

/// Writes a line; nothing is lost when nobody reads it.
fn say(line: &str) {
    let _ = writeln!(std::io::stdout(), "{line}");
}
