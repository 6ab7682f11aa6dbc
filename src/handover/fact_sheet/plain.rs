//! The sheet as plain text, for the clipboard.

use super::content::{FactSheet, Group};
use crate::handover::lines::{padded, push_wrapped};

/// Width of the names of figures.
const NAME_WIDTH: usize = 26;

/// A fact sheet as text of at most 80 columns; `[3]` leads to source line 3.
#[must_use]
pub fn sheet_text(sheet: &FactSheet) -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", &sheet.title);
    for paragraph in &sheet.about {
        push_wrapped(&mut page, "", paragraph);
    }
    page.push_str("\nTHE SYSTEM AS GIVEN\n");
    for group in &sheet.inputs {
        push_group(&mut page, group);
    }
    for moment in &sheet.moments {
        page.push('\n');
        push_wrapped(&mut page, "", &format!("AT {}", moment.time.to_uppercase()));
        push_group(&mut page, &moment.star);
        for planet in &moment.planets {
            push_group(&mut page, planet);
        }
        if !moment.chronicle.is_empty() {
            page.push_str("\nBefore and after\n");
        }
        for dated in &moment.chronicle {
            let doubt = dated.doubt.as_ref().map_or_else(String::new, |doubt| format!(" ({doubt})"));
            let lead = format!("  {} ", padded(&dated.date, 14));
            push_wrapped(&mut page, &lead, &format!("{}{doubt} [{}]", dated.what, dated.mark));
        }
        if !moment.notes.is_empty() {
            page.push_str("\nNotes\n");
        }
        for note in &moment.notes {
            push_wrapped(&mut page, "  - ", note);
        }
    }
    page.push_str("\nCAUTIONS\n");
    for caution in &sheet.cautions {
        push_wrapped(&mut page, "  - ", caution);
    }
    page.push_str("\nSOURCES\n");
    for (index, source) in sheet.sources.iter().enumerate() {
        let words = format!(
            "{}: {} Source: {}. Valid for: {}. Accuracy: {}.",
            source.name, source.relation, source.source, source.valid_for, source.accuracy
        );
        push_wrapped(&mut page, &padded(&format!("[{}]", index + 1), 5), &words);
    }
    page.push('\n');
    push_wrapped(&mut page, "", &format!("Made with {}.", sheet.program));
    page
}

fn push_group(page: &mut String, group: &Group) {
    push_wrapped(page, "", &format!("{}, {}", group.name, group.words));
    for figure in &group.figures {
        let spread = figure.spread.as_ref().map_or_else(String::new, |spread| format!(" ± {spread}"));
        let lead = format!("  {}", padded(figure.name, NAME_WIDTH));
        push_wrapped(page, &lead, &format!("{}{spread} [{}]", figure.value, figure.mark));
    }
}
