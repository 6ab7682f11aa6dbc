//! Names with one line of text each.

use super::lines::push_columns;

/// Each name with its line, the lines one below the other.
#[must_use]
pub fn named_list(entries: &[(&str, String)]) -> String {
    let rows: Vec<Vec<String>> = entries.iter().map(|(name, line)| vec![(*name).to_owned(), line.clone()]).collect();
    let mut text = String::new();
    push_columns(&mut text, 0, &rows);
    text
}
