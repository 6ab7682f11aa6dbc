//! Figures in aligned columns: name, value, unit, spread. A click on a name shows the source.

use crate::system::quantities::{PLANET, STAR};
use crate::system::{Moment, PlanetMoment};
use crate::units::number_text::number;
use crate::units::time_words::{SpanStyle, short_span, span};
use crate::window::command::Command;
use crate::window::theme::{Palette, ROW, usual};
use crate::window::widgets::figure_row::{FigureRow, UNIT_AND_SPREAD, figure_row};
use egui::{Align2, Rect, Role, Sense, Ui, WidgetInfo, pos2, vec2};

/// The star's figures.
pub(super) fn star(ui: &mut Ui, palette: &Palette, name: &str, moment: &Moment) -> Vec<Command> {
    let time = span(moment.time_yr, 4, SpanStyle::Words);
    let mut commands = Vec::new();
    for quantity in STAR {
        let value = (quantity.value)(&moment.star);
        let is_wind = quantity.key == "mass_loss_msun_yr";
        // A figure that does not apply now takes no row, but the main ones always stand.
        let is_main = quantity.key.starts_with("luminosity") || quantity.key.starts_with("radius");
        if value.is_none() && !is_main || is_wind && value == Some(0.0) {
            continue;
        }
        let row = FigureRow {
            name: quantity.name,
            value,
            text: value.map_or_else(|| "not modelled".to_owned(), |value| number(value, quantity.digits)),
            symbol: if value.is_some() { quantity.symbol } else { "" },
            spread: (quantity.spread)(&moment.star).map(|spread| format!("± {} %", number(100.0 * spread, 2))),
            method: quantity.method,
            unit_room: UNIT_AND_SPREAD,
            told_of: value.is_some().then_some((name, &time)),
        };
        commands.extend(figure_row(ui, palette, &row));
    }
    commands
}

/// A planet's figures.
pub(super) fn planet(ui: &mut Ui, palette: &Palette, time_yr: f64, planet: &PlanetMoment) -> Vec<Command> {
    let time = span(time_yr, 4, SpanStyle::Words);
    let mut commands = Vec::new();
    word_row(ui, palette, "State", planet.state.name());
    for quantity in PLANET {
        let Some(value) = (quantity.value)(planet) else { continue };
        let (text, symbol) = if quantity.key == "period_yr" {
            (short_span(value), "")
        } else {
            (number(value, quantity.digits), quantity.symbol)
        };
        let row = FigureRow {
            name: quantity.name,
            value: Some(value),
            text,
            symbol,
            spread: None,
            method: quantity.method,
            unit_room: UNIT_AND_SPREAD,
            told_of: Some((&planet.name, &time)),
        };
        commands.extend(figure_row(ui, palette, &row));
    }
    if let Some(zone) = planet.zone {
        word_row(ui, palette, "Zone", zone.name());
    }
    commands
}

fn word_row(ui: &mut Ui, palette: &Palette, name: &str, word: &str) {
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::hover());
    response.widget_info(|| WidgetInfo::labeled(Role::Label, true, format!("{name}: {word}")));
    let room = Rect::from_min_max(pos2(rect.left() + 60.0, rect.top()), rect.max);
    ui.painter().text(pos2(rect.left(), rect.center().y), Align2::LEFT_CENTER, name, usual(), palette.dim);
    ui.painter().with_clip_rect(room).text(
        pos2(rect.right(), rect.center().y),
        Align2::RIGHT_CENTER,
        word,
        usual(),
        palette.text,
    );
}
