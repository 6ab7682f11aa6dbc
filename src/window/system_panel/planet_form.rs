//! The inputs of the chosen planet: what it is, its climate, tides and air; seldom needed ones folded away.

use super::edit;
use crate::physics::planet::tides::Spin;
use crate::physics::planet::{Greenhouse, Redistribution};
use crate::system::limits::{
    BOND_ALBEDO, CARBON_DIOXIDE, ECCENTRICITY, EMISSIVITY, GREENHOUSE_INCREMENT, HEAT_TRANSPORT, INITIAL_DAY,
    LONGEST_NAME, Limit, MARKED_TEMPERATURE, OBLIQUITY, OCEAN_AFTER, OPTICAL_DEPTH, PLANET_MASS, PLANET_RADIUS,
    REGULATED_MEAN, SEMI_MAJOR_AXIS, SURFACE_PRESSURE, WATER,
};
use crate::system::planet_past::FREEZING_K;
use crate::system::{Air, Carbon, PlanetSpecification, TidesChoice, Water};
use crate::window::command::Command;
use crate::window::theme::{GRID, small, usual};
use crate::window::widgets::heading::section;
use crate::window::widgets::text_entry::text_entry;
use crate::window::widgets::value_entry::value_entry;
use crate::window::workspace::Workspace;
use egui::{Align, Align2, CollapsingHeader, ComboBox, Layout, RichText, Sense, Ui, pos2, vec2};

/// A number of a planet: its limit, and how to read and write it.
type Field = (&'static Limit, fn(&PlanetSpecification) -> f64, fn(&mut PlanetSpecification, f64));
/// A number of a planet's surface water.
type WaterField = (&'static Limit, fn(&Water) -> f64, fn(&mut Water, f64));

const BODY: [Field; 4] = [
    (&SEMI_MAJOR_AXIS, |planet| planet.semi_major_axis_au, |planet, value| planet.semi_major_axis_au = value),
    (&ECCENTRICITY, |planet| planet.eccentricity, |planet, value| planet.eccentricity = value),
    (&PLANET_MASS, |planet| planet.mass_mearth, |planet, value| planet.mass_mearth = value),
    (&PLANET_RADIUS, |planet| planet.radius_rearth, |planet, value| planet.radius_rearth = value),
];
const ALBEDO: Field = (&BOND_ALBEDO, |planet| planet.bond_albedo, |planet, value| planet.bond_albedo = value);
const RADIATES: Field = (&EMISSIVITY, |planet| planet.emissivity, |planet, value| planet.emissivity = value);
const OCEANS: WaterField = (&WATER, |water| water.water_oceans, |water, value| water.water_oceans = value);
const SELDOM: [WaterField; 3] = [
    (&OBLIQUITY, |water| water.obliquity_deg, |water, value| water.obliquity_deg = value),
    (&HEAT_TRANSPORT, |water| water.heat_transport_w_m2_k, |water, value| water.heat_transport_w_m2_k = value),
    (&OCEAN_AFTER, |water| water.ocean_after_yr, |water, value| water.ocean_after_yr = value),
];

/// What was changed, in words, and how.
type Change = (String, Box<dyn Fn(&mut PlanetSpecification)>);

/// Draws the form of a planet.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, index: usize) -> Option<Command> {
    let palette = workspace.palette();
    let scenario = workspace.scenario();
    let planet = scenario.system.planets.get(index)?;
    section(ui, palette, &planet.name);
    let mut changed: Option<Change> = None;
    let mut renamed = None;
    let width = ui.available_width() - 2.0 * GRID;
    if let Some(name) = text_entry(ui, palette, "Name of the planet", &planet.name, LONGEST_NAME, width) {
        let is_taken = scenario.system.planets.iter().any(|other| other.name == name);
        let name = if is_taken { scenario.system.free_planet_name(&name) } else { name };
        let label = format!("Change name of {}", planet.name);
        renamed = Some(edit(label, scenario, |scenario| scenario.rename_planet(index, &name)));
    }
    ui.add_space(GRID);
    for field in BODY {
        changed = number(ui, workspace, planet, field).or(changed);
    }
    section(ui, palette, "Climate");
    changed = climate(ui, workspace, planet).or(changed);
    changed = marked(ui, workspace, planet).or(changed);
    section(ui, palette, "Tides and air");
    changed = tides_row(ui, workspace, planet.tides).or(changed);
    changed = first_day(ui, workspace, planet).or(changed);
    changed = air(ui, workspace, planet).or(changed);
    renamed.or_else(|| {
        changed.map(|(what, change)| {
            edit(format!("Change {what} of {}", planet.name), scenario, |scenario| {
                if let Some(planet) = scenario.system.planets.get_mut(index) {
                    change(planet);
                }
            })
        })
    })
}

fn said(what: &str, change: impl Fn(&mut PlanetSpecification) + 'static) -> Change {
    (what.to_owned(), Box::new(change))
}

fn number(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification, field: Field) -> Option<Change> {
    let (limit, read, write) = field;
    let value = value_entry(ui, workspace.palette(), &planet.name, limit, read(planet))?;
    Some(said(limit.name, move |planet| write(planet, value)))
}

fn water_number(ui: &mut Ui, workspace: &Workspace, planet: &str, water: Water, field: WaterField) -> Option<Change> {
    let (limit, read, write) = field;
    let value = value_entry(ui, workspace.palette(), planet, limit, read(&water))?;
    Some(said(limit.name, move |planet| {
        let mut water = water;
        write(&mut water, value);
        planet.water = Some(water);
    }))
}

/// Either a greenhouse that is held, or seas that answer to the star.
fn climate(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Option<Change> {
    let hint = "Held: the surface is as warm as light and greenhouse make it. Seas: ice, open water and steam \
        answer to the star by an energy balance of every latitude.";
    let current = usize::from(planet.water.is_some());
    let words = ["held greenhouse", "seas answer to star"];
    let mut changed = None;
    if let Some(chosen) = choice(ui, workspace, "Surface", hint, &words, current) {
        let water = (chosen == 1).then(Water::default);
        changed = Some(said("climate", move |planet| planet.water = water));
    }
    let Some(water) = planet.water else {
        changed = number(ui, workspace, planet, ALBEDO).or(changed);
        changed = greenhouse(ui, workspace, planet).or(changed);
        return folded(ui, &planet.name, |ui| seldom_light(ui, workspace, planet)).or(changed);
    };
    changed = carbon(ui, workspace, &planet.name, water).or(changed);
    changed = water_number(ui, workspace, &planet.name, water, OCEANS).or(changed);
    let hint = "What the planet starts as where its starlight would allow ice and open water alike.";
    let starts = ["with open water", "frozen over"];
    if let Some(chosen) = choice(ui, workspace, "Starts", hint, &starts, usize::from(water.starts_frozen)) {
        let water = Water { starts_frozen: chosen == 1, ..water };
        changed = Some(said("start", move |planet| planet.water = Some(water)));
    }
    let inside = folded(ui, &planet.name, |ui| {
        let mut changed = None;
        for field in SELDOM {
            changed = water_number(ui, workspace, &planet.name, water, field).or(changed);
        }
        let palette = workspace.palette();
        ui.label(RichText::new("When its water is gone:").font(small()).color(palette.dim));
        changed = number(ui, workspace, planet, ALBEDO).or(changed);
        changed = greenhouse(ui, workspace, planet).or(changed);
        seldom_light(ui, workspace, planet).or(changed)
    });
    inside.or(changed)
}

/// What is seldom needed, folded away.
fn folded(ui: &mut Ui, planet: &str, inside: impl FnOnce(&mut Ui) -> Option<Change>) -> Option<Change> {
    let header = CollapsingHeader::new(RichText::new("More").font(small())).id_salt(("more", planet));
    header.show_unindented(ui, inside).body_returned.flatten()
}

fn seldom_light(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Option<Change> {
    let words = Redistribution::ALL.map(Redistribution::name);
    let current = Redistribution::ALL.iter().position(|option| *option == planet.redistribution).unwrap_or(0);
    let hint = "How absorbed light spreads over the globe.";
    let mut changed = number(ui, workspace, planet, RADIATES);
    if let Some(chosen) = choice(ui, workspace, "Redistribution", hint, &words, current) {
        changed = Some(said("redistribution", move |planet| planet.redistribution = Redistribution::ALL[chosen]));
    }
    changed
}

/// Kinds of greenhouse with the value each starts from: the Earth's own.
const GREENHOUSES: [Greenhouse; 3] =
    [Greenhouse::None, Greenhouse::FixedIncrement { increment_k: 33.0 }, Greenhouse::Grey { optical_depth: 0.87 }];

fn greenhouse(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Option<Change> {
    let palette = workspace.palette();
    let words = GREENHOUSES.map(Greenhouse::name);
    let current = GREENHOUSES.iter().position(|option| option.key() == planet.greenhouse.key()).unwrap_or(0);
    let mut changed = None;
    if let Some(chosen) = choice(ui, workspace, "Greenhouse", "Warming by the air, held fixed.", &words, current) {
        changed = Some(said("greenhouse", move |planet| planet.greenhouse = GREENHOUSES[chosen]));
    }
    match planet.greenhouse {
        Greenhouse::None => {}
        Greenhouse::FixedIncrement { increment_k } => {
            if let Some(increment_k) = value_entry(ui, palette, &planet.name, &GREENHOUSE_INCREMENT, increment_k) {
                let greenhouse = Greenhouse::FixedIncrement { increment_k };
                changed = Some(said("greenhouse increment", move |planet| planet.greenhouse = greenhouse));
            }
        }
        Greenhouse::Grey { optical_depth } => {
            if let Some(optical_depth) = value_entry(ui, palette, &planet.name, &OPTICAL_DEPTH, optical_depth) {
                let greenhouse = Greenhouse::Grey { optical_depth };
                changed = Some(said("optical depth", move |planet| planet.greenhouse = greenhouse));
            }
        }
    }
    changed
}

fn carbon(ui: &mut Ui, workspace: &Workspace, name: &str, water: Water) -> Option<Change> {
    let palette = workspace.palette();
    let words = Carbon::KINDS.map(Carbon::name);
    let current = Carbon::KINDS.iter().position(|kind| kind.key() == water.carbon.key()).unwrap_or(0);
    let hint = "What sets the carbon dioxide: weathering and volcanoes, or you.";
    let mut carbon = choice(ui, workspace, "CO₂ is set by", hint, &words, current).map(|chosen| Carbon::KINDS[chosen]);
    match water.carbon {
        Carbon::Regulated { mean_k } => {
            let entered = value_entry(ui, palette, name, &REGULATED_MEAN, mean_k);
            carbon = entered.map(|mean_k| Carbon::Regulated { mean_k }).or(carbon);
        }
        Carbon::Held { carbon_dioxide_bar } => {
            let entered = value_entry(ui, palette, name, &CARBON_DIOXIDE, carbon_dioxide_bar);
            carbon = entered.map(|carbon_dioxide_bar| Carbon::Held { carbon_dioxide_bar }).or(carbon);
        }
    }
    carbon.map(|carbon| said("carbon dioxide", move |planet| planet.water = Some(Water { carbon, ..water })))
}

fn tides_row(ui: &mut Ui, workspace: &Workspace, current: TidesChoice) -> Option<Change> {
    let words = TidesChoice::ALL.map(TidesChoice::name);
    let current = TidesChoice::ALL.iter().position(|option| *option == current).unwrap_or(0);
    let hint = "Tides on planet and star, and the drag of a giant's envelope, with usual strength for the mass.";
    choice(ui, workspace, "Tides", hint, &words, current)
        .map(|chosen| said("tides", move |planet| planet.tides = TidesChoice::ALL[chosen]))
}

/// The first day is usual for the mass until one is chosen.
fn first_day(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Option<Change> {
    let usual_h = Spin::usual(planet.mass_mearth).initial_day_h;
    let words = [format!("usual, {usual_h} h"), "chosen".to_owned()];
    let hint = "How fast the planet turns at first, which decides when its day becomes its year.";
    let row = Optional { name: "Turning", hint, words: [&words[0], &words[1]], limit: &INITIAL_DAY, usual: usual_h };
    row.show(ui, workspace, &planet.name, planet.initial_day_h, |planet, day_h| planet.initial_day_h = day_h)
}

/// A temperature whose first and last moment the chronicle dates.
fn marked(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Option<Change> {
    let row = Optional {
        name: "Chronicle dates",
        hint: "The first and the last moment above a mean surface temperature of your choice.",
        words: ["no temperature", "a temperature"],
        limit: &MARKED_TEMPERATURE,
        usual: FREEZING_K,
    };
    row.show(ui, workspace, &planet.name, planet.marked_temperature_k, |planet, marked_k| {
        planet.marked_temperature_k = marked_k;
    })
}

/// A number that may be left out: a choice, and a field where it is made.
struct Optional<'a> {
    name: &'a str,
    hint: &'a str,
    /// Without and with a number.
    words: [&'a str; 2],
    limit: &'static Limit,
    /// The number that stands there first.
    usual: f64,
}

impl Optional<'_> {
    fn show(
        &self,
        ui: &mut Ui,
        workspace: &Workspace,
        planet: &str,
        current: Option<f64>,
        write: fn(&mut PlanetSpecification, Option<f64>),
    ) -> Option<Change> {
        let chosen = choice(ui, workspace, self.name, self.hint, &self.words, usize::from(current.is_some()));
        let entered = current.and_then(|value| value_entry(ui, workspace.palette(), planet, self.limit, value));
        let value = match (entered, chosen) {
            (Some(value), _) => Some(value),
            (None, Some(1)) => Some(self.usual),
            (None, Some(_)) => None,
            (None, None) => return None,
        };
        Some(said(self.limit.name, move |planet| write(planet, value)))
    }
}

/// The pressure is kept when only the gas changes.
fn air(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Option<Change> {
    let words = Air::KINDS.map(Air::name);
    let current = Air::KINDS.iter().position(|kind| kind.key() == planet.air.key()).unwrap_or(0);
    let pressure_bar = planet.air.surface_pressure_bar();
    let hint = "Clear air that makes the sky; it does not warm the ground.";
    let mut changed = choice(ui, workspace, "Air", hint, &words, current).map(|chosen| {
        let kind = Air::KINDS[chosen];
        let air = pressure_bar.map_or(kind, |pressure_bar| kind.at_pressure(pressure_bar));
        said("air", move |planet| planet.air = air)
    });
    if let Some(current_bar) = pressure_bar
        && let Some(value) = value_entry(ui, workspace.palette(), &planet.name, &SURFACE_PRESSURE, current_bar)
    {
        changed = Some(said("pressure of the air", move |planet| planet.air = planet.air.at_pressure(value)));
    }
    changed
}

/// A row with a list of which one is chosen; returns another choice.
fn choice(
    ui: &mut Ui,
    workspace: &Workspace,
    name: &str,
    hint: &str,
    options: &[&str],
    current: usize,
) -> Option<usize> {
    let mut chosen = None;
    let shown = options.get(current).copied().unwrap_or_default();
    choice_row(ui, workspace, name, hint, shown, |ui| {
        for (index, option) in options.iter().enumerate() {
            if ui.selectable_label(index == current, *option).clicked() && index != current {
                chosen = Some(index);
            }
        }
    });
    chosen
}

/// A name with a choice beside it.
pub(super) fn choice_row(
    ui: &mut Ui,
    workspace: &Workspace,
    name: &str,
    hint: &str,
    current: &str,
    options: impl FnOnce(&mut Ui),
) {
    let palette = workspace.palette();
    ui.horizontal(|ui| {
        let (rect, _) = ui.allocate_exact_size(vec2(92.0, 22.0), Sense::hover());
        ui.painter().text(pos2(rect.left(), rect.center().y), Align2::LEFT_CENTER, name, usual(), palette.text);
        ui.with_layout(Layout::right_to_left(Align::Center), |ui| {
            let response = ComboBox::from_id_salt(name).width(118.0).selected_text(current).show_ui(ui, options);
            response.response.accessible_name(name).on_hover_text(hint);
        });
    });
}
