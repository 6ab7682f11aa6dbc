//! Verdicts on a star like the Sun with an Earth.

use super::{Judgement, Verdict, judge, parse_statement};
use crate::physics::planet::Greenhouse;
use crate::system::{History, PlanetSpecification, StarSpecification, System, Water};
use std::sync::LazyLock;

static HISTORY: LazyLock<History> = LazyLock::new(|| {
    let greenhouse = Greenhouse::FixedIncrement { increment_k: 33.0 };
    let held = PlanetSpecification { name: "Held".to_owned(), greenhouse, ..PlanetSpecification::default() };
    let seas = PlanetSpecification { name: "Seas".to_owned(), water: Some(Water::default()), ..held.clone() };
    let close = PlanetSpecification { name: "Close".to_owned(), semi_major_axis_au: 0.3, ..held.clone() };
    let star = StarSpecification { present_age_yr: 4.57e9, ..StarSpecification::default() };
    match History::compute(System { star, planets: vec![held, seas, close] }) {
        Ok(history) => history,
        Err(error) => unreachable!("{error}"),
    }
});

fn judged(line: &str) -> Judgement {
    match parse_statement(line, HISTORY.system()) {
        Ok(statement) => judge(&statement, &HISTORY),
        Err(problem) => unreachable!("{line}: {problem}"),
    }
}

#[test]
fn every_form_of_statement_finds_its_verdict() {
    use Verdict::{DoesNotHold, Holds, NotJudged, WithinSpread};
    for (line, expected) in [
        ("star luminosity at now is about 1 Lsun", Holds),
        ("star luminosity at now is at least 0.98 Lsun", WithinSpread),
        ("star luminosity at now is about 2 Lsun", DoesNotHold),
        ("star temperature at 0 yr is between 5000 and 6500 K", Holds),
        ("star radius ever is at least 100 Rsun", Holds),
        ("star radius always is at most 100 Rsun", DoesNotHold),
        ("star radius ever is about 50 Rsun", Holds),
        ("star radius ever from 0 yr to 5 Gyr is about 50 Rsun", DoesNotHold),
        ("star radius always from 0 yr to 5 Gyr is about 1 Rsun within 20 %", Holds),
        ("star highest radius is at least 100 Rsun", Holds),
        ("star lowest radius from 0 yr to 10 Gyr is about 0.88 Rsun", Holds),
        ("star lifetime is at least 10 Gyr", Holds),
        ("star duration of main sequence is about 10 Gyr", Holds),
        ("star duration of black hole is about 10 Gyr", NotJudged),
        ("star date of event 'largest radius' is at least 5 Gyr", Holds),
        ("star event 'core collapse, supernova' never happens", Holds),
        ("star event 'core collapse, supernova' happens", DoesNotHold),
        ("star date of event 'core collapse, supernova' is about 5 Gyr", NotJudged),
        ("Close event 'engulfed' happens", Holds),
        ("Close surface temperature at 1 Tyr is about 300 K", NotJudged),
        ("Held surface temperature at now is about 15 °C", Holds),
        ("Held insolation at now is about 1361 Searth", DoesNotHold),
        ("Seas highest surface temperature is at most 300 K", DoesNotHold),
        ("Seas mild time is at least 1 Gyr", Holds),
        ("Seas longest mild time is at least 1 Gyr", Holds),
        ("Seas habitable zone time is at least 1 Gyr", Holds),
        ("star absolute visual magnitude at now is about 4.8 mag", Holds),
        ("Held star angular diameter at now is about 0.53 degrees", Holds),
        ("Held illuminance at now is at least 100000 lx", Holds),
        ("star event 'picnic' never happens", NotJudged),
        ("star event 'helium flash' happens", Holds),
        ("star luminosity at event 'picnic' is about 1 Lsun", NotJudged),
    ] {
        let found = judged(line);
        assert_eq!(found.verdict, expected, "{line}: {}", found.sentence);
        assert!(found.method().is_some(), "{line}");
        let ends = [found.value, found.lowest, found.highest, found.factor, found.difference, found.time_yr];
        assert!(ends.iter().flatten().all(|value| value.is_finite()), "{line}: {found:?}");
        assert!(found.sentence.contains("Stated is") && found.sentence.contains("Method: "), "{}", found.sentence);
    }
}

#[test]
fn the_sentence_tells_value_spread_and_source() {
    let found = judged("star luminosity at now is about 2 Lsun");
    for part in
        ["L☉ in this model (± 5 %).", "Stated is about 2 L☉ (within 10 %)", "times that", "does not hold", "Hurley"]
    {
        assert!(found.sentence.contains(part), "{part}: {}", found.sentence);
    }
    let factor = found.factor.unwrap_or_default();
    assert!((factor - 0.5).abs() < 0.03, "{factor}");
    let bound = judged("Seas highest surface temperature is about 288 K");
    assert!(bound.sentence.contains("above "), "{}", bound.sentence);
}

#[test]
fn a_planet_that_is_gone_is_told_of() {
    let mut statement = match parse_statement("Held insolation at now is about 1 Searth", HISTORY.system()) {
        Ok(statement) => statement,
        Err(problem) => unreachable!("{problem}"),
    };
    statement.rename("Held", "Helt");
    let found = judge(&statement, &HISTORY);
    assert_eq!(found.verdict, Verdict::NotJudged);
    assert!(
        found.sentence.contains("there is no planet named \"Helt\" here; did you mean Held?"),
        "{}",
        found.sentence
    );
}
