//! A life between those of the grid.

use super::sample::{COLUMNS, CORE_MASS, COUNT, MASS, POINTS, Sampled, node};
use super::table::{Entry, read};
use crate::physics::star::convective::{Caution, ConvectiveInput, Ending, Life, Node, Stage, SurfaceOpacity};
use std::sync::LazyLock;

/// The grid that is part of the program.
pub(super) static GRID: LazyLock<Vec<Entry>> =
    LazyLock::new(|| read(include_bytes!("../../../../../assets/tables/red_dwarf_grid.bin")).unwrap_or_default());

/// Light over that at the end of mixing with which a blue dwarf begins, as in the structure calculation.
const BRIGHTENED: f64 = 3.0;

/// The life of a red dwarf, interpolated between lives computed in advance: in milliseconds, not exact.
///
/// The logarithm of the mass and the metallicity are the coordinates. Nothing outside the grid, as near the edge to brown
/// dwarfs.
#[must_use]
pub fn quick_look(input: ConvectiveInput, surface: SurfaceOpacity) -> Option<Life> {
    let mut rows: Vec<f64> =
        GRID.iter().filter(|entry| entry.surface == surface).map(|entry| entry.metallicity_dex).collect();
    rows.sort_by(f64::total_cmp);
    rows.dedup();
    let (poorer, richer, share) = around(&rows, input.metallicity_dex)?;
    let of_poorer = along_masses(input.mass_msun, rows[poorer], surface)?;
    let mut sampled = if share > 0.0 {
        let of_richer = along_masses(input.mass_msun, rows[richer], surface)?;
        between(&of_poorer, &of_richer, share)
    } else {
        of_poorer
    };
    // Between two lives, and in sixteen bits, the mass at birth is not quite the one asked for.
    let factor = input.mass_msun / sampled.points[0][MASS];
    for point in &mut sampled.points {
        point[MASS] *= factor;
        point[CORE_MASS] *= factor;
    }
    let mut life = life(&sampled);
    if surface == SurfaceOpacity::Of1997 {
        life.cautions.push(Caution::OutdatedSurface);
    }
    Some(life)
}

/// The life of a mass at a metallicity of the grid.
fn along_masses(mass_msun: f64, metallicity_dex: f64, surface: SurfaceOpacity) -> Option<Sampled> {
    let mut row: Vec<&Entry> =
        GRID.iter().filter(|entry| entry.surface == surface && entry.metallicity_dex == metallicity_dex).collect();
    row.sort_by(|a, b| a.mass_msun.total_cmp(&b.mass_msun));
    let logs: Vec<f64> = row.iter().map(|entry| entry.mass_msun.ln()).collect();
    let (lighter, heavier, share) = around(&logs, mass_msun.ln())?;
    Some(between(&row[lighter].sampled, &row[heavier].sampled, share))
}

/// The places of the values below and above one, and how far between it lies. Nothing outside.
fn around(values: &[f64], wanted: f64) -> Option<(usize, usize, f64)> {
    const ROUNDING: f64 = 1e-9;
    let (first, last) = (*values.first()?, *values.last()?);
    if !(first - ROUNDING..=last + ROUNDING).contains(&wanted) {
        return None;
    }
    if values.len() == 1 {
        return Some((0, 0, 0.0));
    }
    let above = values.partition_point(|value| *value <= wanted).clamp(1, values.len() - 1);
    let share = (wanted - values[above - 1]) / (values[above] - values[above - 1]);
    Some((above - 1, above, share.clamp(0.0, 1.0)))
}

/// A life a share of the way between two, at equal evolutionary points.
fn between(from: &Sampled, to: &Sampled, share: f64) -> Sampled {
    let even = |a: f64, b: f64| a + share * (b - a);
    let log = |a: f64, b: f64| even(a.ln(), b.ln()).exp();
    Sampled {
        lengths_yr: std::array::from_fn(|stretch| log(from.lengths_yr[stretch], to.lengths_yr[stretch])),
        contraction_yr: log(from.contraction_yr, to.contraction_yr),
        is_giant: if share < 0.5 { from.is_giant } else { to.is_giant },
        steps: from.steps.iter().zip(&to.steps).map(|(a, b)| even(*a, *b)).collect(),
        points: (0..COUNT)
            .map(|k| {
                std::array::from_fn::<f64, COLUMNS, _>(|column| even(from.points[k][column], to.points[k][column]))
            })
            .collect(),
    }
}

/// The points as a computed life would tell them.
fn life(sampled: &Sampled) -> Life {
    let mut nodes: Vec<Node> = vec![node(0.0, &sampled.points[0])];
    let stages =
        [Stage::MainSequence, Stage::RadiativeCore, Stage::RadiativeCore, Stage::HeliumWhiteDwarf, Stage::BlackDwarf];
    let (mut k, mut start_yr) = (0, 0.0);
    for (stretch, count) in POINTS.iter().enumerate() {
        let mut share = 0.0;
        for step in 0..*count {
            k += 1;
            share += sampled.steps[k];
            let age_yr = start_yr + share.min(1.0) * sampled.lengths_yr[stretch];
            let mut moment = node(age_yr, &sampled.points[k]);
            // The last point of a stretch is the first of the next stage.
            let is_last = step + 1 == *count;
            moment.stage = stages[if is_last { (stretch + 1).min(4) } else { stretch }];
            if nodes.last().is_some_and(|last| age_yr > last.age_yr) {
                nodes.push(moment);
            } else if let Some(last) = nodes.last_mut() {
                *last = Node { age_yr: last.age_yr, ..moment };
            }
        }
        start_yr += sampled.lengths_yr[stretch];
    }
    name_the_late_stage(&mut nodes, sampled.is_giant);
    Life {
        nodes,
        contraction_yr: sampled.contraction_yr,
        ending: Ending::BlackDwarf,
        cautions: Vec::new(),
        profiles: Vec::new(),
    }
}

/// Names the last burning: from the threefold light of the end of mixing on, or half-way to the peak of faint stars.
fn name_the_late_stage(nodes: &mut [Node], is_giant: bool) {
    let late = if is_giant { Stage::GiantBranch } else { Stage::BlueDwarf };
    let core = || nodes.iter().filter(|node| node.stage == Stage::RadiativeCore).map(|node| node.luminosity_lsun);
    let Some(at_rest) = core().next() else { return };
    let peak = core().fold(0.0, f64::max);
    let bright = at_rest * BRIGHTENED.min((peak / at_rest).sqrt());
    let brightened = nodes.iter().position(|node| node.stage == Stage::RadiativeCore && node.luminosity_lsun > bright);
    for node in nodes.iter_mut().skip(brightened.unwrap_or(usize::MAX)) {
        if node.stage == Stage::RadiativeCore {
            node.stage = late;
        }
    }
}
