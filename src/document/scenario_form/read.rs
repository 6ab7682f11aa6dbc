//! Text to scenario.

use super::keys::{
    AIR_KEYS, AIRS, CARBONS, CLIMATES, CURRENT_VERSION, FIXED_INCREMENT_KEYS, GREENHOUSES, GREY_KEYS, HELD_KEYS,
    PLANET_KEYS, REDISTRIBUTIONS, REGULATED_KEYS, SCENARIO, SCENARIO_KEYS, STAR_KEYS, SURFACES, TIDES, WATER_KEYS,
    WATER_WORLD,
};
use super::places::{Owner, Places};
use super::read_rows::{read_cues, read_statements};
use crate::document::problem::{Fault, Problem, Subject};
use crate::document::record_reading::{Fields, Reading};
use crate::document::ron_text::{Node, Value, number_text};
use crate::document::scenario::Scenario;
use crate::physics::planet::bulk::default_radius_rearth;
use crate::physics::planet::{Greenhouse, Redistribution};
use crate::physics::star::convective::SurfaceOpacity;
use crate::system::limits::{self, Limit};
use crate::system::specification::{self, Body, PlanetSpecification, StarSpecification, System};
use crate::system::{Air, Carbon, TidesChoice, Water};

/// A scenario with what its text held besides.
#[derive(Clone, Debug, PartialEq)]
pub struct ScenarioText {
    /// The scenario.
    pub scenario: Scenario,
    /// The comment at the top of the text; it is kept when the file is saved.
    pub header: String,
    /// How many comments stand further down; these are lost when the file is saved.
    pub inner_comments: usize,
}

/// Reads a scenario; `file` is the name that problems show.
///
/// # Errors
/// Every [`Problem`] of the text, in its order.
///
/// # Example
/// ```
/// use longember::document::parse_scenario;
/// let text = "(version: 1, title: \"Two\", star: (name: \"Aldo\", mass_msun: -1, metallicity_dex: 0))";
/// let problems = parse_scenario(text, "two.ron").unwrap_err();
/// assert_eq!(problems.len(), 2);
/// assert_eq!(problems[0].to_string().split(',').next(), Some("star \"Aldo\": present_age_yr is missing"));
/// ```
pub fn parse_scenario(text: &str, file: &str) -> Result<Scenario, Vec<Problem>> {
    parse_scenario_text(text, file).map(|read| read.scenario)
}

/// Reads a scenario and the comments of its text.
///
/// # Errors
/// Every [`Problem`] of the text, in its order.
pub fn parse_scenario_text(text: &str, file: &str) -> Result<ScenarioText, Vec<Problem>> {
    let (mut reading, parsed) = Reading::begin(text, file, SCENARIO);
    let scenario = match &parsed.root {
        Some(root) => read_scenario_node(&mut reading, root)?,
        None => None,
    };
    let problems = reading.finish();
    match scenario {
        Some(scenario) if problems.is_empty() => {
            Ok(ScenarioText { scenario, header: parsed.header, inner_comments: parsed.inner_comments })
        }
        _ => Err(problems),
    }
}

/// Reads a scenario out of a parsed text, with placeholders where there are problems.
///
/// # Errors
/// The one problem that makes all others idle: a version from the future.
pub(in crate::document) fn read_scenario_node(
    reading: &mut Reading<'_>,
    root: &Node,
) -> Result<Option<Scenario>, Vec<Problem>> {
    let Some(fields) = reading.fields(root, SCENARIO, "the scenario", SCENARIO_KEYS, Subject::Whole) else {
        return Ok(None);
    };
    read_version(reading, &fields)?;
    let mut places = Places::new();
    let mut text_of = |reading: &mut Reading<'_>, key, node: Option<&Node>| {
        let node = node?;
        let text = reading.text(node, &Subject::Whole, key)?;
        places.insert((Owner::Whole, key), node.span.start);
        // Editors on some systems end lines with two characters.
        Some(text.replace("\r\n", "\n"))
    };
    let title = reading.required(&fields, "title", "text in double quotes");
    let title = text_of(reading, "title", title).unwrap_or_default();
    let about = text_of(reading, "about", fields.given("about")).unwrap_or_default();
    let star = reading.required(&fields, "star", "(name: …, mass_msun: …, metallicity_dex: …, present_age_yr: …)");
    let star = star.and_then(|node| read_star(reading, node, &mut places)).unwrap_or_default();
    let planets = match fields.given("planets") {
        Some(node) => read_planets(reading, node, &mut places),
        None => Vec::new(),
    };
    let system = System { star, planets };
    let statements =
        fields.given("statements").map_or_else(Vec::new, |node| read_statements(reading, node, &system, &mut places));
    let cues = fields.given("cues").map_or_else(Vec::new, |node| read_cues(reading, node, &mut places));
    let scenario = Scenario { title, about, system, statements, cues };
    for problem in scenario.problems() {
        let owner = Owner::from(&problem.subject);
        // Without a place it is about a placeholder, whose cause was reported already.
        let place = problem.key.and_then(|key| places.get(&(owner, key)));
        if let Some(offset) = place {
            reading.report(*offset, &problem.subject, problem.key, problem.fault);
        }
    }
    Ok(Some(scenario))
}

fn read_version(reading: &mut Reading<'_>, fields: &Fields<'_>) -> Result<(), Vec<Problem>> {
    let allowed = CURRENT_VERSION.to_string();
    let Some(node) = reading.required(fields, "version", &allowed) else { return Ok(()) };
    let Some(version) = reading.number(node, &Subject::Whole, "version", &allowed) else { return Ok(()) };
    let whole = version.fract() == 0.0 && version >= 1.0;
    if whole && version > f64::from(CURRENT_VERSION) {
        let fault = Fault::NewerVersion { found: number_text(version), known: CURRENT_VERSION };
        let place = Some(reading.place(node.span.start));
        return Err(vec![Problem { subject: Subject::Whole, key: Some("version"), fault, place }]);
    }
    if !whole {
        let fault = Fault::BadVersion { found: number_text(version), known: CURRENT_VERSION };
        reading.report(node.span.start, &Subject::Whole, Some("version"), fault);
    }
    Ok(())
}

fn read_star(reading: &mut Reading<'_>, node: &Node, places: &mut Places) -> Option<StarSpecification> {
    let mut fields = reading.fields(node, "Star", "star", STAR_KEYS, Subject::Star { name: name_in(node) })?;
    let usual = StarSpecification::default();
    let mut body = BodyReading { reading, fields: &mut fields, body: Body::Star, places };
    Some(StarSpecification {
        name: body.name().unwrap_or(usual.name),
        mass_msun: body.required_number(&limits::STAR_MASS).unwrap_or(usual.mass_msun),
        metallicity_dex: body.required_number(&limits::METALLICITY).unwrap_or(usual.metallicity_dex),
        present_age_yr: body.required_number(&limits::PRESENT_AGE).unwrap_or(usual.present_age_yr),
        red_dwarf_surface: body.red_dwarf_surface().unwrap_or(usual.red_dwarf_surface),
    })
}

fn read_planets(reading: &mut Reading<'_>, node: &Node, places: &mut Places) -> Vec<PlanetSpecification> {
    let Some(items) = reading.list(node, &Subject::Whole, "planets") else { return Vec::new() };
    let count = items.iter().filter(|item| item.value != Value::Broken).count();
    if count > limits::MOST_PLANETS {
        let fault = specification::Fault::TooManyPlanets { count };
        reading.report(node.span.start, &Subject::Whole, Some("planets"), fault.into());
    }
    let items = items.iter().take(limits::MOST_PLANETS).enumerate();
    items
        .map(|(index, item)| {
            read_planet(reading, item, index, places).unwrap_or_else(|| PlanetSpecification {
                // No file can hold this name, so no other planet is taken for its double.
                name: format!("\0{index}"),
                ..PlanetSpecification::default()
            })
        })
        .collect()
}

fn read_planet(
    reading: &mut Reading<'_>,
    node: &Node,
    index: usize,
    places: &mut Places,
) -> Option<PlanetSpecification> {
    let subject = Subject::Planet { index, name: name_in(node) };
    let mut fields = reading.fields(node, "Planet", "planet", PLANET_KEYS, subject)?;
    let usual = PlanetSpecification::default();
    let mut body = BodyReading { reading, fields: &mut fields, body: Body::Planet(index), places };
    let name = body.name().unwrap_or_else(|| format!("\0{index}"));
    let semi_major_axis_au = body.required_number(&limits::SEMI_MAJOR_AXIS).unwrap_or(usual.semi_major_axis_au);
    let eccentricity = body.optional_number(&limits::ECCENTRICITY).unwrap_or(usual.eccentricity);
    let mass_mearth = body.required_number(&limits::PLANET_MASS).unwrap_or(usual.mass_mearth);
    let radius_rearth = body.optional_number(&limits::PLANET_RADIUS).unwrap_or_else(|| {
        // A mass out of its range is reported; the radius is then of no account.
        default_radius_rearth(mass_mearth).map_or(usual.radius_rearth, |radius| radius.radius_rearth)
    });
    Some(PlanetSpecification {
        name,
        semi_major_axis_au,
        eccentricity,
        mass_mearth,
        radius_rearth,
        bond_albedo: body.optional_number(&limits::BOND_ALBEDO).unwrap_or(usual.bond_albedo),
        redistribution: body.redistribution().unwrap_or(usual.redistribution),
        emissivity: body.optional_number(&limits::EMISSIVITY).unwrap_or(usual.emissivity),
        greenhouse: body.greenhouse().unwrap_or(usual.greenhouse),
        air: body.air().unwrap_or(usual.air),
        water: body.climate(),
        tides: body.tides().unwrap_or(usual.tides),
        initial_day_h: body.optional_number(&limits::INITIAL_DAY),
        marked_temperature_k: body.optional_number(&limits::MARKED_TEMPERATURE),
    })
}

/// The name a node gives its body, for messages; empty if it gives none.
fn name_in(node: &Node) -> String {
    let Value::Record(record) = &node.value else { return String::new() };
    let name = record.fields.iter().find(|field| field.key == "name").map(|field| &field.value.value);
    match name {
        Some(Value::Text(name)) => name.chars().take(limits::LONGEST_NAME).collect(),
        _ => String::new(),
    }
}

/// One body whose fields are being taken.
struct BodyReading<'r, 't, 'n> {
    reading: &'r mut Reading<'t>,
    fields: &'r mut Fields<'n>,
    body: Body,
    places: &'r mut Places,
}

impl BodyReading<'_, '_, '_> {
    fn name(&mut self) -> Option<String> {
        let node = self.reading.required(self.fields, "name", "text in double quotes")?;
        let name = self.reading.text(node, &self.fields.subject, "name")?;
        self.places.insert((Owner::Body(self.body), "name"), node.span.start);
        Some(name.to_owned())
    }

    fn required_number(&mut self, limit: &'static Limit) -> Option<f64> {
        let node = self.reading.required(self.fields, limit.key, &limit.allowed())?;
        self.number(node, limit)
    }

    fn optional_number(&mut self, limit: &'static Limit) -> Option<f64> {
        let node = self.fields.given(limit.key)?;
        self.number(node, limit)
    }

    fn number(&mut self, node: &Node, limit: &'static Limit) -> Option<f64> {
        let number = self.reading.number(node, &self.fields.subject, limit.key, &limit.allowed())?;
        self.places.insert((Owner::Body(self.body), limit.key), node.span.start);
        Some(number)
    }

    fn red_dwarf_surface(&mut self) -> Option<SurfaceOpacity> {
        let node = self.fields.given("red_dwarf_surface")?;
        let subject = &self.fields.subject;
        if !matches!(node.value, Value::Name(_)) {
            self.reading.wrong_kind(node, subject, "red_dwarf_surface", SURFACES.join(", "));
            return None;
        }
        let index = self.reading.choice(node, subject, "red_dwarf_surface", SURFACES)?;
        specification::RED_DWARF_SURFACES.get(index).copied()
    }

    fn redistribution(&mut self) -> Option<Redistribution> {
        let node = self.fields.given("redistribution")?;
        let subject = &self.fields.subject;
        if !matches!(node.value, Value::Name(_)) {
            self.reading.wrong_kind(node, subject, "redistribution", REDISTRIBUTIONS.join(", "));
            return None;
        }
        let index = self.reading.choice(node, subject, "redistribution", REDISTRIBUTIONS)?;
        Redistribution::ALL.get(index).copied()
    }

    fn greenhouse(&mut self) -> Option<Greenhouse> {
        let node = self.fields.get("greenhouse")?;
        let kind = self.reading.choice(node, &self.fields.subject, "greenhouse", GREENHOUSES)?;
        match (kind, &node.value) {
            (0, Value::Name(_)) => Some(Greenhouse::None),
            (1, Value::Record(_)) => {
                let group = ("greenhouse", GREENHOUSES[1], FIXED_INCREMENT_KEYS);
                let increment_k = self.parameter(node, group, &limits::GREENHOUSE_INCREMENT)?;
                Some(Greenhouse::FixedIncrement { increment_k })
            }
            (2, Value::Record(_)) => {
                let optical_depth =
                    self.parameter(node, ("greenhouse", GREENHOUSES[2], GREY_KEYS), &limits::OPTICAL_DEPTH)?;
                Some(Greenhouse::Grey { optical_depth })
            }
            _ => {
                let allowed = "None, FixedIncrement(increment_k: …), Grey(optical_depth: …)".to_owned();
                self.reading.wrong_kind(node, &self.fields.subject, "greenhouse", allowed);
                None
            }
        }
    }

    fn air(&mut self) -> Option<Air> {
        let node = self.fields.given("air")?;
        let kind = self.reading.choice(node, &self.fields.subject, "air", AIRS)?;
        match (Air::KINDS.get(kind)?, &node.value) {
            (Air::None, Value::Name(_)) => Some(Air::None),
            (air @ (Air::EarthLike { .. } | Air::CarbonDioxide { .. }), Value::Record(_)) => {
                let pressure_bar = self.parameter(node, ("air", AIRS[kind], AIR_KEYS), &limits::SURFACE_PRESSURE)?;
                Some(air.at_pressure(pressure_bar))
            }
            _ => {
                let allowed =
                    "Airless, EarthLike(surface_pressure_bar: …), CarbonDioxide(surface_pressure_bar: …)".to_owned();
                self.reading.wrong_kind(node, &self.fields.subject, "air", allowed);
                None
            }
        }
    }

    fn tides(&mut self) -> Option<TidesChoice> {
        let node = self.fields.given("tides")?;
        if !matches!(node.value, Value::Name(_)) {
            self.reading.wrong_kind(node, &self.fields.subject, "tides", TIDES.join(", "));
            return None;
        }
        let index = self.reading.choice(node, &self.fields.subject, "tides", TIDES)?;
        TidesChoice::ALL.get(index).copied()
    }

    fn climate(&mut self) -> Option<Water> {
        let node = self.fields.given("climate")?;
        self.reading.choice(node, &self.fields.subject, "climate", CLIMATES)?;
        let subject = self.fields.subject.clone();
        let mut inner = self.reading.fields(node, WATER_WORLD, "climate", WATER_KEYS, subject)?;
        let usual = Water::default();
        let mut water = BodyReading { reading: self.reading, fields: &mut inner, body: self.body, places: self.places };
        Some(Water {
            carbon: water.carbon().unwrap_or(usual.carbon),
            water_oceans: water.optional_number(&limits::WATER).unwrap_or(usual.water_oceans),
            obliquity_deg: water.optional_number(&limits::OBLIQUITY).unwrap_or(usual.obliquity_deg),
            heat_transport_w_m2_k: water
                .optional_number(&limits::HEAT_TRANSPORT)
                .unwrap_or(usual.heat_transport_w_m2_k),
            starts_frozen: water.truth("starts_frozen").unwrap_or(usual.starts_frozen),
            ocean_after_yr: water.optional_number(&limits::OCEAN_AFTER).unwrap_or(usual.ocean_after_yr),
        })
    }

    fn carbon(&mut self) -> Option<Carbon> {
        let node = self.fields.given("carbon_dioxide")?;
        let kind = self.reading.choice(node, &self.fields.subject, "carbon_dioxide", CARBONS)?;
        if !matches!(node.value, Value::Record(_)) {
            let allowed = "Regulated(mean_k: …), Held(carbon_dioxide_bar: …)".to_owned();
            self.reading.wrong_kind(node, &self.fields.subject, "carbon_dioxide", allowed);
            return None;
        }
        if kind == 0 {
            let mean_k =
                self.parameter(node, ("carbon_dioxide", CARBONS[0], REGULATED_KEYS), &limits::REGULATED_MEAN)?;
            return Some(Carbon::Regulated { mean_k });
        }
        let carbon_dioxide_bar =
            self.parameter(node, ("carbon_dioxide", CARBONS[1], HELD_KEYS), &limits::CARBON_DIOXIDE)?;
        Some(Carbon::Held { carbon_dioxide_bar })
    }

    fn truth(&mut self, key: &'static str) -> Option<bool> {
        let node = self.fields.given(key)?;
        if let Value::Truth(truth) = node.value {
            return Some(truth);
        }
        self.reading.wrong_kind(node, &self.fields.subject, key, "true, false".to_owned());
        None
    }

    /// The one number in the brackets of a choice: `of` is the key of the choice, its name, and the key in the brackets.
    fn parameter(
        &mut self,
        node: &Node,
        of: (&'static str, &'static str, &'static [&'static str]),
        limit: &'static Limit,
    ) -> Option<f64> {
        let subject = self.fields.subject.clone();
        let (choice, name, keys) = of;
        let inner = self.reading.fields(node, name, choice, keys, subject)?;
        let number = self.reading.required(&inner, limit.key, &limit.allowed())?;
        self.number(number, limit)
    }
}
