//! What stands in a planet's sky: the star to scale, the colour of clear air, and how bright it all is.

use super::light_columns::{columns, figure, figures};
use super::{sky_altitude, sky_scene};
use crate::figure::{SkyPicture, SkyView};
use crate::physics::light::{SeenLight, Viewing, VisibleSpectrum, seen};
use crate::system::light_quantities::PLANET_LIGHT;
use crate::system::planet_light::clear_air;
use crate::system::{Air, Body, Moment, PlanetLight, PlanetSpecification, PlanetState, Starlight};
use crate::units::number_text::{fixed, number};
use crate::window::command::Command;
use crate::window::theme::{GRID, Palette, small};
use crate::window::widgets::choice::{caption, word};
use crate::window::widgets::figure_row::{FigureRow, UNIT, WordRow, figure_row, word_row};
use crate::window::widgets::heading::section;
use crate::window::workspace::Workspace;
use egui::{Rect, RichText, Role, ScrollArea, Sense, Ui, WidgetInfo, vec2};

/// Least and largest height of the picture, points.
const PICTURE_HEIGHT: [f32; 2] = [150.0, 440.0];

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let planets = &workspace.history.system().planets;
    let Some(first) = planets.first() else {
        ui.add_space(4.0 * GRID);
        ui.label(RichText::new("No planet to stand on yet. Add one on the left to see its sky.").color(palette.dim));
        return Vec::new();
    };
    let index = match workspace.selected {
        Body::Planet(index) if index < planets.len() => index,
        _ => 0,
    };
    let planet = planets.get(index).unwrap_or(first);
    let moment = workspace.moment();
    let mut commands = chooser(ui, workspace, index);
    commands.extend(switches(ui, workspace, planet));
    let light = light_of(&moment, planet, index, workspace.sky_view);
    let height = (0.56 * ui.available_height()).clamp(PICTURE_HEIGHT[0], PICTURE_HEIGHT[1]);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        let (area, response) = ui.allocate_exact_size(vec2(ui.available_width(), height), Sense::hover());
        let rect = area.shrink(1.0);
        let picture = light.as_ref().and_then(|light| SkyPicture::new(light, workspace.sky_view));
        let words = match &picture {
            Some(picture) => description(picture, planet, workspace.sky_view),
            None => why_no_sky(&moment, planet, index),
        };
        response.widget_info(|| WidgetInfo::labeled(Role::Image, true, words.as_str()));
        match &picture {
            Some(picture) => sky_scene::draw(ui, rect, picture, palette),
            None => no_sky(ui, rect, palette, &words),
        }
        cautions(ui, workspace, planet, picture.as_ref());
        columns(ui, |ui, column, count| {
            let groups: &[&[Group]] = match count {
                1 => &[&[Group::Colours, Group::Star, Group::Ground, Group::Life]],
                2 => &[&[Group::Colours, Group::Life], &[Group::Star, Group::Ground]],
                _ => &[&[Group::Colours], &[Group::Star, Group::Ground], &[Group::Life]],
            };
            for group in groups.get(column).copied().unwrap_or_default() {
                commands.extend(group.draw(ui, palette, light.as_ref()));
            }
        });
        ui.add_space(4.0 * GRID);
    });
    commands
}

/// The light on a planet with the star as high and the air as chosen.
fn light_of(moment: &Moment, planet: &PlanetSpecification, index: usize, view: SkyView) -> Option<PlanetLight> {
    let star = Starlight::of(&moment.star)?;
    let spectrum = VisibleSpectrum::of_blackbody(star.temperature_k).ok()?;
    let air = clear_air(planet, view.altitude_deg, view.with_air);
    PlanetLight::of(&moment.star, &star, &spectrum, moment.planets.get(index)?, air.as_ref())
}

fn chooser(ui: &mut Ui, workspace: &Workspace, chosen: usize) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        caption(ui, palette, "Sky of");
        for (index, planet) in workspace.history.system().planets.iter().enumerate() {
            if word(ui, palette, &planet.name, index == chosen).clicked() {
                commands.push(Command::Select(Body::Planet(index)));
            }
        }
    });
    commands
}

fn switches(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification) -> Vec<Command> {
    let palette = workspace.palette();
    let view = workspace.sky_view;
    let mut commands = Vec::new();
    let mut set = |view| commands.push(Command::SetSkyView(view));
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 2.5 * GRID;
        caption(ui, palette, "Star at");
        if let Some(altitude_deg) = sky_altitude::show(ui, palette, view.altitude_deg) {
            set(SkyView { altitude_deg, ..view });
        }
        let has_air = planet.air != Air::None;
        for (with_air, words) in [(true, "air"), (false, "no air")] {
            let is_chosen = if has_air { view.with_air == with_air } else { !with_air };
            let response = word(ui, palette, words, is_chosen);
            let hint = if has_air {
                "As given on the left, or taken away"
            } else {
                "This planet has no air; give it some on the left"
            };
            if response.on_hover_text(hint).clicked() {
                set(SkyView { with_air, ..view });
            }
        }
        for (viewing, words, hint) in [
            (Viewing::Camera, "as emitted", "As a camera balanced for daylight (D65) takes it"),
            (
                Viewing::AdaptedEye,
                "adapted eye",
                "As an eye sees it that has grown used to this star, which is white to it",
            ),
        ] {
            if word(ui, palette, words, view.viewing == viewing).on_hover_text(hint).clicked() {
                set(SkyView { viewing, ..view });
            }
        }
    });
    commands
}

fn description(picture: &SkyPicture, planet: &PlanetSpecification, view: SkyView) -> String {
    let colour = |light: &Option<SeenLight>| light.map_or_else(|| "black".to_owned(), |light| light.name.to_string());
    format!(
        "Sky of {}, {}: {}; the star {} degrees up, {} degrees wide, {}",
        planet.name,
        viewing_words(view.viewing),
        colour(&picture.sky),
        number(picture.altitude_deg, 3),
        number(picture.star_diameter_deg, 3),
        if picture.disc_is_seen { colour(&picture.disc) } else { "not to be made out".to_owned() },
    )
}

fn viewing_words(viewing: Viewing) -> &'static str {
    match viewing {
        Viewing::Camera => "as emitted",
        Viewing::AdaptedEye => "as an adapted eye sees it",
    }
}

fn why_no_sky(moment: &Moment, planet: &PlanetSpecification, index: usize) -> String {
    let name = &planet.name;
    match moment.planets.get(index).map(|planet| planet.state) {
        Some(PlanetState::Engulfed) => format!("The star has swallowed {name}."),
        Some(PlanetState::Unbound) => format!("{name} no longer orbits the star: no star stands in its sky."),
        Some(PlanetState::Dark) => format!("No light is modelled of what {name} orbits now."),
        _ => format!("No sky can be worked out for {name}: its gravity holds no air."),
    }
}

/// A place kept for the picture, with the reason why there is none.
fn no_sky(ui: &Ui, rect: Rect, palette: &Palette, words: &str) {
    ui.painter().rect_filled(rect, 0.0, palette.panel);
    ui.painter().rect_stroke(rect, 0.0, egui::Stroke::new(1.0, palette.hairline), egui::StrokeKind::Outside);
    let galley = ui.painter().layout(words.to_owned(), crate::window::theme::usual(), palette.dim, rect.width() - 40.0);
    ui.painter().galley(rect.center() - 0.5 * galley.size(), galley, palette.dim);
}

/// How to read the picture, and the usual caution.
fn cautions(ui: &mut Ui, workspace: &Workspace, planet: &PlanetSpecification, picture: Option<&SkyPicture>) {
    let palette = workspace.palette();
    let view = workspace.sky_view;
    let air = match (planet.air.surface_pressure_bar(), view.with_air) {
        (Some(pressure_bar), true) => {
            format!("{}, {} bar, clean and clear", planet.air.name(), number(pressure_bar, 3))
        }
        _ => "no air".to_owned(),
    };
    let viewing = match view.viewing {
        Viewing::Camera => "colours as emitted, on a screen with D65 white",
        Viewing::AdaptedEye => "colours as an eye sees them that is used to this star",
    };
    let exposure = "exposed for the sunlit ground; the disc is far brighter than a screen can show";
    ui.label(RichText::new(format!("{air}; {viewing}; {exposure}.")).font(small()).color(palette.dim));
    if let Some(words) = picture.and_then(|picture| picture.vision.words()) {
        ui.label(RichText::new(words).font(small()).color(palette.dim));
    }
    let caution = "Looking at a star is dangerous, even at a dim or low one: the picture says nothing about safety.";
    ui.label(RichText::new(caution).font(small()).color(palette.text));
}

/// A group of figures under one heading.
#[derive(Clone, Copy)]
enum Group {
    Colours,
    Star,
    Ground,
    Life,
}

impl Group {
    fn draw(self, ui: &mut Ui, palette: &Palette, light: Option<&PlanetLight>) -> Vec<Command> {
        match self {
            Self::Colours => colours(ui, palette, light),
            Self::Star => star(ui, palette, light),
            Self::Ground => ground(ui, palette, light),
            Self::Life => life(ui, palette, light),
        }
    }
}

fn colours(ui: &mut Ui, palette: &Palette, light: Option<&PlanetLight>) -> Vec<Command> {
    let mut commands = Vec::new();
    let sky = light.and_then(|light| light.sky.as_ref());
    for (heading, short, viewing, method) in [
        ("As emitted, D65 screen", "as emitted", Viewing::Camera, "clear_sky"),
        ("As an adapted eye sees it", "to an adapted eye", Viewing::AdaptedEye, "adapted_eye"),
    ] {
        section(ui, palette, heading);
        for (name, of) in [("Sky", 0), ("Disc", 1), ("Daylight", 2)] {
            let seen = sky.and_then(|sky| {
                let light = [sky.dome, sky.disc, sky.daylight()][of];
                seen(light, sky.star_above_air, viewing)
            });
            let none = if sky.is_some() { "black" } else { "–" };
            let words = seen.map_or_else(|| none.to_owned(), |light| light.name.to_string());
            let swatch = seen.map(|light| light.screen.srgb);
            let full_name = format!("{name} {short}");
            let row = WordRow { full_name: &full_name, swatch, ..WordRow::new(name, &words, method) };
            commands.extend(word_row(ui, palette, &row));
        }
        let xy = sky.and_then(|sky| seen(sky.dome, sky.star_above_air, viewing)).map_or_else(
            || "–".to_owned(),
            |light| {
                let [x, y] = light.chromaticity.xy();
                format!("{}, {}, {}", fixed(x, 4), fixed(y, 4), light.screen.hex())
            },
        );
        let full_name = format!("Sky x, y {short}");
        let row = WordRow { full_name: &full_name, ..WordRow::new("Sky x, y", &xy, method) };
        commands.extend(word_row(ui, palette, &row));
    }
    commands
}

fn star(ui: &mut Ui, palette: &Palette, light: Option<&PlanetLight>) -> Vec<Command> {
    section(ui, palette, "Star in the sky");
    let mut commands = Vec::new();
    let disc = light.and_then(|light| light.disc);
    let rows = [
        ("Width", disc.map(|disc| disc.diameter_deg), 3, "°", "angular_diameter"),
        ("In half-degree discs", light.and_then(PlanetLight::star_over_half_degree), 3, "×", "angular_diameter"),
        ("Brightness of the disc", light.and_then(PlanetLight::disc_luminance_cd_m2), 3, "cd/m²", "clear_sky"),
    ];
    for (name, value, digits, symbol, method) in rows {
        let text = value.map_or_else(|| "–".to_owned(), |value| number(value, digits));
        let symbol = if value.is_some() { symbol } else { "" };
        let row = FigureRow { name, value, text, symbol, spread: None, method, unit_room: UNIT, told_of: None };
        commands.extend(figure_row(ui, palette, &row));
    }
    commands.extend(figures(ui, palette, PLANET_LIGHT, &["star_visual_mag"], light));
    commands
}

fn ground(ui: &mut Ui, palette: &Palette, light: Option<&PlanetLight>) -> Vec<Command> {
    section(ui, palette, "Light on the ground");
    let names = [
        ("illuminance_lx", "Above the air, facing it"),
        ("ground_illuminance_lx", "Level ground"),
        ("sky_illuminance_lx", "of it from the sky"),
        ("sky_luminance_cd_m2", "Brightness of the sky"),
    ];
    names
        .into_iter()
        .filter_map(|(key, name)| Some((PLANET_LIGHT.iter().find(|quantity| quantity.key == key)?, name)))
        .filter_map(|(quantity, name)| figure(ui, palette, quantity, name, light))
        .collect()
}

fn life(ui: &mut Ui, palette: &Palette, light: Option<&PlanetLight>) -> Vec<Command> {
    section(ui, palette, "Above the air, for life");
    let keys = ["par_photon_flux_umol_m2_s", "ultraviolet_a_w_m2", "ultraviolet_b_w_m2", "ultraviolet_c_w_m2"];
    figures(ui, palette, PLANET_LIGHT, &keys, light)
}
