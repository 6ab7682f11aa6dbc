//! Adding a statement: as a typed line, or put together from lists.

use crate::physics::star::Phase;
use crate::system::statements::{
    Quantity, Statement, figures_of_planet, figures_of_star, parse_statement, phase_words,
};
use crate::window::theme::{GRID, small};
use crate::window::widgets::draft::keep_draft;
use crate::window::workspace::Workspace;
use egui::{ComboBox, Id, Key, RichText, Stroke, StrokeKind, TextEdit, Ui};

/// Longest line that can be typed, in characters.
const LONGEST_LINE: usize = 400;

/// What became of a line that is being typed.
pub(super) enum LineEntry {
    /// Nothing yet.
    Nothing,
    /// The user does not want it.
    GivenUp,
    /// A statement.
    Entered(Statement),
}

/// What stays in a field between frames.
#[derive(Clone, Default)]
struct Draft {
    text: String,
    refusal: Option<String>,
}

/// The line to add, with its button.
pub(super) fn typed(ui: &mut Ui, workspace: &Workspace) -> Option<Statement> {
    match line_field(ui, workspace, "New statement", None) {
        LineEntry::Entered(statement) => Some(statement),
        LineEntry::Nothing | LineEntry::GivenUp => None,
    }
}

/// A field for a line: what cannot be understood stays, outlined, with the column and the reason below it.
pub(super) fn line_field(ui: &mut Ui, workspace: &Workspace, name: &str, line: Option<&str>) -> LineEntry {
    let palette = workspace.palette();
    let id = Id::unique(("statement_line", name));
    let mut draft = ui
        .data(|data| data.get_temp::<Draft>(id))
        .unwrap_or_else(|| Draft { text: line.unwrap_or_default().to_owned(), refusal: None });
    let mut is_entered = false;
    let response = ui
        .horizontal(|ui| {
            let field = TextEdit::singleline(&mut draft.text)
                .id(id.with("field"))
                .desired_width((ui.available_width() - 90.0).max(160.0))
                .char_limit(LONGEST_LINE)
                .hint_text("star luminosity at 5 Gyr is about 1.0 Lsun");
            let response = ui.add(field).accessible_name(name);
            let words = if line.is_some() { "Change" } else { "Add" };
            let pressed = ui.button(words).accessible_name(format!("{words}: {name}")).clicked();
            is_entered = pressed || (response.lost_focus() && ui.input(|input| input.key_pressed(Key::Enter)));
            response
        })
        .inner;
    if (response.has_focus() || response.lost_focus()) && ui.input(|input| input.key_pressed(Key::Escape)) {
        keep_draft::<Draft>(ui, id, None);
        return LineEntry::GivenUp;
    }
    if response.changed() {
        draft.refusal = None;
    }
    if is_entered {
        match parse_statement(&draft.text, &workspace.scenario().system) {
            Ok(statement) => {
                keep_draft::<Draft>(ui, id, None);
                return LineEntry::Entered(statement);
            }
            Err(problem) => draft.refusal = Some(problem.to_string()),
        }
    }
    if let Some(refusal) = &draft.refusal {
        let outline = Stroke::new(1.5, palette.error);
        ui.painter().rect_stroke(response.rect.expand(1.0), 4.0, outline, StrokeKind::Outside);
        ui.label(RichText::new(refusal).font(small()).color(palette.error));
    }
    keep_draft(ui, id, Some(draft));
    LineEntry::Nothing
}

/// What is chosen in the lists so far.
#[derive(Clone, PartialEq)]
struct Chosen {
    is_open: bool,
    body: String,
    quantity: String,
    when: usize,
    time: String,
    relation: usize,
    value: String,
    refusal: Option<String>,
}

/// Ways to say when, with what they come to in a line; braces stand for what is typed.
const WHENS: [(&str, &str); 6] = [
    ("at the time", "at {}"),
    ("now", "at now"),
    ("at the event", "at event '{}'"),
    ("at some time", "ever"),
    ("at every time", "always"),
    ("in the whole life", ""),
];
/// Ways to compare.
const RELATIONS: [&str; 6] = ["is about", "is at least", "is at most", "is between", "happens", "never happens"];

impl Default for Chosen {
    fn default() -> Self {
        Self {
            is_open: false,
            body: "star".to_owned(),
            quantity: "luminosity".to_owned(),
            when: 1,
            time: String::new(),
            relation: 0,
            value: String::new(),
            refusal: None,
        }
    }
}

impl Chosen {
    /// The line that the lists come to.
    fn line(&self) -> String {
        let body = if self.body == "star" { "star".to_owned() } else { format!("\"{}\"", self.body) };
        let relation = RELATIONS.get(self.relation).copied().unwrap_or_default();
        if self.is_of_an_event() {
            return format!("{body} event '{}' {relation}", self.time.trim());
        }
        let when = WHENS.get(self.when).map_or("", |(_, words)| words).replace("{}", self.time.trim());
        let parts = [body.as_str(), &self.quantity, &when, relation, self.value.trim()];
        parts.into_iter().filter(|part| !part.is_empty()).collect::<Vec<_>>().join(" ")
    }

    /// Whether it is said that something happens or not, which takes neither a quantity nor a value.
    fn is_of_an_event(&self) -> bool {
        self.relation >= 4
    }
}

/// The lists, folded away until they are wanted.
pub(super) fn by_form(ui: &mut Ui, workspace: &Workspace) -> Option<Statement> {
    let palette = workspace.palette();
    let id = Id::unique("statement_form");
    let mut chosen = ui.data(|data| data.get_temp::<Chosen>(id)).unwrap_or_default();
    let mut added = None;
    ui.checkbox(&mut chosen.is_open, "Put a statement together from lists");
    if chosen.is_open {
        ui.horizontal_wrapped(|ui| {
            let mut bodies = vec!["star".to_owned()];
            bodies.extend(workspace.scenario().system.planets.iter().map(|planet| planet.name.clone()));
            let before = chosen.body.clone();
            pick(ui, "Body of the new statement", &mut chosen.body, &bodies);
            if (before == "star") != (chosen.body == "star") {
                chosen.quantity.clone_from(&quantities(chosen.body == "star")[0]);
            }
            if chosen.is_of_an_event() {
                text(ui, "Event of the new statement", &mut chosen.time, "engulfed by the star");
            } else {
                pick(ui, "Quantity of the new statement", &mut chosen.quantity, &quantities(chosen.body == "star"));
                pick_place(ui, "Time of the new statement", &mut chosen.when, &WHENS.map(|(name, _)| name));
                if WHENS.get(chosen.when).is_some_and(|(_, words)| words.contains("{}")) {
                    text(ui, "Moment of the new statement", &mut chosen.time, "5 Gyr");
                }
            }
            pick_place(ui, "Relation of the new statement", &mut chosen.relation, &RELATIONS);
            if !chosen.is_of_an_event() {
                let hint = if chosen.relation == 3 { "1 and 2 Lsun" } else { "1 Lsun" };
                text(ui, "Value of the new statement", &mut chosen.value, hint);
            }
            if ui.button("Add").accessible_name("Add the statement put together").clicked() {
                match parse_statement(&chosen.line(), &workspace.scenario().system) {
                    Ok(statement) => {
                        added = Some(statement);
                        chosen.refusal = None;
                    }
                    Err(problem) => chosen.refusal = Some(format!("{}: {problem}", chosen.line())),
                }
            }
        });
        if let Some(refusal) = &chosen.refusal {
            ui.label(RichText::new(refusal).font(small()).color(palette.error));
        }
    }
    ui.add_space(GRID);
    keep_draft(ui, id, Some(chosen));
    added
}

/// Everything that can be stated of a body, in the words of a line.
fn quantities(of_star: bool) -> Vec<String> {
    let keys = if of_star { figures_of_star() } else { figures_of_planet() };
    let mut words: Vec<String> = keys.iter().map(|key| Quantity::Figure(key).words()).collect();
    words.extend(keys.iter().map(|key| Quantity::Highest(key).words()));
    words.extend(keys.iter().map(|key| Quantity::Lowest(key).words()));
    if of_star {
        words.push(Quantity::Lifetime.words());
        words.extend(Phase::ALL.map(|phase| format!("duration of {}", phase_words(phase))));
    } else {
        let spans = [Quantity::MildTime, Quantity::LongestMildTime, Quantity::HabitableZoneTime];
        words.extend(spans.iter().map(Quantity::words));
    }
    words
}

fn pick(ui: &mut Ui, name: &str, chosen: &mut String, all: &[String]) {
    let list = ComboBox::from_id_salt(name).selected_text(chosen.as_str()).show_ui(ui, |ui| {
        for one in all {
            ui.selectable_value(chosen, one.clone(), one);
        }
    });
    list.response.accessible_name(name);
}

fn pick_place(ui: &mut Ui, name: &str, chosen: &mut usize, all: &[&str]) {
    let shown = all.get(*chosen).copied().unwrap_or_default();
    let list = ComboBox::from_id_salt(name).selected_text(shown).show_ui(ui, |ui| {
        for (place, one) in all.iter().enumerate() {
            ui.selectable_value(chosen, place, *one);
        }
    });
    list.response.accessible_name(name);
}

fn text(ui: &mut Ui, name: &str, typed: &mut String, hint: &str) {
    let field = TextEdit::singleline(typed).desired_width(110.0).char_limit(LONGEST_LINE).hint_text(hint);
    ui.add(field).accessible_name(name);
}
