//! One figure: name, value, unit, spread. A click on it shows the source.

use crate::handover::FigureSentence;
use crate::units::number_text::number;
use crate::window::command::Command;
use crate::window::theme::{Palette, ROW, small, usual};
use egui::{Align2, Color32, Rect, Response, Role, Sense, Ui, WidgetInfo, pos2, vec2};

/// Room right of the values for unit and spread, points.
pub(crate) const UNIT_AND_SPREAD: f32 = 84.0;
/// Room right of the values for the unit alone, points.
pub(crate) const UNIT: f32 = 66.0;

/// One row to draw.
pub(crate) struct FigureRow<'a> {
    /// Name for people.
    pub name: &'a str,
    /// The value in full; `None` where there is none.
    pub value: Option<f64>,
    /// The value as it is shown.
    pub text: String,
    /// Unit symbol.
    pub symbol: &'a str,
    /// What stands at the right end.
    pub spread: Option<String>,
    /// Key of its method.
    pub method: &'static str,
    /// Room right of the value.
    pub unit_room: f32,
    /// Whose figure it is and at what time, in words: for the sentence that can be copied.
    pub told_of: Option<(&'a str, &'a str)>,
}

/// Draws a figure and returns what it was told.
pub(crate) fn figure_row(ui: &mut Ui, palette: &Palette, row: &FigureRow<'_>) -> Option<Command> {
    let full = row.value.map_or_else(|| row.text.clone(), |value| format!("{} {}", number(value, 10), row.symbol));
    let words = format!("{}: {} {}", row.name, row.text, row.symbol);
    let (rect, response) = row_ground(ui, palette, &words);
    let y = rect.center().y;
    // Three columns: value right-aligned on its unit, unit, spread.
    let value_right = rect.right() - row.unit_room;
    let painter = ui.painter();
    let value = painter.text(pos2(value_right, y), Align2::RIGHT_CENTER, &row.text, usual(), palette.text);
    let name = painter.layout_no_wrap(row.name.to_owned(), usual(), palette.dim);
    // A long value next to a long name: the name gives way a little.
    let is_tight = rect.left() + name.size().x > value.left() - 4.0;
    let font = if is_tight { small() } else { usual() };
    painter.text(pos2(rect.left(), y), Align2::LEFT_CENTER, row.name, font, palette.dim);
    painter.text(pos2(value_right + 6.0, y), Align2::LEFT_CENTER, row.symbol, small(), palette.dim);
    if let Some(spread) = &row.spread {
        painter.text(pos2(rect.right(), y), Align2::RIGHT_CENTER, spread, small(), palette.dim);
    }
    let sentence = row.told_of.map(|(body, time)| {
        let value = format!("{} {}", row.text, row.symbol);
        let (spread, method) = (row.spread.as_deref(), row.method);
        FigureSentence { time, body, name: row.name, value: &value, spread, method }.text()
    });
    to_source(response, row.name, full.trim(), sentence.as_deref(), row.method)
}

/// A row of words in place of a figure.
pub(crate) struct WordRow<'a> {
    /// Name as it is shown.
    pub name: &'a str,
    /// Name as it is told and copied, where what is shown stands under a heading that says the rest.
    pub full_name: &'a str,
    /// The words.
    pub words: &'a str,
    /// A colour of its own.
    pub swatch: Option<[u8; 3]>,
    /// Key of its method.
    pub method: &'static str,
}

impl<'a> WordRow<'a> {
    /// Words without a colour, told by the name they are shown with.
    pub(crate) fn new(name: &'a str, words: &'a str, method: &'static str) -> Self {
        Self { name, full_name: name, words, swatch: None, method }
    }
}

/// Draws a row of words and returns what it was told.
pub(crate) fn word_row(ui: &mut Ui, palette: &Palette, row: &WordRow<'_>) -> Option<Command> {
    let WordRow { name, full_name, words, swatch, method } = *row;
    let (rect, response) = row_ground(ui, palette, &format!("{full_name}: {words}"));
    let y = rect.center().y;
    let name_rect = ui.painter().text(pos2(rect.left(), y), Align2::LEFT_CENTER, name, usual(), palette.dim);
    let mut right = rect.right();
    if let Some([red, green, blue]) = swatch {
        let patch = Rect::from_min_max(pos2(right - 30.0, rect.top() + 3.0), pos2(right, rect.bottom() - 3.0));
        // Colour is data: it stands on neutral grey with a neutral casing.
        ui.painter().rect_filled(patch, 3.0, palette.bed);
        ui.painter().rect(
            patch.shrink(2.0),
            2.0,
            Color32::from_rgb(red, green, blue),
            egui::Stroke::new(1.0, palette.casing),
            egui::StrokeKind::Inside,
        );
        right = patch.left() - 6.0;
    }
    // Some letters reach a little beyond their own width.
    let room = Rect::from_min_max(pos2(name_rect.right() + 8.0, rect.top()), pos2(right + 3.0, rect.bottom()));
    ui.painter().with_clip_rect(room.intersect(ui.clip_rect())).text(
        pos2(right, y),
        Align2::RIGHT_CENTER,
        words,
        usual(),
        palette.text,
    );
    to_source(response, full_name, words, None, method)
}

fn row_ground(ui: &mut Ui, palette: &Palette, words: &str) -> (Rect, Response) {
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::click());
    response.widget_info(|| WidgetInfo::labeled(Role::Button, true, words.trim()));
    if response.hovered() || response.has_focus() {
        ui.painter().rect_filled(rect.expand2(vec2(4.0, 0.0)), 3.0, palette.chosen);
    }
    (rect, response)
}

fn to_source(
    response: Response,
    name: &str,
    full: &str,
    sentence: Option<&str>,
    method: &'static str,
) -> Option<Command> {
    let mut command = response.clicked().then_some(Command::ShowSource(method));
    response.context_menu(|ui| {
        if ui.button("Copy value").clicked() {
            command = Some(Command::Copy(full.to_owned()));
            ui.close();
        }
        if let Some(sentence) = sentence
            && ui.button("Copy sentence with source").clicked()
        {
            command = Some(Command::Copy(sentence.to_owned()));
            ui.close();
        }
        if ui.button("Show source").clicked() {
            command = Some(Command::ShowSource(method));
            ui.close();
        }
    });
    response.on_hover_text(format!("{name}: {full}\nClick for method and source."));
    command
}
