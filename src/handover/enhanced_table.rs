//! The header of an Enhanced Character-Separated Values table.

use super::history_table::PROGRAM;
use super::table_columns::Column;
use crate::system::provenance::Method;
use serde_json::Value;
use std::fmt::Write;

/// The comment lines that stand before the row of names: one flow map per column, in YAML.
///
/// # Source
/// Astropy Proposal for Enhancement 6 (APE6): `%ECSV 1.0`, `delimiter`, `datatype`, `meta`.
pub(super) fn header(title: &str, methods: &[&Method], columns: &[Column]) -> String {
    let mut text = "# %ECSV 1.0\n# ---\n# delimiter: ','\n# datatype:\n".to_owned();
    for column in columns {
        let kind = if column.is_number { "float64" } else { "string" };
        let unit = if column.unit.is_empty() { String::new() } else { format!("unit: {}, ", quoted(column.unit)) };
        // Writing to a String cannot fail.
        let _ = writeln!(
            text,
            "# - {{name: {}, {unit}datatype: {kind}, description: {}}}",
            quoted(&column.key),
            quoted(&column.meaning)
        );
    }
    let _ = writeln!(text, "# meta:\n#   title: {}\n#   program: {}\n#   methods:", quoted(title), quoted(PROGRAM));
    for method in methods {
        let _ = writeln!(text, "#   - {{name: {}, source: {}}}", quoted(method.name), quoted(method.source));
    }
    text
}

/// A text as a quoted YAML scalar: every JSON string is one.
fn quoted(text: &str) -> String {
    Value::from(text).to_string()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_header_line_is_a_comment_whatever_the_title() {
        let column =
            Column { key: "a_k".into(), unit: "K", is_number: true, meaning: "x: \"y\", {z}".into(), method: None };
        let text = header("A \"title\": 100 %\nand a line", &[], &[column]);
        assert!(text.lines().all(|line| line.starts_with("# ")), "{text}");
        assert!(text.contains(r#"description: "x: \"y\", {z}""#));
    }
}
