//! The sheet as Markdown (`CommonMark` with tables).

use super::content::{FactSheet, Group, PLANETS_ACROSS, figure_names};
use crate::drawing::line_of_text;
use std::fmt::Write;

/// A fact sheet as Markdown; marks are links to the source lines at its end.
#[must_use]
pub fn sheet_markdown(sheet: &FactSheet) -> String {
    let mut page = String::new();
    // Writing to a String cannot fail.
    let _ = writeln!(page, "# {}\n", literal(&sheet.title));
    for paragraph in &sheet.about {
        let _ = writeln!(page, "{}\n", literal(paragraph));
    }
    page.push_str("## The system as given\n\n");
    let (star, planets) = sheet.inputs.split_at(sheet.inputs.len().min(1));
    for group in star {
        push_group(&mut page, group);
    }
    push_side_by_side(&mut page, planets);
    for moment in &sheet.moments {
        let _ = writeln!(page, "## {} after the star reached the main sequence\n", literal(&moment.time));
        push_group(&mut page, &moment.star);
        push_side_by_side(&mut page, &moment.planets);
        if !moment.chronicle.is_empty() {
            page.push_str("### Before and after\n\n| Date | Event | Source |\n|---:|---|---|\n");
            for dated in &moment.chronicle {
                let doubt = dated.doubt.as_ref().map_or_else(String::new, |doubt| format!(" ({})", literal(doubt)));
                let _ = writeln!(
                    page,
                    "| {} | {}{doubt} | {} |",
                    literal(&dated.date),
                    literal(&dated.what),
                    mark(dated.mark)
                );
            }
            page.push('\n');
        }
        if !moment.notes.is_empty() {
            page.push_str("### Notes\n\n");
            for note in &moment.notes {
                let _ = writeln!(page, "- {}", literal(note));
            }
            page.push('\n');
        }
    }
    page.push_str("## Cautions\n\n");
    for caution in &sheet.cautions {
        let _ = writeln!(page, "- {}", literal(caution));
    }
    page.push_str("\n## Sources\n\n");
    for (index, source) in sheet.sources.iter().enumerate() {
        let number = index + 1;
        let _ = writeln!(
            page,
            "{number}. <a id=\"source-{number}\"></a>**{}.** {} *Source:* {}. *Valid for:* {}. *Accuracy:* {}.",
            literal(source.name),
            literal(source.relation),
            literal(source.source),
            literal(source.valid_for),
            literal(source.accuracy)
        );
    }
    let _ = writeln!(page, "\nMade with {}.", literal(&sheet.program));
    page
}

fn mark(number: usize) -> String {
    format!("[\\[{number}\\]](#source-{number})")
}

fn push_group(page: &mut String, group: &Group) {
    let _ = writeln!(page, "### {}, {}\n", literal(&group.name), literal(&group.words));
    if group.figures.is_empty() {
        return;
    }
    page.push_str("| Figure | Value | Spread | Source |\n|---|---:|---|---|\n");
    for figure in &group.figures {
        let spread = figure.spread.as_ref().map_or_else(String::new, |spread| format!("± {}", literal(spread)));
        let _ = writeln!(
            page,
            "| {} | {} | {spread} | {} |",
            literal(figure.name),
            literal(&figure.value),
            mark(figure.mark)
        );
    }
    page.push('\n');
}

/// Planets in tables, a few side by side.
fn push_side_by_side(page: &mut String, groups: &[Group]) {
    for block in groups.chunks(PLANETS_ACROSS) {
        let names = block.iter().map(|group| format!("{}, {}", literal(&group.name), literal(&group.words)));
        let _ = writeln!(page, "| | {} |", names.collect::<Vec<_>>().join(" | "));
        let _ = writeln!(page, "|---|{}", "---:|".repeat(block.len()));
        for name in figure_names(block) {
            let cells = block.iter().map(|group| match group.figures.iter().find(|figure| figure.name == name) {
                Some(figure) => format!("{} {}", literal(&figure.value), mark(figure.mark)),
                None => "–".to_owned(),
            });
            let _ = writeln!(page, "| {} | {} |", literal(name), cells.collect::<Vec<_>>().join(" | "));
        }
        page.push('\n');
    }
}

/// A text that Markdown takes as nothing but text, in one line.
///
/// # Source
/// `CommonMark` 0.31: a backslash before ASCII punctuation makes it literal.
pub(super) fn literal(text: &str) -> String {
    let mut safe = String::with_capacity(text.len());
    // A leading sign or number would begin a list, a heading or a rule; a bare address would become a link.
    let starts_block = text.trim_start().starts_with(['-', '+', '=']);
    let first_word = text.split_whitespace().next().unwrap_or_default();
    let number = first_word.strip_suffix(['.', ')']).unwrap_or_default();
    let starts_list = !number.is_empty() && number.bytes().all(|byte| byte.is_ascii_digit());
    let mut is_first_word = true;
    let mut before = ' ';
    let line = line_of_text(text);
    let mut signs = line.chars().peekable();
    while let Some(sign) = signs.next() {
        let is_punctuation = matches!(
            sign,
            '\\' | '`' | '*' | '_' | '{' | '}' | '[' | ']' | '<' | '>' | '#' | '|' | '&' | '~' | '$' | '^' | '@' | '!'
        );
        let is_address =
            (sign == ':' && signs.peek() == Some(&'/')) || (sign == '.' && before.eq_ignore_ascii_case(&'w'));
        let is_block = is_first_word
            && ((starts_block && matches!(sign, '-' | '+' | '=')) || (starts_list && matches!(sign, '.' | ')')));
        if is_punctuation || is_address || is_block {
            safe.push('\\');
        }
        if sign.is_whitespace() {
            is_first_word = false;
        }
        safe.push(sign);
        before = sign;
    }
    safe
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn hostile_text_stays_text() {
        assert_eq!(literal("<script>*a*</script>"), "\\<script\\>\\*a\\*\\</script\\>");
        assert_eq!(literal("a|b\nc"), "a\\|b c");
        assert_eq!(literal("- x"), "\\- x");
        assert_eq!(literal("1. x 2. y"), "1\\. x 2. y");
        assert_eq!(literal("see http://a and www.b"), "see http\\://a and www\\.b");
        assert_eq!(literal("4.600 Gyr: 5."), "4.600 Gyr: 5.");
        assert_eq!(literal("Ember's last summer"), "Ember's last summer");
    }
}
