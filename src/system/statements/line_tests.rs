//! Lines as people type them, and any statement there and back.

use super::quantity::{Quantity, figures_of_planet, figures_of_star};
use super::{During, Relation, Statement, Subject, Tolerance, When, parse_saved_statement, parse_statement};
use crate::physics::star::{END_YR, Phase};
use crate::system::{MomentRequest, PlanetSpecification, StarSpecification, System};
use proptest::prelude::*;

fn system() -> System {
    let planet = |name: &str| PlanetSpecification { name: name.to_owned(), ..PlanetSpecification::default() };
    let star = StarSpecification { name: "Aldo".to_owned(), ..StarSpecification::default() };
    System { star, planets: ["Ember", "Far Cinder", "Ember's moon \"b\""].map(planet).to_vec() }
}

fn canonical(line: &str) -> String {
    match parse_statement(line, &system()) {
        Ok(statement) => statement.line(),
        Err(problem) => unreachable!("{line}: {problem}"),
    }
}

#[test]
fn lines_are_read_as_they_are_typed() {
    for (typed, written) in [
        ("star luminosity at 5 Gyr is about 1.0 Lsun", "star luminosity at 5 Gyr is about 1 Lsun"),
        (
            "Ember surface temperature at event \"helium flash\" at most 300 K",
            "Ember surface temperature at event 'helium flash' is at most 300 K",
        ),
        ("star radius ever at least 200 Rsun", "star radius ever is at least 200 Rsun"),
        ("The star's temperature now is 5772 K.", "star effective temperature at now is about 5772 K"),
        ("Aldo mass at now < 1 Msun", "star mass at now is at most 1 Msun"),
        (
            "far cinder's surface temperature always from 1 Gyr to 5 Gyr between -20 and 30 °C",
            "'Far Cinder' surface temperature always from 1 Gyr to 5 Gyr is between 253.15 K and 303.15 K",
        ),
        (
            "Far Cinder insolation from event 'largest radius' to 13 Gyr is above 2 Searth",
            "'Far Cinder' insolation always from event 'largest radius' to 13 Gyr is at least 2 Searth",
        ),
        (
            "star highest radius is about 1 au within 10 %",
            "star highest radius is about 215.03215567054764 Rsun within 10 %",
        ),
        ("star lifetime is at least 10 billion years", "star lifetime is at least 10 Gyr"),
        ("star duration of main sequence about 10 Gyr", "star duration of main sequence is about 10 Gyr"),
        ("Ember ice cover at now at most 10%", "Ember ice fraction at now is at most 0.1"),
        (
            "Ember date of event 'engulfed' is about 12 Gyr within 100 Myr",
            "Ember date of event 'engulfed' is about 12 Gyr within 100 Myr",
        ),
        ("Ember event 'engulfed' never happens", "Ember event 'engulfed' never happens"),
        ("Ember longest mild time at any time ≥ 1 Gyr", "Ember longest mild time is at least 1 Gyr"),
        (
            "Ember temperature at 4 Gyr about 15 C within 5 C",
            "Ember surface temperature at 4 Gyr is about 288.15 K within 5 K",
        ),
        ("star colour_x at now is 0.31", "star colour x at now is about 0.31"),
    ] {
        assert_eq!(canonical(typed), written);
        assert_eq!(canonical(written), written);
    }
}

#[test]
fn what_cannot_be_read_says_where_and_what_was_meant() {
    for (line, column, words) in [
        ("", 1, "nothing is stated"),
        ("Embr radius", 1, "did you mean Ember?"),
        ("star lumosity at 5 Gyr is 1 Lsun", 6, "did you mean luminosity?"),
        ("Ember core mass at 5 Gyr is 1 Msun", 7, "no quantity of a planet"),
        ("star luminosity is about 1 Lsun", 17, "not said when"),
        ("star luminosity at soon is 1 Lsun", 20, "\"soon\" is not a span of time"),
        ("star luminosity at -5 Gyr is 1 Lsun", 20, "0 to 100000000000000 yr"),
        ("star luminosity at 5 Gyr 1 Lsun", 20, "not a span of time"),
        ("star luminosity at 5 Gyr is about 1", 35, "1 has no unit; write it as 1 Lsun"),
        ("star luminosity at 5 Gyr is about 1 K", 35, "Lsun"),
        ("star luminosity at 5 Gyr is about", 34, "type a number"),
        ("star luminosity at 5 Gyr is between 1 Lsun", 43, "second value"),
        ("star luminosity from 5 Gyr is 1 Lsun", 27, "the end of the time"),
        ("star luminosity at 5 Gyr is about 1 Lsun within a lot", 49, "how near"),
        ("star duration of mian sequence is 1 Gyr", 18, "did you mean main sequence?"),
        ("star lifetime at 5 Gyr is 1 Gyr", 15, "lifetime is not of one moment"),
        ("star date of event largest radius is 1 Gyr", 20, "quotation marks"),
        ("star luminosity at event 'open is 1 Lsun", 20, "quotation marks"),
        ("Ember event 'engulfed' happens twice", 32, "\"twice\" stands here"),
        ("Ember é at", 7, "no quantity"),
    ] {
        match parse_statement(line, &system()) {
            Ok(read) => unreachable!("{line} was read as {}", read.line()),
            Err(problem) => {
                assert_eq!(problem.column, column, "{line}: {problem}");
                assert!(problem.to_string().contains(words), "{line}: {problem}");
            }
        }
    }
}

#[test]
fn a_file_may_name_a_planet_that_is_gone() {
    let line = "Ghost surface temperature at now is about 288 K";
    assert!(parse_statement(line, &system()).is_err());
    let read = parse_saved_statement(line, &system());
    assert_eq!(read.map(|statement| statement.line()), Ok(line.to_owned()));
}

fn moment() -> impl Strategy<Value = MomentRequest> {
    prop_oneof![
        (0.0..END_YR).prop_map(MomentRequest::Time),
        (0..1000_u32).prop_map(|count| MomentRequest::Time(f64::from(count) * 1e8)),
        Just(MomentRequest::Now),
        "[ -~é“”☉]{0,20}".prop_map(|name| MomentRequest::Event(name.trim().to_owned())),
    ]
}

fn during() -> impl Strategy<Value = Option<During>> {
    prop::option::of((moment(), moment()).prop_map(|(from, to)| During { from, to }))
}

fn relation() -> impl Strategy<Value = Relation> {
    let value = || prop_oneof![(-1e3..1e3), any::<f64>().prop_filter("finite", |value| value.is_finite())];
    let size = || prop_oneof![(0.0..100.0), (0..100_u32).prop_map(f64::from)];
    prop_oneof![
        value().prop_map(|value| Relation::About(value, None)),
        (value(), size()).prop_map(|(value, percent)| Relation::About(value, Some(Tolerance::Percent(percent)))),
        (value(), size()).prop_map(|(value, size)| Relation::About(value, Some(Tolerance::Difference(size)))),
        value().prop_map(Relation::AtLeast),
        value().prop_map(Relation::AtMost),
        (value(), value()).prop_map(|(one, other)| Relation::Between(one.min(other), one.max(other))),
    ]
}

/// Quantities of the star and of a planet.
fn quantities(of_star: bool) -> Vec<Quantity> {
    let keys = if of_star { figures_of_star() } else { figures_of_planet() };
    let figures = keys.iter().flat_map(|key| [Quantity::Figure(key), Quantity::Highest(key), Quantity::Lowest(key)]);
    let mut all: Vec<Quantity> = figures.collect();
    all.push(Quantity::Date("it's \"so\" \\ “high”".to_owned()));
    if of_star {
        all.push(Quantity::Lifetime);
        all.extend(Phase::ALL.map(Quantity::Duration));
    } else {
        all.extend([Quantity::MildTime, Quantity::LongestMildTime, Quantity::HabitableZoneTime]);
    }
    all
}

fn statement() -> impl Strategy<Value = Statement> {
    let subjects = ["", "Ember", "Far Cinder", "Ember's moon \"b\"", "Gone \\ 'with'", "star"];
    let times = (moment(), during(), 0..3_usize);
    (prop::sample::select(subjects.to_vec()), any::<prop::sample::Index>(), times, relation()).prop_map(
        |(name, index, (moment, during, kind), relation)| {
            let subject = if name.is_empty() { Subject::Star } else { Subject::Planet(name.to_owned()) };
            let all = quantities(subject == Subject::Star);
            let quantity = all[index.index(all.len())].clone();
            let may_be_part = matches!(
                quantity,
                Quantity::Highest(_)
                    | Quantity::Lowest(_)
                    | Quantity::MildTime
                    | Quantity::LongestMildTime
                    | Quantity::HabitableZoneTime
            );
            let when = match (quantity.is_of_a_moment(), kind) {
                (true, 0) => When::At(moment),
                (true, 1) => When::Ever(during),
                (true, _) => When::Always(during),
                (false, _) => When::Life(during.filter(|_| may_be_part)),
            };
            // A share of a bare number is a difference of it.
            let relation = match relation {
                Relation::About(value, Some(Tolerance::Percent(_)))
                    if quantity.entry() == crate::units::entry::EntryKind::Plain =>
                {
                    Relation::About(value, None)
                }
                other => other,
            };
            Statement { subject, quantity, when, relation, note: String::new() }
        },
    )
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(2000))]

    #[test]
    fn every_statement_comes_back_from_its_line(statement in statement()) {
        let line = statement.line();
        prop_assert_eq!(parse_saved_statement(&line, &system()), Ok(statement), "{}", line);
    }

    #[test]
    fn no_line_brings_the_reader_down(words in prop::collection::vec(
        prop::sample::select(vec![
            "star", "Ember", "'", "\"", "“", "luminosity", "at", "event", "ever", "always", "from", "to", "is", "about",
            "between", "and", "within", "%", "5", "Gyr", "Lsun", "é", "☉", "\\", "duration of", "date of", "highest", " ", ".",
        ]),
        0..14,
    ), gap in prop::sample::select(vec!["", " "])) {
        let line = words.join(gap);
        if let Err(problem) = parse_statement(&line, &system()) {
            prop_assert!(problem.column >= 1 && problem.column <= line.chars().count() + 1);
            prop_assert!(!problem.to_string().is_empty());
        }
    }
}

#[test]
fn a_line_that_is_torn_is_one_line_again() {
    assert_eq!(canonical("star luminosity\nat 5 Gyr\tis about 1 Lsun"), "star luminosity at 5 Gyr is about 1 Lsun");
    let torn = parse_statement("star luminosity at ,\n 0 yr is about 1 Lsun", &system()).expect_err("no time");
    assert!(!torn.to_string().chars().any(char::is_control), "{torn}");
}
