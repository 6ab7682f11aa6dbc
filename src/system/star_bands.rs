//! Between which dates the turning points of a star's life fall, as far as its clock is known.

use super::date_band::DateBand;
use super::history::History;
use crate::physics::star::WholeLife;

/// How far lifetimes of the fits are from those of the models they were made from, as a share. Hurley, Pols & Tout 2000.
const FIT_CLOCK: f64 = 0.05;
/// How far lifetimes of computed red dwarfs are from other calculations with surfaces of today, as a share: the spread
/// that comes with opacities and convection, found by varying them.
const RED_DWARF_CLOCK: f64 = 0.10;
/// How far ages of cooling white dwarfs differ between published calculations, as a share: those with carbon cores while
/// their sequences last (Bédard et al. 2020), and those left by red dwarfs.
const COOLING_CLOCK: f64 = 0.10;
const RED_DWARF_COOLING_CLOCK: f64 = 0.25;

/// The dates between which something in the star's own life falls: its age is known within a share of it, that of a
/// white dwarf within a larger share of its cooling besides. `None` for the beginning, which is the zero of time.
pub(super) fn of_life(history: &History, time_yr: f64) -> Option<DateBand> {
    let [earliest_yr, latest_yr] = [-1.0, 1.0].map(|sign| shifted(history, time_yr, sign));
    (time_yr > 0.0).then_some(DateBand { earliest_yr: Some(earliest_yr), latest_yr: Some(latest_yr) })
}

/// A band of dates that hold for the star's life as computed, widened by what is known of its clock.
pub(super) fn widened(history: &History, band: DateBand) -> DateBand {
    DateBand {
        earliest_yr: band.earliest_yr.map(|time_yr| shifted(history, time_yr, -1.0)),
        latest_yr: band.latest_yr.map(|time_yr| shifted(history, time_yr, 1.0)),
    }
}

/// A date on a clock that runs fast (`sign` −1) or slow (1) by as much as may be.
fn shifted(history: &History, time_yr: f64, sign: f64) -> f64 {
    let mass_msun = history.system().star.mass_msun;
    let is_red_dwarf = WholeLife::needs_structure(mass_msun);
    let (share, cooling) =
        if is_red_dwarf { (RED_DWARF_CLOCK, RED_DWARF_COOLING_CLOCK) } else { (FIT_CLOCK, COOLING_CLOCK) };
    let white_dwarf = history.spans().iter().find(|span| span.phase.is_white_dwarf());
    let alive_yr = white_dwarf.map_or(time_yr, |span| span.from_yr.min(time_yr));
    alive_yr * (1.0 + sign * share) + (time_yr - alive_yr) * (1.0 + sign * cooling)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::physics::star::StarEventKind;
    use crate::system::{Body, EventKind, StarSpecification, System};

    #[test]
    fn every_date_of_the_star_but_the_first_has_a_band_around_it() {
        let history =
            History::compute(System { star: StarSpecification::default(), planets: Vec::new() }).expect("computed");
        let mut count = 0;
        for event in history.events().iter().filter(|event| event.body == Body::Star && event.time_yr > 0.0) {
            let band = event.band.expect("a band");
            assert!(band.earliest_yr.is_none_or(|early_yr| early_yr < event.time_yr), "{event:?}");
            assert!(band.latest_yr.is_none_or(|late_yr| late_yr > event.time_yr), "{event:?}");
            count += 1;
        }
        assert!(count > 10, "{count}");
        let of = |kind| history.events().iter().find(|event| event.kind == EventKind::Star(kind)).expect("happens");
        assert_eq!(of(StarEventKind::MainSequenceStart).band, None);
        // A cooling white dwarf is dated worse than the star it was.
        let width = |kind| {
            let event = of(kind);
            let band = event.band.expect("a band");
            (band.latest_yr.expect("dated") - band.earliest_yr.expect("dated")) / event.time_yr
        };
        assert!((width(StarEventKind::MainSequenceEnd) - 2.0 * FIT_CLOCK).abs() < 1e-9);
        assert!(width(StarEventKind::BlackDwarfBirth) > 3.0 * FIT_CLOCK);
    }
}
