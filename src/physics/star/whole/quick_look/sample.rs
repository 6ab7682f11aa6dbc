//! A life read at evolutionary points that every red dwarf passes.

use crate::physics::star::convective::{Ending, Life, Node, Stage};

/// Points in each stretch of life: mixed burning, burning round a core at rest, the last hydrogen, cooling, cold.
pub(super) const POINTS: [usize; 5] = [14, 12, 64, 32, 6];
/// Points of a whole life, with its start.
pub(super) const COUNT: usize = 1 + POINTS[0] + POINTS[1] + POINTS[2] + POINTS[3] + POINTS[4];
/// Columns of a point: see [`columns`].
pub(super) const COLUMNS: usize = 13;
/// Column of the mass.
pub(super) const MASS: usize = 0;
/// Column of the mass of the helium core.
pub(super) const CORE_MASS: usize = 11;

/// Hydrogen at the centre below which it counts as spent, mass fraction.
const SPENT: f64 = 0.01;
/// Difference of hydrogen between surface and centre up to which the star is mixed throughout, mass fraction.
const MIXED: f64 = 0.01;
/// A core at rest this early, as a share of the time to the spent core, is a passing one of the arrival.
const PASSING: f64 = 1e-3;
/// Surface of a white dwarf that is called black, K.
const BLACK_K: f64 = 1000.0;
/// Changes of log luminosity and log temperature below which a turn of the path is noise of the computation.
const NOISE: f64 = 0.05;
/// Shortest time between two moments that count, as a share of the age.
const SHORTEST: f64 = 2e-9;

/// A life at [`COUNT`] points.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Sampled {
    /// Lengths of the stretches, yr.
    pub(super) lengths_yr: [f64; 5],
    /// Time from birth to arrival on the main sequence, yr.
    pub(super) contraction_yr: f64,
    /// Whether the star becomes a giant.
    pub(super) is_giant: bool,
    /// Steps of age to each point as shares of its stretch; the first is zero.
    pub(super) steps: Vec<f64>,
    /// The columns at each point.
    pub(super) points: Vec<[f64; COLUMNS]>,
}

impl Sampled {
    /// Reads a life. Nothing if it was not followed to the black dwarf.
    pub(super) fn new(life: &Life) -> Option<Self> {
        let nodes: Vec<&Node> = life.nodes.iter().filter(|node| node.age_yr >= 0.0).collect();
        let first = |is: &dyn Fn(&Node) -> bool| nodes.iter().find(|node| is(node)).map(|node| node.age_yr);
        if life.ending != Ending::BlackDwarf {
            return None;
        }
        let spent_yr = first(&|node| node.core_hydrogen_fraction < SPENT)?;
        let mut rest_yr = first(&|node| node.stage >= Stage::RadiativeCore)?;
        if rest_yr < PASSING * spent_yr {
            rest_yr = first(&|node| node.surface_hydrogen_fraction - node.core_hydrogen_fraction > MIXED)?;
        }
        let dwarf_yr = first(&|node| node.stage >= Stage::HeliumWhiteDwarf)?;
        let black_yr = first(&|node| node.age_yr > dwarf_yr && node.effective_temperature_k < BLACK_K)?;
        let ends = [0.0, rest_yr, spent_yr, dwarf_yr, black_yr, nodes.last()?.age_yr];
        if !ends.windows(2).all(|pair| pair[0] < pair[1]) {
            return None;
        }
        let mut sampled = Self {
            lengths_yr: [0, 1, 2, 3, 4].map(|stretch| ends[stretch + 1] - ends[stretch]),
            contraction_yr: life.contraction_yr,
            is_giant: nodes.iter().any(|node| node.stage == Stage::GiantBranch),
            steps: vec![0.0],
            points: vec![columns(&life.at_age(0.0)?)],
        };
        for (stretch, count) in POINTS.iter().enumerate() {
            let (from, to) = (ends[stretch], ends[stretch + 1]);
            let mut before = 0.0;
            for share in even_shares(&nodes, from, to, *count) {
                let node = life.at_age((from + share * (to - from)).min(ends[5]))?;
                sampled.steps.push(share - before);
                sampled.points.push(columns(&node));
                before = share;
            }
        }
        Some(sampled)
    }
}

/// Shares of a stretch of time at which the path of the star through light, temperature and time is cut into even parts;
/// the last is 1.
fn even_shares(nodes: &[&Node], from: f64, to: f64, count: usize) -> Vec<f64> {
    let place = |node: &Node| {
        let share = (node.age_yr - from) / (to - from);
        [node.luminosity_lsun.ln(), 4.0 * node.effective_temperature_k.ln(), 4.0 * share]
    };
    let mut path: Vec<(f64, [f64; 3])> = Vec::new();
    for node in nodes.iter().filter(|node| (from..=to).contains(&node.age_yr)) {
        if path.last().is_none_or(|last| node.age_yr - last.0 > SHORTEST * node.age_yr) {
            path.push((node.age_yr, place(node)));
        }
    }
    let path = turns(&path);
    let mut lengths = vec![0.0];
    for pair in path.windows(2) {
        let squares: f64 = pair[0].1.iter().zip(pair[1].1).map(|(a, b)| (a - b) * (a - b)).sum();
        lengths.push(lengths[lengths.len() - 1] + squares.sqrt());
    }
    let whole = lengths[lengths.len() - 1];
    let mut shares: Vec<f64> = (1..count)
        .map(|step| {
            let wanted = whole * step as f64 / count as f64;
            let next = lengths.partition_point(|length| *length < wanted).clamp(1, path.len() - 1);
            let along = (wanted - lengths[next - 1]) / (lengths[next] - lengths[next - 1]).max(f64::MIN_POSITIVE);
            let age_yr = path[next - 1].0 + along.clamp(0.0, 1.0) * (path[next].0 - path[next - 1].0);
            ((age_yr - from) / (to - from)).clamp(0.0, 1.0)
        })
        .collect();
    shares.push(1.0);
    shares
}

/// The path without turns smaller than [`NOISE`].
fn turns(path: &[(f64, [f64; 3])]) -> Vec<(f64, [f64; 3])> {
    let mut kept = Vec::new();
    let mut from = 0;
    while let Some(start) = path.get(from) {
        kept.push(*start);
        let mut to = from + 1;
        while to + 1 < path.len() && to - from < 200 && is_straight(&path[from..=to + 1]) {
            to += 1;
        }
        from = to;
    }
    kept
}

fn is_straight(path: &[(f64, [f64; 3])]) -> bool {
    let [first, inner @ .., last] = path else { return true };
    inner.iter().all(|(age, place)| {
        let share = (age - first.0) / (last.0 - first.0);
        (0..2).all(|axis| {
            let line = first.1[axis] + share * (last.1[axis] - first.1[axis]);
            (place[axis] - line).abs() < NOISE
        })
    })
}

/// What is kept of a moment.
pub(super) fn columns(node: &Node) -> [f64; COLUMNS] {
    [
        node.mass_msun,
        node.luminosity_lsun.ln(),
        node.radius_rsun.ln(),
        node.nuclear_luminosity_lsun / node.luminosity_lsun,
        node.core_temperature_k.ln(),
        node.core_density_g_cm3.ln(),
        node.core_hydrogen_fraction,
        node.core_helium3_fraction,
        node.mean_hydrogen_fraction,
        node.surface_hydrogen_fraction,
        node.still_core_mass_fraction,
        node.helium_core_mass_msun,
        node.effective_temperature_k.ln(),
    ]
}

/// The moment with these columns; the stage is left to the caller.
pub(super) fn node(age_yr: f64, columns: &[f64; COLUMNS]) -> Node {
    let luminosity_lsun = columns[1].exp();
    Node {
        age_yr,
        mass_msun: columns[0],
        luminosity_lsun,
        radius_rsun: columns[2].exp(),
        nuclear_luminosity_lsun: columns[3].max(0.0) * luminosity_lsun,
        core_temperature_k: columns[4].exp(),
        core_density_g_cm3: columns[5].exp(),
        core_hydrogen_fraction: columns[6].clamp(0.0, 1.0),
        core_helium3_fraction: columns[7].clamp(0.0, 1.0),
        mean_hydrogen_fraction: columns[8].clamp(0.0, 1.0),
        surface_hydrogen_fraction: columns[9].clamp(0.0, 1.0),
        still_core_mass_fraction: columns[10].clamp(0.0, 1.0),
        helium_core_mass_msun: columns[11].max(0.0),
        effective_temperature_k: columns[12].exp(),
        stage: Stage::MainSequence,
    }
}
