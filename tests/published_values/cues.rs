//! Time codes against the published count, flashes against the published thresholds.

use longember::system::cues::{
    DARKER_BELOW, FlashKind, FrameRate, LEAST_CHANGE, Light, MOST_FLASHES, RED_DISTANCE, RED_SHARE, flashing, time_code,
};

/// SMPTE ST 12-1, drop-frame count at 30000/1001: numbers 0 and 1 are left out in every minute but each tenth, so that an
/// hour of the clock is 107 892 frames and a day 2 589 408.
#[test]
fn drop_frame_time_code_keeps_to_the_clock() {
    let rate = FrameRate::parse("29.97").expect("known");
    for (frame, code) in [
        (0, "00:00:00;00"),
        (1799, "00:00:59;29"),
        (1800, "00:01:00;02"),
        (3597, "00:01:59;29"),
        (3598, "00:02:00;02"),
        (17_981, "00:09:59;29"),
        (17_982, "00:10:00;00"),
        (107_892, "01:00:00;00"),
        (2_589_407, "23:59:59;29"),
        (2_589_408, "00:00:00;00"),
    ] {
        assert_eq!(time_code(frame, rate), code, "{frame}");
    }
    let rate = FrameRate::parse("59.94").expect("known");
    assert_eq!((time_code(3599, rate), time_code(3600, rate)), ("00:00:59;59".to_owned(), "00:01:00;04".to_owned()));
    let film = FrameRate::parse("23.976").expect("known");
    assert_eq!(time_code(24 * 3600, film), "01:00:00:00");
    assert_eq!(time_code(25 * 61, FrameRate::parse("25").expect("whole")), "00:01:01:00");
}

/// Two colours that take turns for two seconds, so many pairs of them a second, at sixty frames per second.
fn turns(first: [f64; 3], second: [f64; 3], pairs_per_second: f64) -> Vec<Light> {
    (0..120)
        .map(|frame| {
            let show_time_s = f64::from(frame) / 60.0;
            let is_first = ((show_time_s * pairs_per_second * 2.0 + 1e-9).floor() as u64).is_multiple_of(2);
            Light { show_time_s, rgb: if is_first { first } else { second } }
        })
        .collect()
}

fn grey(level: f64) -> [f64; 3] {
    [level; 3]
}

fn kinds(lights: &[Light]) -> Vec<FlashKind> {
    flashing(lights).iter().map(|found| found.kind).collect()
}

/// WCAG 2.2, 2.3.1 and its definition of the general flash threshold: more than three flashes in any one second, changes of
/// 10 % of the maximum relative luminance, the darker image below 0.80.
#[test]
fn general_flashes_are_counted_as_the_guidelines_define_them() {
    assert_eq!((LEAST_CHANGE, DARKER_BELOW, MOST_FLASHES), (0.10, 0.80, 3));
    assert_eq!(kinds(&turns(grey(0.0), grey(1.0), 3.0)), []);
    assert_eq!(kinds(&turns(grey(0.0), grey(1.0), 4.0)), [FlashKind::General]);
    assert_eq!(kinds(&turns(grey(0.5), grey(0.59), 10.0)), []);
    assert_eq!(kinds(&turns(grey(0.5), grey(0.61), 10.0)), [FlashKind::General]);
    assert_eq!(kinds(&turns(grey(0.81), grey(0.95), 10.0)), []);
    assert_eq!(kinds(&turns(grey(0.79), grey(0.95), 10.0)), [FlashKind::General]);
    // One rise in many small steps is one change, not many.
    let ramp: Vec<Light> = (0..60)
        .map(|frame| Light { show_time_s: f64::from(frame) / 60.0, rgb: grey(f64::from(frame) / 60.0) })
        .collect();
    assert_eq!(kinds(&ramp), []);
}

/// WCAG 2.2, the same definition: a transition to or from a state with R/(R + G + B) of 0.8 or more that covers more than 0.2
/// in the CIE 1976 chromaticity diagram.
#[test]
fn red_flashes_are_counted_as_the_guidelines_define_them() {
    assert_eq!((RED_SHARE, RED_DISTANCE), (0.8, 0.2));
    // Equal in luminance, so that only the red counts; 0.2126 is that of full red.
    let red = [1.0, 0.0, 0.0];
    let grey_of_red = grey(0.2126);
    assert_eq!(kinds(&turns(red, grey_of_red, 4.0)), [FlashKind::Red]);
    assert_eq!(kinds(&turns(red, grey_of_red, 3.0)), []);
    // Hardly saturated, and hardly another colour.
    assert_eq!(kinds(&turns([0.6, 0.12, 0.1], grey_of_red, 4.0)), []);
    assert_eq!(kinds(&turns(red, [0.95, 0.015, 0.0], 10.0)), []);
}

#[test]
fn a_stretch_that_flashes_is_told_with_its_ends() {
    let mut lights = turns(grey(0.3), grey(0.3), 1.0);
    lights.extend(
        turns(grey(0.0), grey(1.0), 5.0).iter().map(|light| Light { show_time_s: light.show_time_s + 2.0, ..*light }),
    );
    lights.extend(
        turns(grey(0.3), grey(0.3), 1.0).iter().map(|light| Light { show_time_s: light.show_time_s + 4.0, ..*light }),
    );
    let found = flashing(&lights);
    assert_eq!(found.len(), 1, "{found:?}");
    assert!(found[0].from_s >= 2.0 && found[0].to_s <= 4.1 && found[0].changes >= 10, "{found:?}");
}
