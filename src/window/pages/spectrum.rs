//! The star's spectrum beside a reference star's, and its light in numbers for eyes, screens and telescopes.

use super::light_columns::{columns, figure, figures};
use super::spectrum_plot::{self, wavelength_text};
use crate::figure::Spectrum;
use crate::figure::spectrum::{Counted, DISTANCES_PC, Scaling, SpectrumView};
use crate::physics::light::{Caution, PhotometricRelation, RgbSpace, hex};
use crate::system::light_quantities::STAR_LIGHT;
use crate::system::{Body, LightReader, MomentLight, Starlight};
use crate::units::number_text::{fixed, number};
use crate::window::command::Command;
use crate::window::theme::{GRID, Palette, small};
use crate::window::widgets::choice::{caption, word};
use crate::window::widgets::figure_row::{FigureRow, UNIT, WordRow, figure_row, word_row};
use crate::window::widgets::heading::section;
use crate::window::workspace::Workspace;
use egui::{RichText, Role, ScrollArea, Sense, Ui, WidgetInfo, vec2};

/// Least and largest height of the plot, points.
const PLOT_HEIGHT: [f32; 2] = [210.0, 420.0];

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let view = workspace.spectrum_view;
    let moment = workspace.moment();
    let light = LightReader::new(&workspace.history, crate::system::planet_light::USUAL_ALTITUDE_DEG).at(&moment);
    let star = light.star.as_ref();
    let mut commands = switches(ui, palette, view);
    let height = (0.56 * ui.available_height()).clamp(PLOT_HEIGHT[0], PLOT_HEIGHT[1]);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        let spectrum = Spectrum::new(star.map(|star| star.temperature_k), view);
        let (area, response) = ui.allocate_exact_size(vec2(ui.available_width(), height), Sense::hover());
        response.widget_info(|| WidgetInfo::labeled(Role::Image, true, description(&spectrum)));
        spectrum_plot::draw(ui, area, &spectrum, palette);
        columns(ui, |ui, column, count| {
            let groups: &[&[Group]] = match count {
                1 => &[&[Group::Brightness, Group::Colour, Group::Screens, Group::Dwarfs, Group::Magnitudes]],
                2 => &[&[Group::Brightness, Group::Magnitudes, Group::Dwarfs], &[Group::Colour, Group::Screens]],
                _ => &[&[Group::Brightness, Group::Magnitudes], &[Group::Colour, Group::Dwarfs], &[Group::Screens]],
            };
            for group in groups.get(column).copied().unwrap_or_default() {
                commands.extend(group.draw(ui, workspace, star));
            }
        });
        notes(ui, palette, &light);
        ui.add_space(4.0 * GRID);
    });
    commands
}

fn switches(ui: &mut Ui, palette: &Palette, view: SpectrumView) -> Vec<Command> {
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        caption(ui, palette, "Count");
        for counted in Counted::ALL {
            if word(ui, palette, counted.name(), view.counted == counted).clicked() {
                commands.push(Command::SetSpectrumView(SpectrumView { counted, ..view }));
            }
        }
        ui.add_space(2.0 * GRID);
        caption(ui, palette, "Height");
        for scaling in Scaling::ALL {
            if word(ui, palette, scaling.name(), view.scaling == scaling).clicked() {
                commands.push(Command::SetSpectrumView(SpectrumView { scaling, ..view }));
            }
        }
    });
    commands
}

fn description(spectrum: &Spectrum) -> String {
    let Some(star) = &spectrum.star else { return "Spectrum of a reference star; the star gives no light".to_owned() };
    let shares: Vec<String> = spectrum
        .bands
        .iter()
        .filter_map(|band| Some(format!("{} {} per cent", band.name, number(100.0 * band.share?, 3))))
        .collect();
    let peak = wavelength_text(star.peak.wavelength_nm);
    format!("Spectrum of the star: {} K, peak {peak}, {}", number(star.temperature_k, 4), shares.join(", "))
}

/// A group of figures under one heading.
#[derive(Clone, Copy)]
enum Group {
    Brightness,
    Colour,
    Screens,
    Dwarfs,
    Magnitudes,
}

impl Group {
    fn draw(self, ui: &mut Ui, workspace: &Workspace, star: Option<&Starlight>) -> Vec<Command> {
        let palette = workspace.palette();
        match self {
            Self::Brightness => brightness(ui, palette, star),
            Self::Colour => colour(ui, workspace, star),
            Self::Screens => screens(ui, palette, star),
            Self::Dwarfs => dwarfs(ui, palette, star),
            Self::Magnitudes => magnitudes(ui, workspace, star),
        }
    }
}

fn brightness(ui: &mut Ui, palette: &Palette, star: Option<&Starlight>) -> Vec<Command> {
    section(ui, palette, "Brightness");
    let keys = ["luminance_cd_m2"];
    let mut commands = figures(ui, palette, STAR_LIGHT, &keys, star);
    let over_sun = star.map(|star| star.luminance_over_sun);
    commands.extend(figure_row(ui, palette, &plain("against the reference", over_sun, 3, "×", "photometry")));
    let keys = ["luminous_flux_lm", "luminous_efficacy_lm_w", "exitance_w_m2", "peak_frequency_thz"];
    commands.extend(figures(ui, palette, STAR_LIGHT, &keys, star));
    commands
}

/// A figure that is no row of the tables.
fn plain<'n>(
    name: &'n str,
    value: Option<f64>,
    digits: usize,
    symbol: &'static str,
    method: &'static str,
) -> FigureRow<'n> {
    let text = value.map_or_else(|| "–".to_owned(), |value| number(value, digits));
    let symbol = if value.is_some() { symbol } else { "" };
    FigureRow { name, value, text, symbol, spread: None, method, unit_room: UNIT, told_of: None }
}

fn colour(ui: &mut Ui, workspace: &Workspace, star: Option<&Starlight>) -> Vec<Command> {
    let palette = workspace.palette();
    section(ui, palette, "Colour as emitted, D65 screen");
    let colour = star.and_then(|star| star.colour.as_ref());
    let shown = colour.map(|colour| colour.screen.srgb);
    let mut commands = Vec::new();
    commands.extend(word_row(
        ui,
        palette,
        &WordRow { swatch: shown, ..WordRow::new("Blackbody", workspace.colour_words, "blackbody") },
    ));
    let xy = colour.map_or_else(|| "–".to_owned(), |colour| pair(colour.chromaticity.xy()));
    commands.extend(word_row(ui, palette, &WordRow::new("x, y (CIE 1931)", &xy, "blackbody")));
    let uv = colour.map_or_else(|| "–".to_owned(), |colour| pair(colour.u_v_prime));
    commands.extend(word_row(ui, palette, &WordRow::new("u', v' (CIE 1976)", &uv, "colour_numbers")));
    commands.extend(figures(ui, palette, STAR_LIGHT, &["correlated_temperature_k", "colour_duv"], star));
    commands
}

fn screens(ui: &mut Ui, palette: &Palette, star: Option<&Starlight>) -> Vec<Command> {
    section(ui, palette, "For screens and projectors");
    let colour = star.and_then(|star| star.colour.as_ref());
    let mut commands = Vec::new();
    for (index, space) in RgbSpace::ALL.into_iter().enumerate() {
        let channels = colour.map_or_else(|| "–".to_owned(), |colour| triple(colour.linear_rgb[index]));
        let name = format!("{} linear", space.name());
        commands.extend(word_row(ui, palette, &WordRow::new(&name, &channels, "colour_numbers")));
    }
    let outside = |is_inside: bool| if is_inside { "" } else { ", nearest" };
    let srgb = colour.map(|colour| format!("{}{}", colour.screen.hex(), outside(colour.screen.in_srgb_gamut)));
    let p3 = colour.map(|colour| format!("{}{}", hex(colour.wide.display_p3), outside(colour.wide.in_gamut)));
    let dash = || "–".to_owned();
    commands.extend(word_row(ui, palette, &WordRow::new("sRGB", &srgb.unwrap_or_else(dash), "colour_numbers")));
    commands.extend(word_row(ui, palette, &WordRow::new("Display P3", &p3.unwrap_or_else(dash), "colour_numbers")));
    commands
}

fn dwarfs(ui: &mut Ui, palette: &Palette, star: Option<&Starlight>) -> Vec<Command> {
    section(ui, palette, "Measured dwarfs of this temperature");
    let dwarf = star.and_then(|star| star.dwarf);
    let mut commands = Vec::new();
    let words = dwarf.map_or_else(
        || "none to compare".to_owned(),
        |dwarf| format!("{}, like {}", dwarf.screen.hex(), dwarf.nearest_type),
    );
    let shown = dwarf.map(|dwarf| dwarf.screen.srgb);
    commands.extend(word_row(
        ui,
        palette,
        &WordRow { swatch: shown, ..WordRow::new("Measured", &words, "measured_dwarfs") },
    ));
    let xy = dwarf.map_or_else(|| "–".to_owned(), |dwarf| pair(dwarf.chromaticity.xy()));
    commands.extend(word_row(
        ui,
        palette,
        &WordRow { full_name: "Measured dwarfs x, y", ..WordRow::new("x, y (CIE 1931)", &xy, "measured_dwarfs") },
    ));
    let difference = dwarf
        .map_or_else(|| "–".to_owned(), |dwarf| format!("{} just noticeable steps", fixed(dwarf.difference_de00, 1)));
    commands.extend(word_row(ui, palette, &WordRow::new("From the blackbody", &difference, "measured_dwarfs")));
    commands
}

fn magnitudes(ui: &mut Ui, workspace: &Workspace, star: Option<&Starlight>) -> Vec<Command> {
    let palette = workspace.palette();
    let view = workspace.spectrum_view;
    section(ui, palette, "Magnitudes");
    let mut commands = Vec::new();
    let known = star.and_then(|star| star.magnitudes.as_ref());
    let keys = ["b_minus_v_mag", "bolometric_correction_mag", "magnitude_uncertainty_mag"];
    commands.extend(figures(ui, palette, STAR_LIGHT, &keys, star));
    if let Some(quantity) = STAR_LIGHT.iter().find(|quantity| quantity.key == "absolute_visual_mag") {
        commands.extend(figure(ui, palette, quantity, "V, absolute", star));
    }
    let seen = star.and_then(|star| star.visual_mag_at(view.distance_pc));
    let name = format!("V from {} pc", number(view.distance_pc, 1));
    commands.extend(figure_row(ui, palette, &plain(&name, seen, 4, "mag", "magnitudes")));
    ui.horizontal_wrapped(|ui| {
        caption(ui, palette, "Seen from");
        for distance_pc in DISTANCES_PC {
            let words = format!("{} pc", number(distance_pc, 1));
            if word(ui, palette, &words, view.distance_pc == distance_pc).clicked() {
                commands.push(Command::SetSpectrumView(SpectrumView { distance_pc, ..view }));
            }
        }
    });
    let relation = match known.map(|known| known.photometry.relation) {
        Some(PhotometricRelation::DwarfTable) => "From a table of dwarfs; no dust on the way.",
        Some(PhotometricRelation::FlowerTorres) => "From relations for giants; no dust on the way.",
        Some(PhotometricRelation::SyntheticBlackbody) => "From a blackbody through the passbands; no dust on the way.",
        None => "No V is estimated for a star this cool or dark.",
    };
    ui.label(RichText::new(relation).font(small()).color(palette.dim));
    commands
}

/// What to bear in mind about the star's light now.
fn notes(ui: &mut Ui, palette: &Palette, light: &MomentLight) {
    ui.add_space(2.0 * GRID);
    let mut sentences = vec![format!("Note: {}.", Caution::BlackbodyStandsIn.name())];
    let of_star = light.notes.iter().filter(|note| note.body == Body::Star);
    sentences.extend(of_star.map(|note| format!("{}: {}.", note.kind.name(), note.text)));
    for sentence in sentences {
        ui.label(RichText::new(sentence).font(small()).color(palette.dim));
    }
}

fn pair(values: [f64; 2]) -> String {
    values.map(|value| fixed(value, 4)).join(", ")
}

fn triple(values: [f64; 3]) -> String {
    values.map(|value| fixed(value, 3)).join("  ")
}
