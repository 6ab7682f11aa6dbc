//! Comma-separated values with the quoting of RFC 4180.
//!
//! Lines end with a line feed alone: every reader accepts it, and line tools of a shell need it.

use std::fmt::Write;

/// Appends one record with its line end.
///
/// # Source
/// RFC 4180, section 2, rules 5 to 7: a field with a comma, a quotation mark or a line break stands in quotation marks,
/// and a quotation mark inside is doubled. What a spreadsheet would run as a formula gets an apostrophe. Leading and trailing spaces are quoted too, for readers that trim.
pub(super) fn push_record<T: AsRef<str>>(text: &mut String, fields: impl IntoIterator<Item = T>) {
    for (index, field) in fields.into_iter().enumerate() {
        if index > 0 {
            text.push(',');
        }
        push_field(text, field.as_ref());
    }
    text.push('\n');
}

/// Signs that make a spreadsheet take a cell for a formula.
const FORMULA_SIGNS: [char; 6] = ['=', '+', '-', '@', '\t', '\r'];

/// Whether a spreadsheet would run a cell; numbers with a sign are none of these.
fn is_formula(field: &str) -> bool {
    field.trim_start_matches([' ', '\n']).starts_with(FORMULA_SIGNS) && field.parse::<f64>().is_err()
}

fn push_field(text: &mut String, field: &str) {
    if is_formula(field) {
        // The apostrophe says "text" to spreadsheets.
        return push_quoted(text, &format!("'{field}"));
    }
    let needs_quotes = field.contains([',', '"', '\n', '\r']) || field.trim() != field;
    if needs_quotes {
        push_quoted(text, field);
    } else {
        text.push_str(field);
    }
}

fn push_quoted(text: &mut String, field: &str) {
    // Writing to a String cannot fail.
    let _ = write!(text, "\"{}\"", field.replace('"', "\"\""));
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn only_fields_that_need_it_are_quoted() {
        let mut text = String::new();
        push_record(&mut text, ["plain", "a,b", "say \"so\"", "two\nlines", "", " led", "1e-5"]);
        assert_eq!(text, "plain,\"a,b\",\"say \"\"so\"\"\",\"two\nlines\",,\" led\",1e-5\n");
    }

    #[test]
    fn no_cell_is_a_formula_and_numbers_keep_their_sign() {
        let mut text = String::new();
        push_record(&mut text, ["=cmd|' /C calc'!A0", "+1+1", "-2+3", "@SUM(A1)", "\t=1", " =1", "-1.5e-3", "a=1"]);
        let mut reader = csv::ReaderBuilder::new().has_headers(false).from_reader(text.as_bytes());
        let record = reader.records().next().expect("one record").expect("well formed");
        for field in record.iter().take(6) {
            assert!(field.starts_with('\''), "{field}");
        }
        assert_eq!((&record[6], &record[7]), ("-1.5e-3", "a=1"));
    }

    #[test]
    fn a_csv_reader_gets_back_what_was_written() {
        let fields = ["Ember, \"the hot one\"", "a\r\nb", "ü", ",", "\"", "", "x"];
        let mut text = String::new();
        push_record(&mut text, fields);
        let mut reader = csv::ReaderBuilder::new().has_headers(false).from_reader(text.as_bytes());
        let record = reader.records().next().expect("one record").expect("well formed");
        assert_eq!(record.iter().collect::<Vec<_>>(), fields);
    }
}
