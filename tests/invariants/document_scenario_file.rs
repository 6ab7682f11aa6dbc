//! Scenario files: what is written reads back to the last bit, here and in an independent reader of the same form;
//! no text and no bytes bring the reader down, and every problem has a place in the text.

use longember::document::{LoadError, Problem, Scenario, built_in, parse_scenario, scenario_from_bytes, scenario_text};
use longember::physics::planet::{Greenhouse, Redistribution};
use longember::physics::star::convective::SurfaceOpacity;
use longember::system::cues::{Cue, LONGEST_SHOW_S, Transition};
use longember::system::limits::{self, Limit};
use longember::system::specification::{PlanetSpecification, RED_DWARF_SURFACES, StarSpecification, System};
use longember::system::statements::{Statement, parse_saved_statement};
use longember::system::{Air, Carbon, MomentRequest, TidesChoice, Water};
use proptest::prelude::*;
use proptest::sample::Index;
use proptest::test_runner::TestCaseResult;

/// The same form for the `ron` crate with `serde`: an oracle that shares no line of code with our reader.
mod oracle {
    use serde::Deserialize;

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) struct Longember {
        pub(super) version: u32,
        pub(super) title: String,
        #[serde(default)]
        pub(super) about: String,
        pub(super) star: Star,
        #[serde(default)]
        pub(super) planets: Vec<Planet>,
        #[serde(default)]
        pub(super) statements: Vec<Statement>,
        #[serde(default)]
        pub(super) cues: Vec<Cue>,
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) struct Statement {
        pub(super) claim: String,
        pub(super) note: String,
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) struct Cue {
        pub(super) show_time_s: f64,
        pub(super) moment: String,
        pub(super) transition: Transition,
        pub(super) note: String,
    }

    #[derive(Clone, Copy, Deserialize)]
    pub(super) enum Transition {
        Cut,
        Steady,
        SteadyLog,
        Paced,
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) struct Star {
        pub(super) name: String,
        pub(super) mass_msun: f64,
        pub(super) metallicity_dex: f64,
        pub(super) present_age_yr: f64,
        #[serde(default)]
        pub(super) red_dwarf_surface: Surface,
    }

    #[derive(Clone, Copy, Default, Deserialize)]
    pub(super) enum Surface {
        #[default]
        Modern,
        Of1997,
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields, default)]
    pub(super) struct Planet {
        pub(super) name: String,
        pub(super) semi_major_axis_au: f64,
        pub(super) eccentricity: f64,
        pub(super) mass_mearth: f64,
        pub(super) radius_rearth: f64,
        pub(super) bond_albedo: f64,
        pub(super) redistribution: Redistribution,
        pub(super) emissivity: f64,
        pub(super) greenhouse: Greenhouse,
        pub(super) air: Air,
        pub(super) climate: Climate,
        pub(super) tides: Tides,
        pub(super) initial_day_h: Option<f64>,
        pub(super) marked_temperature_k: Option<f64>,
    }

    impl Default for Planet {
        fn default() -> Self {
            Self {
                name: String::new(),
                semi_major_axis_au: f64::NAN,
                eccentricity: 0.0,
                mass_mearth: f64::NAN,
                radius_rearth: f64::NAN,
                bond_albedo: 0.3,
                redistribution: Redistribution::WholePlanet,
                emissivity: 1.0,
                greenhouse: Greenhouse::None,
                air: Air::EarthLike { surface_pressure_bar: 1.0 },
                climate: Climate::None,
                tides: Tides::On,
                initial_day_h: None,
                marked_temperature_k: None,
            }
        }
    }

    #[derive(Deserialize, Debug)]
    pub(super) enum Redistribution {
        WholePlanet,
        DaySide,
        DaySideFullPhase,
        SubStellar,
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) enum Greenhouse {
        None,
        FixedIncrement { increment_k: f64 },
        Grey { optical_depth: f64 },
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) enum Air {
        Airless,
        EarthLike { surface_pressure_bar: f64 },
        CarbonDioxide { surface_pressure_bar: f64 },
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) enum Climate {
        None,
        WaterWorld {
            #[serde(default = "usual_carbon")]
            carbon_dioxide: Carbon,
            #[serde(default = "one")]
            water_oceans: f64,
            #[serde(default = "usual_obliquity")]
            obliquity_deg: f64,
            #[serde(default = "usual_transport")]
            heat_transport_w_m2_k: f64,
            #[serde(default)]
            starts_frozen: bool,
            #[serde(default = "usual_ocean")]
            ocean_after_yr: f64,
        },
    }

    #[derive(Deserialize)]
    #[serde(deny_unknown_fields)]
    pub(super) enum Carbon {
        Regulated { mean_k: f64 },
        Held { carbon_dioxide_bar: f64 },
    }

    #[derive(Deserialize)]
    pub(super) enum Tides {
        On,
        Off,
    }

    fn usual_carbon() -> Carbon {
        Carbon::Regulated { mean_k: 288.0 }
    }

    fn one() -> f64 {
        1.0
    }

    fn usual_obliquity() -> f64 {
        23.44
    }

    fn usual_transport() -> f64 {
        0.56464
    }

    fn usual_ocean() -> f64 {
        3e7
    }
}

/// What the oracle reads, as our own value. A radius left out stays ours to work out.
fn read_by_oracle(text: &str, ours: &Scenario) -> Result<Scenario, String> {
    let read: oracle::Longember = ron::from_str(text).map_err(|error| error.to_string())?;
    assert_eq!(read.version, 1);
    let planets = read.planets.into_iter().enumerate().map(|(index, planet)| PlanetSpecification {
        name: planet.name,
        semi_major_axis_au: planet.semi_major_axis_au,
        eccentricity: planet.eccentricity,
        mass_mearth: planet.mass_mearth,
        radius_rearth: if planet.radius_rearth.is_nan() {
            ours.system.planets[index].radius_rearth
        } else {
            planet.radius_rearth
        },
        bond_albedo: planet.bond_albedo,
        redistribution: match planet.redistribution {
            oracle::Redistribution::WholePlanet => Redistribution::WholePlanet,
            oracle::Redistribution::DaySide => Redistribution::DaySide,
            oracle::Redistribution::DaySideFullPhase => Redistribution::DaySideFullPhase,
            oracle::Redistribution::SubStellar => Redistribution::SubStellar,
        },
        emissivity: planet.emissivity,
        greenhouse: match planet.greenhouse {
            oracle::Greenhouse::None => Greenhouse::None,
            oracle::Greenhouse::FixedIncrement { increment_k } => Greenhouse::FixedIncrement { increment_k },
            oracle::Greenhouse::Grey { optical_depth } => Greenhouse::Grey { optical_depth },
        },
        air: match planet.air {
            oracle::Air::Airless => Air::None,
            oracle::Air::EarthLike { surface_pressure_bar } => Air::EarthLike { surface_pressure_bar },
            oracle::Air::CarbonDioxide { surface_pressure_bar } => Air::CarbonDioxide { surface_pressure_bar },
        },
        water: match planet.climate {
            oracle::Climate::None => None,
            oracle::Climate::WaterWorld {
                carbon_dioxide,
                water_oceans,
                obliquity_deg,
                heat_transport_w_m2_k,
                starts_frozen,
                ocean_after_yr,
            } => Some(Water {
                carbon: match carbon_dioxide {
                    oracle::Carbon::Regulated { mean_k } => Carbon::Regulated { mean_k },
                    oracle::Carbon::Held { carbon_dioxide_bar } => Carbon::Held { carbon_dioxide_bar },
                },
                water_oceans,
                obliquity_deg,
                heat_transport_w_m2_k,
                starts_frozen,
                ocean_after_yr,
            }),
        },
        tides: match planet.tides {
            oracle::Tides::On => TidesChoice::On,
            oracle::Tides::Off => TidesChoice::Off,
        },
        initial_day_h: planet.initial_day_h,
        marked_temperature_k: planet.marked_temperature_k,
    });
    let star = StarSpecification {
        name: read.star.name,
        mass_msun: read.star.mass_msun,
        metallicity_dex: read.star.metallicity_dex,
        present_age_yr: read.star.present_age_yr,
        red_dwarf_surface: match read.star.red_dwarf_surface {
            oracle::Surface::Modern => SurfaceOpacity::Modern,
            oracle::Surface::Of1997 => SurfaceOpacity::Of1997,
        },
    };
    let system = System { star, planets: planets.collect() };
    let cues = read.cues.into_iter().map(|cue| Cue {
        show_time_s: cue.show_time_s,
        moment: MomentRequest::parse(&cue.moment).expect("a moment"),
        transition: match cue.transition {
            oracle::Transition::Cut => Transition::Cut,
            oracle::Transition::Steady => Transition::Steady,
            oracle::Transition::SteadyLog => Transition::SteadyLog,
            oracle::Transition::Paced => Transition::Paced,
        },
        note: cue.note,
    });
    let cues = cues.collect();
    let statements = read
        .statements
        .into_iter()
        .map(|row| Statement { note: row.note, ..parse_saved_statement(&row.claim, &system).expect("a statement") });
    let statements = statements.collect();
    Ok(Scenario { title: read.title, about: read.about.replace("\r\n", "\n"), system, statements, cues })
}

/// Values over the whole permitted range, its ends included, and over many powers of ten.
fn value(limit: &'static Limit) -> BoxedStrategy<f64> {
    let inside = move |value: f64| value.clamp(limit.lowest, limit.highest);
    prop_oneof![
        (limit.lowest..=limit.highest),
        any::<f64>().prop_filter_map("finite", move |value| value.is_finite().then(|| inside(value))),
        (-40.0..20.0_f64).prop_map(move |power| inside(10_f64.powf(power))),
        Just(limit.lowest),
        Just(limit.highest),
    ]
    .boxed()
}

fn name() -> impl Strategy<Value = String> {
    "[ -~é☉日\u{200d}\"\\\\]{0,20}[A-Za-z]"
}

fn greenhouse() -> impl Strategy<Value = Greenhouse> {
    prop_oneof![
        Just(Greenhouse::None),
        value(&limits::GREENHOUSE_INCREMENT).prop_map(|increment_k| Greenhouse::FixedIncrement { increment_k }),
        value(&limits::OPTICAL_DEPTH).prop_map(|optical_depth| Greenhouse::Grey { optical_depth }),
    ]
}

fn air() -> impl Strategy<Value = Air> {
    (0..3_usize, value(&limits::SURFACE_PRESSURE))
        .prop_map(|(kind, pressure_bar)| Air::KINDS[kind].at_pressure(pressure_bar))
}

fn water() -> impl Strategy<Value = Option<Water>> {
    let carbon = prop_oneof![
        value(&limits::REGULATED_MEAN).prop_map(|mean_k| Carbon::Regulated { mean_k }),
        value(&limits::CARBON_DIOXIDE).prop_map(|carbon_dioxide_bar| Carbon::Held { carbon_dioxide_bar }),
    ];
    let numbers =
        (value(&limits::WATER), value(&limits::OBLIQUITY), value(&limits::HEAT_TRANSPORT), value(&limits::OCEAN_AFTER));
    prop::option::of((carbon, numbers, any::<bool>()).prop_map(|(carbon, numbers, starts_frozen)| {
        let (water_oceans, obliquity_deg, heat_transport_w_m2_k, ocean_after_yr) = numbers;
        Water { carbon, water_oceans, obliquity_deg, heat_transport_w_m2_k, starts_frozen, ocean_after_yr }
    }))
}

fn planet() -> impl Strategy<Value = PlanetSpecification> {
    let numbers = (
        value(&limits::SEMI_MAJOR_AXIS),
        value(&limits::ECCENTRICITY),
        value(&limits::PLANET_MASS),
        value(&limits::PLANET_RADIUS),
        value(&limits::BOND_ALBEDO),
        value(&limits::EMISSIVITY),
    );
    let optional =
        (prop::option::of(value(&limits::INITIAL_DAY)), prop::option::of(value(&limits::MARKED_TEMPERATURE)));
    let choices = (0..4_usize, greenhouse(), air(), water(), 0..2_usize, optional);
    (name(), numbers, choices).prop_map(|(name, numbers, choices)| {
        let (redistribution, greenhouse, air, water, tides, optional) = choices;
        let (initial_day_h, marked_temperature_k) = optional;
        let (semi_major_axis_au, eccentricity, mass_mearth, radius_rearth, bond_albedo, emissivity) = numbers;
        PlanetSpecification {
            name,
            semi_major_axis_au,
            eccentricity,
            mass_mearth,
            radius_rearth,
            bond_albedo,
            redistribution: Redistribution::ALL[redistribution],
            emissivity,
            greenhouse,
            air,
            water,
            tides: TidesChoice::ALL[tides],
            initial_day_h,
            marked_temperature_k,
        }
    })
}

fn moment() -> impl Strategy<Value = MomentRequest> {
    prop_oneof![
        value(&limits::PRESENT_AGE).prop_map(|time_yr| MomentRequest::Time(time_yr.abs())),
        Just(MomentRequest::Now),
        "[a-z:é'\"“”]([ -~é☉日]{0,20}[A-Za-z])?".prop_map(MomentRequest::Event),
    ]
}

fn cue() -> impl Strategy<Value = Cue> {
    ((0.0..=LONGEST_SHOW_S), moment(), 0..4_usize, "([a-z\"\\\\é☉ ]{0,9}[ -~]){0,9}").prop_map(
        |(show_time_s, moment, transition, note)| Cue {
            show_time_s,
            moment,
            transition: Transition::ALL[transition],
            note,
        },
    )
}

/// Statements of every kind, about the star, a planet and one that is gone.
fn statement() -> impl Strategy<Value = Statement> {
    let lines = vec![
        "star luminosity at 5 Gyr is about 1 Lsun",
        "star radius ever from now to event 'it\\'s \"so\"' is at least 200.1 Rsun",
        "'Gone \"b\"' surface temperature always is between 253.15 K and 303.15 K",
        "Gone date of event 'engulfed by the star' is about 12 Gyr within 3 %",
        "Gone event 'engulfed by the star' never happens",
        "star duration of main sequence is at most 10 Gyr",
    ];
    (prop::sample::select(lines), "([a-z\"\\\\é☉ ]{0,9}[ -~]){0,9}").prop_map(|(line, note)| Statement {
        note,
        ..parse_saved_statement(line, &Scenario::new_untitled().system).expect("a statement")
    })
}

fn scenario() -> impl Strategy<Value = Scenario> {
    let star =
        (name(), value(&limits::STAR_MASS), value(&limits::METALLICITY), value(&limits::PRESENT_AGE), 0..2_usize);
    let about = "([a-zA-Z\"\\\\é☉,.]{0,12}[ \n]{1,3}){0,60}";
    let rows = (prop::collection::vec(statement(), 0..5), prop::collection::vec(cue(), 0..5));
    let planets = prop::collection::vec(planet(), 0..6);
    (name(), about, star, planets, rows).prop_map(|(title, about, star, mut planets, (statements, cues))| {
        for (index, planet) in planets.iter_mut().enumerate() {
            planet.name.push_str(&index.to_string());
        }
        let (name, mass_msun, metallicity_dex, present_age_yr, surface) = star;
        let red_dwarf_surface = RED_DWARF_SURFACES[surface];
        let star = StarSpecification { name, mass_msun, metallicity_dex, present_age_yr, red_dwarf_surface };
        Scenario { title, about, system: System { star, planets }, statements, cues }
    })
}

/// Every problem has a place, and the place is in the text or just after a line of it.
fn assert_places(bytes: &[u8], problems: &[Problem]) -> TestCaseResult {
    let text = String::from_utf8_lossy(bytes);
    let lines: Vec<&str> = text.split('\n').collect();
    prop_assert!(!problems.is_empty());
    prop_assert!(problems.len() <= 111, "{} problems help nobody", problems.len());
    for problem in problems {
        let Some(place) = &problem.place else { return Err(TestCaseError::fail(format!("no place: {problem}"))) };
        prop_assert!((1..=lines.len()).contains(&place.line), "{}", problem);
        let columns = lines[place.line - 1].chars().count() + 1;
        prop_assert!((1..=columns).contains(&place.column), "{}", problem);
        let shown = format!(" (any.ron:{}:{})", place.line, place.column);
        prop_assert!(problem.to_string().ends_with(&shown), "{}", problem);
        prop_assert!(!problem.to_string().chars().any(char::is_control), "{:?}", problem.to_string());
    }
    Ok(())
}

/// Reads bytes; a sound text has to be one for the oracle too.
fn read_any(bytes: &[u8]) -> TestCaseResult {
    match scenario_from_bytes(bytes, "any.ron") {
        Ok(read) => {
            prop_assert_eq!(read.scenario.problems(), []);
            let text = std::str::from_utf8(bytes).map_err(|error| TestCaseError::fail(error.to_string()))?;
            let oracle = read_by_oracle(text, &read.scenario).map_err(TestCaseError::fail)?;
            prop_assert_eq!(oracle, read.scenario, "{}", text);
            Ok(())
        }
        Err(LoadError::Unsound { problems }) => assert_places(bytes, &problems),
        Err(error) => Err(TestCaseError::fail(format!("no file is involved: {error}"))),
    }
}

#[derive(Clone, Debug)]
enum Damage {
    Remove(Index, usize),
    Insert(Index, Vec<u8>),
    Repeat(Index, Index, usize),
    Cut(Index),
}

fn damage() -> impl Strategy<Value = Damage> {
    let fragment = prop_oneof![
        prop::collection::vec(any::<u8>(), 1..4),
        prop::sample::select(&b"()[]{}:,\"\\/*#r-+.e0 9_\n"[..]).prop_map(|byte| vec![byte]),
        prop::sample::select(vec![
            "Some(",
            "/*",
            "//",
            "r#\"",
            "None",
            "1e400",
            "planets: [",
            "(name: ",
            "\u{2212}",
            "\\u{"
        ])
        .prop_map(|text| text.as_bytes().to_vec()),
    ];
    prop_oneof![
        (any::<Index>(), 1..20_usize).prop_map(|(at, count)| Damage::Remove(at, count)),
        (any::<Index>(), fragment).prop_map(|(at, bytes)| Damage::Insert(at, bytes)),
        (any::<Index>(), any::<Index>(), 1..60_usize).prop_map(|(from, to, count)| Damage::Repeat(from, to, count)),
        any::<Index>().prop_map(Damage::Cut),
    ]
}

fn damaged(mut bytes: Vec<u8>, damages: &[Damage]) -> Vec<u8> {
    for damage in damages {
        let places = bytes.len() + 1;
        match damage {
            Damage::Remove(at, count) => {
                let at = at.index(places);
                bytes.drain(at..(at + count).min(bytes.len()));
            }
            Damage::Insert(at, inserted) => {
                let at = at.index(places);
                bytes.splice(at..at, inserted.iter().copied());
            }
            Damage::Repeat(from, to, count) => {
                let (from, to) = (from.index(places), to.index(places));
                let piece = bytes[from..(from + count).min(bytes.len())].to_vec();
                bytes.splice(to..to, piece);
            }
            Damage::Cut(at) => bytes.truncate(at.index(places)),
        }
    }
    bytes
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 256, ..ProptestConfig::default() })]

    #[test]
    fn a_scenario_comes_back_to_the_last_bit(scenario in scenario()) {
        prop_assert_eq!(scenario.problems(), []);
        let text = scenario_text(&scenario);
        let read = parse_scenario(&text, "any.ron").map_err(|problems| TestCaseError::fail(format!("{problems:?}\n{text}")))?;
        prop_assert_eq!(&read, &scenario);
        prop_assert_eq!(scenario_text(&read), text.clone());
        let oracle = read_by_oracle(&text, &scenario).map_err(TestCaseError::fail)?;
        prop_assert_eq!(&oracle, &scenario);
    }

    #[test]
    fn a_damaged_file_is_refused_with_places(
        which in 0..9_usize,
        damages in prop::collection::vec(damage(), 1..4),
    ) {
        let text = built_in::all()[which % built_in::all().len()].text;
        read_any(&damaged(text.as_bytes().to_vec(), &damages))?;
    }

    #[test]
    fn random_bytes_are_refused_with_places(bytes in prop::collection::vec(any::<u8>(), 0..400)) {
        read_any(&bytes)?;
    }

    #[test]
    fn random_words_are_refused_with_places(
        words in prop::collection::vec(
            prop::sample::select(vec![
                "(", ")", "[", "]", "{", "}", ",", ":", "\"x\"", "1", "-", "name", "star", "planets", "version", "Some(",
                "None", "//\n", "/*", "*/", "r#\"", "\"", "\\", "\n", " ", "Grey(", "greenhouse", "é", "NaN", "1e999",
            ]),
            0..80,
        ),
    ) {
        read_any(words.concat().as_bytes())?;
    }
}

#[test]
fn one_field_out_of_range_is_one_problem_at_its_value() {
    let text = scenario_text(&built_in::demo().scenario().expect("sound"));
    for limit in limits::ALL {
        let Some(at) = text.find(&format!("{}: ", limit.key)) else { continue };
        let start = at + limit.key.len() + 2;
        let end = start + text[start..].find([',', ')']).expect("a next field");
        for (wrong, shown) in [("1e300", true), ("-1e300", true), ("\"x\"", false), ("Some", false), ("[1]", false)] {
            let wrong_text = format!("{}{wrong}{}", &text[..start], &text[end..]);
            let problems = parse_scenario(&wrong_text, "any.ron").expect_err("out of range");
            assert_eq!(problems.len(), 1, "{}: {problems:?}", limit.key);
            let problem = &problems[0];
            let line = text[..start].matches('\n').count() + 1;
            let column = text[..start].chars().rev().take_while(|character| *character != '\n').count() + 1;
            let place = problem.place.as_ref().expect("a place");
            assert_eq!((place.line, place.column), (line, column), "{problem}");
            assert_eq!(problem.key, Some(limit.key));
            assert!(problem.to_string().contains(&limit.allowed()), "{problem}");
            assert!(!shown || matches!(problem.fault, longember::document::Fault::Input(_)), "{problem}");
        }
    }
}

#[test]
fn each_kind_of_problem_reads_as_a_sentence() {
    let star = "star: (name: \"Aldo\", mass_msun: 1, metallicity_dex: 0, present_age_yr: 0)";
    let ember = "name: \"Ember\", semi_major_axis_au: 1, mass_mearth: 1";
    let cases = [
        (format!("(title: \"T\", {star})"), "version is missing, allowed 1; add it (a.ron:1:1)"),
        (
            format!("(version: 2, title: 3, {star}, new: 1)"),
            "version is 2, allowed up to 1: the file was written by a newer Longember; open it with that one (a.ron:1:11)",
        ),
        (format!("(version: 0.5, title: \"T\", {star})"), "version is 0.5, allowed 1 (a.ron:1:11)"),
        (
            format!("(version: 1, title: \"T\",\ntitle: \"U\", {star})"),
            "title is given a second time, allowed once; remove this one or the one in line 1 (a.ron:2:1)",
        ),
        (
            format!("Other(version: 1, title: \"T\", {star})"),
            "the group is named Other, allowed Longember or no name (a.ron:1:1)",
        ),
        ("[1]".to_owned(), "the scenario is a list […], allowed Longember(version: …) (a.ron:1:1)"),
        (format!("(version: 1, title: \"\", {star})"), "title is empty, allowed 1 to 120 characters (a.ron:1:21)"),
        (format!("(version: 1, title: T, {star})"), "title is T, allowed text in double quotes (a.ron:1:21)"),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [3])"),
            "planet 1: planet is 3, allowed Planet(name: …) (a.ron:1:111)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, greenhouse: Gray(optical_depth: 1))])"),
            "planet 1 \"Ember\": greenhouse is Gray(…), allowed None, FixedIncrement, Grey; did you mean Grey? (a.ron:1:178)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, greenhouse: Grey)])"),
            "planet 1 \"Ember\": greenhouse is Grey, allowed None, FixedIncrement(increment_k: …), Grey(optical_depth: …) (a.ron:1:178)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, redistribution: Dayside)])"),
            "planet 1 \"Ember\": redistribution is Dayside, allowed WholePlanet, DaySide, DaySideFullPhase, SubStellar; did you mean DaySide? (a.ron:1:182)",
        ),
        (
            format!(
                "(version: 1, title: \"T\", {star}, planets: [({ember}, climate: WaterWorld(carbon_dioxide: Held(carbon_dioxide_bar: 100)))])"
            ),
            "planet 1 \"Ember\": carbon_dioxide_bar is 100, allowed 0.0001 to 3 bar (a.ron:1:227)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, climate: WaterWorld(starts_frozen: 1))])"),
            "planet 1 \"Ember\": starts_frozen is 1, allowed true, false (a.ron:1:201)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, climate: Waterworld)])"),
            "planet 1 \"Ember\": climate is Waterworld, allowed None, WaterWorld; did you mean WaterWorld? (a.ron:1:175)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, air: EarthLike)])"),
            "planet 1 \"Ember\": air is EarthLike, allowed Airless, EarthLike(surface_pressure_bar: …), CarbonDioxide(surface_pressure_bar: …) (a.ron:1:171)",
        ),
        (
            format!("(version: 1, title: \"T\", {star}, planets: [({ember}, air: Airles)])"),
            "planet 1 \"Ember\": air is Airles, allowed Airless, EarthLike, CarbonDioxide; did you mean Airless? (a.ron:1:171)",
        ),
    ];
    for (text, expected) in cases {
        let lines: Vec<_> =
            parse_scenario(&text, "a.ron").expect_err(expected).iter().map(ToString::to_string).collect();
        assert_eq!(lines, [expected], "{text}");
    }
}

#[test]
fn keys_may_be_left_out_or_wrapped() {
    let text = "Longember(version: 1, title: \"T\", about: None, star: Star(name: \"A\", mass_msun: 1, metallicity_dex: 0, \
                present_age_yr: 0), planets: Some([Planet(name: \"B\", semi_major_axis_au: Some(2), eccentricity: None, \
                mass_mearth: 8, greenhouse: Some(None))]))";
    let scenario = parse_scenario(text, "a.ron").expect("sound");
    let expected = PlanetSpecification {
        name: "B".to_owned(),
        semi_major_axis_au: 2.0,
        mass_mearth: 8.0,
        radius_rearth: longember::physics::planet::bulk::default_radius_rearth(8.0).expect("in range").radius_rearth,
        ..PlanetSpecification::default()
    };
    assert_eq!(scenario.system.planets, [expected]);
}

#[test]
fn a_flood_of_planets_is_counted_and_not_waded_through() {
    let star = "star: (name: \"A\", mass_msun: 1, metallicity_dex: 0, present_age_yr: 0)";
    let text = format!("(version: 1, title: \"T\", {star}, planets: [{}])", "(name: \"B\"),".repeat(200_000));
    let problems = parse_scenario(&text, "a.ron").expect_err("too many");
    assert!(
        problems.iter().any(|problem| problem.to_string().contains("there are 200000 planets, allowed at most 24"))
    );
    assert!(problems.len() <= 101);
}
