//! The claims that the demo carries get the verdicts that their remarks promise.
//!
//! Claims with a published figure are held against that figure here, so that the verdict is more than our own word.

use longember::document::built_in;
use longember::system::History;
use longember::system::statements::{Judgement, Verdict, judge};

fn judged() -> Vec<(String, Judgement)> {
    let scenario = built_in::demo().scenario().expect("sound");
    let history = History::compute(scenario.system.clone()).expect("computed");
    scenario.statements.iter().map(|statement| (statement.line(), judge(statement, &history))).collect()
}

fn find<'j>(rows: &'j [(String, Judgement)], part: &str) -> &'j Judgement {
    &rows.iter().find(|(line, _)| line.contains(part)).expect("the demo states it").1
}

#[test]
fn popular_claims_get_the_verdict_they_deserve() {
    use Verdict::{DoesNotHold, Holds, WithinSpread};
    let rows = judged();
    assert!(rows.len() >= 12, "{} statements", rows.len());
    for (part, expected) in [
        ("duration of main sequence", &[Holds][..]),
        ("star lifetime", &[DoesNotHold]),
        ("luminosity at 0 yr", &[Holds]),
        ("effective temperature always", &[Holds]),
        ("colour x", &[DoesNotHold]),
        ("highest radius", &[WithinSpread]),
        ("helium ignites in a flash", &[Holds, WithinSpread]),
        ("highest luminosity", &[DoesNotHold]),
        ("supernova", &[DoesNotHold]),
        ("white dwarf is born", &[Holds]),
        ("lowest radius", &[DoesNotHold]),
        ("runaway greenhouse", &[DoesNotHold]),
        ("engulfed", &[DoesNotHold, WithinSpread]),
        ("longest mild time", &[DoesNotHold]),
    ] {
        let found = find(&rows, part);
        assert!(expected.contains(&found.verdict), "{part}: {:?} {}", found.verdict, found.sentence);
    }
}

#[test]
fn the_values_behind_the_verdicts_agree_with_published_ones() {
    let rows = judged();
    // Gough 1981, Solar Physics 74, 21: the Sun began with 0.7 of its light.
    assert!((find(&rows, "luminosity at 0 yr").value.expect("a value") - 0.7).abs() < 0.05);
    // Cummings et al. 2018, ApJ 866, 21: about 0.55 solar masses are left of a star of one.
    assert!((find(&rows, "white dwarf is born").value.expect("a value") - 0.55).abs() < 0.06);
    // Schröder & Smith 2008, MNRAS 386, 155: 2730 times the Sun's light at the tip of the first giant branch.
    let tip = find(&rows, "helium ignites in a flash").value.expect("a value");
    assert!((tip / 2730.0 - 1.0).abs() < 0.15, "{tip}");
    // Chromaticity of the Sun's own spectrum (ASTM G173, common practice): x about 0.32, near daylight white.
    assert!((find(&rows, "colour x").value.expect("a value") - 0.325).abs() < 0.01);
}
