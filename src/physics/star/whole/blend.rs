//! Between the computed structure and the fits: both lives at equal evolutionary points.

use super::computed::{Computed, Landmarks};
use super::moment::Moment;
use super::told::{Outline, Told};
use crate::physics::star::caution::StarCaution;
use crate::physics::star::event::{StarEvent, StarEventKind};
use crate::physics::star::input::END_YR;
use crate::physics::star::phase::Phase;
use crate::physics::star::track::Track;

/// Shortest time between two landmarks, yr, so that each stretch of a life has a length to compare.
const SHORTEST_YR: f64 = 1e3;

/// The landmarks of a life by the fits.
///
/// Nothing if the star does not become a helium white dwarf: then there is no equal point in a computed life.
pub(super) fn landmarks(track: &Track) -> Option<Landmarks> {
    let spans = track.spans();
    let white_dwarf = spans.last().filter(|span| span.phase == Phase::HeliumWhiteDwarf)?;
    let age = |kind| track.age_of_yr(kind);
    let largest_yr = age(StarEventKind::LargestRadius)?;
    let base_yr = age(StarEventKind::GiantBranchBase).unwrap_or(largest_yr);
    Some([0.0, age(StarEventKind::MainSequenceEnd)?, base_yr, largest_yr, white_dwarf.from_yr])
}

/// A life a share of the way from the computed structure (0) to the fits (1).
pub(super) fn blended(computed: &Computed, track: &Track, fitted: Landmarks, share: f64) -> Told {
    let structure = apart(computed.landmarks);
    let fitted = apart(fitted);
    let mut joined = [0.0; 5];
    for stretch in 0..4 {
        let [a, b] = [structure, fitted].map(|ages| (ages[stretch + 1] - ages[stretch]).ln());
        joined[stretch + 1] = joined[stretch] + (a + share * (b - a)).exp();
    }
    let mut moments = Vec::new();
    let mut add = |age_yr: f64, structure_yr: f64, fitted_yr: f64| {
        if let Some(moment) = computed.at_age(structure_yr) {
            moments.push(between(&moment, track, fitted_yr, share, age_yr));
        }
    };
    for stretch in 0..4 {
        let along = |ages: &Landmarks, place: f64| ages[stretch] + place * (ages[stretch + 1] - ages[stretch]);
        let places = |ages: &Landmarks, nodes: &mut dyn Iterator<Item = f64>| -> Vec<f64> {
            let (from, to) = (ages[stretch], ages[stretch + 1]);
            nodes.filter(|age| (from..to).contains(age)).map(|age| (age - from) / (to - from)).collect()
        };
        let mut all = places(&structure, &mut computed.moments.iter().map(|moment| moment.age_yr));
        all.extend(places(&fitted, &mut track.node_ages_yr().iter().copied()));
        all.push(0.0);
        all.sort_by(f64::total_cmp);
        all.dedup_by(|next, kept| *next - *kept < 1e-9);
        for place in all {
            add(along(&joined, place), along(&structure, place), along(&fitted, place));
        }
    }
    let since = |ages: &Landmarks, age: f64| (age > ages[4]).then_some(age - ages[4]);
    let mut cooling: Vec<f64> = vec![0.0, END_YR - joined[4]];
    cooling.extend(computed.moments.iter().filter_map(|moment| since(&structure, moment.age_yr)));
    cooling.extend(track.node_ages_yr().iter().filter_map(|age| since(&fitted, *age)));
    cooling.retain(|cooling_yr| joined[4] + cooling_yr <= END_YR);
    cooling.sort_by(f64::total_cmp);
    cooling.dedup();
    // The computed structure ends long before the sky's temperature; the same tail as its own carries it on there.
    let last_yr = computed.moments.last().map_or(0.0, |moment| moment.age_yr) - structure[4];
    for cooling_yr in cooling.into_iter().filter(|cooling_yr| *cooling_yr <= last_yr) {
        add(joined[4] + cooling_yr, structure[4] + cooling_yr, fitted[4] + cooling_yr);
    }
    Told::new(&moments, outline(joined, computed))
}

fn outline(ages: Landmarks, computed: &Computed) -> Outline {
    let [_, spent_yr, base_yr, _, white_dwarf_yr] = ages;
    let event = |age_yr, kind| StarEvent { age_yr, kind };
    let mut cautions = computed.cautions.clone();
    cautions.push(StarCaution::BlendedWithFits);
    Outline {
        phases: vec![
            (Phase::MainSequence, 0.0),
            (Phase::HertzsprungGap, spent_yr),
            (Phase::FirstGiantBranch, base_yr),
            (Phase::HeliumWhiteDwarf, white_dwarf_yr),
        ],
        white_dwarf_yr,
        events: vec![
            event(0.0, StarEventKind::MainSequenceStart),
            event(spent_yr, StarEventKind::MainSequenceEnd),
            event(base_yr, StarEventKind::GiantBranchBase),
            event(white_dwarf_yr, StarEventKind::EnvelopeLost),
            event(white_dwarf_yr, StarEventKind::WhiteDwarfBirth),
        ],
        cautions,
    }
}

/// Landmarks moved apart where two fall together.
fn apart(mut ages: Landmarks) -> Landmarks {
    for index in 1..ages.len() {
        ages[index] = ages[index].max(ages[index - 1] + SHORTEST_YR);
    }
    ages
}

/// The moment between a computed one and the same of the fits. What only the structure knows stays as computed.
fn between(computed: &Moment, track: &Track, fitted_yr: f64, share: f64, age_yr: f64) -> Moment {
    let state = track.state_at(fitted_yr);
    let fitted = Moment {
        age_yr,
        structure_yr: computed.structure_yr,
        log_luminosity: state.luminosity_lsun.ln(),
        log_radius: state.radius_rsun.ln(),
        mass_msun: state.mass_msun,
        core_mass_msun: state.core_mass_msun,
        core_hydrogen_fraction: state.core_hydrogen_fraction.unwrap_or(0.0),
        interior: computed.interior,
    };
    Moment { age_yr, ..computed.towards(&fitted, share) }
}
