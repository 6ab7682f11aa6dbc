//! What the star is doing at each moment.

use super::node::{Ending, Node};

/// Stage of a red dwarf's life.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
#[non_exhaustive]
pub enum Stage {
    /// Shrinking, not yet shining by burning.
    Contraction,
    /// Burning hydrogen, mixed through the centre.
    MainSequence,
    /// Burning hydrogen round a centre in which nothing mixes any more.
    RadiativeCore,
    /// Bright and ever hotter while the last hydrogen burns.
    BlueDwarf,
    /// A small red giant, burning hydrogen in a shell, up to where it has shrunk again.
    GiantBranch,
    /// A helium white dwarf, at first with hydrogen still glowing.
    HeliumWhiteDwarf,
    /// A helium white dwarf colder than 1000 K.
    BlackDwarf,
}

/// Surface temperature below which a white dwarf is called black, K.
pub(super) const BLACK_BELOW_K: f64 = 1000.0;
/// The blue dwarf begins at this many times the light with which the centre stopped mixing …
const BRIGHTENED: f64 = 3.0;
/// … and ends at this share of its peak.
const FADED: f64 = 0.1;
/// A star that once was larger than this was a giant, solar radii …
const GIANT_RSUN: f64 = 3.0;
/// … until it is smaller than this.
const SHRUNK_RSUN: f64 = 1.0;

/// Writes the stage of every node; the ages must already count from arrival on the main sequence.
pub(super) fn assign(nodes: &mut [Node], ending: Ending) {
    let onset =
        nodes.iter().position(|node| node.age_yr >= 0.0 && node.still_core_mass_fraction > 0.0).unwrap_or(nodes.len());
    let light_at_onset = nodes.get(onset).map_or(f64::INFINITY, |node| node.luminosity_lsun);
    let mut peak = (onset, 0.0);
    for (place, node) in nodes.iter().enumerate().skip(onset) {
        if node.luminosity_lsun > peak.1 {
            peak = (place, node.luminosity_lsun);
        }
    }
    // The faintest stars brighten less than threefold: for them half-way (in the logarithm) to the peak counts.
    let bright = light_at_onset * BRIGHTENED.min((peak.1 / light_at_onset).sqrt());
    let brightened = nodes.iter().enumerate().skip(onset).find(|(_, node)| node.luminosity_lsun > bright);
    let brightened = brightened.map_or(nodes.len(), |(place, _)| place);
    let faded = nodes.iter().enumerate().skip(peak.0).find(|(_, node)| node.luminosity_lsun < FADED * peak.1);
    let faded = faded.map_or(nodes.len(), |(place, _)| place);

    // A giant is one until it has shrunk again for good, even if it is on its way back as bright as ever.
    let largest = nodes.iter().skip(onset).map(|node| node.radius_rsun).fold(0.0, f64::max);
    let grown = nodes.iter().rposition(|node| node.radius_rsun > SHRUNK_RSUN).map_or(0, |place| place + 1);
    let (late, settled) = if ending == Ending::GiantBranch || largest > GIANT_RSUN {
        (Stage::GiantBranch, if ending == Ending::GiantBranch { nodes.len() } else { grown })
    } else {
        (Stage::BlueDwarf, faded)
    };

    for (place, node) in nodes.iter_mut().enumerate() {
        node.stage = if node.age_yr < 0.0 {
            Stage::Contraction
        } else if place < onset {
            Stage::MainSequence
        } else if place < brightened {
            Stage::RadiativeCore
        } else if place < settled {
            late
        } else if node.effective_temperature_k < BLACK_BELOW_K {
            Stage::BlackDwarf
        } else {
            Stage::HeliumWhiteDwarf
        };
    }
}
