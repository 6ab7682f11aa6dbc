//! Comma-separated values with the quoting of RFC 4180.
//!
//! Lines end with a line feed alone: every reader accepts it, and line tools of a shell need it.

use std::fmt::Write;

/// Appends one record with its line end.
///
/// # Source
/// RFC 4180, section 2, rules 5 to 7: a field with a comma, a quotation mark or a line break stands in quotation marks,
/// and a quotation mark inside is doubled. Leading and trailing spaces are quoted too, for readers that trim.
pub(super) fn push_record<T: AsRef<str>>(text: &mut String, fields: impl IntoIterator<Item = T>) {
    for (index, field) in fields.into_iter().enumerate() {
        if index > 0 {
            text.push(',');
        }
        push_field(text, field.as_ref());
    }
    text.push('\n');
}

fn push_field(text: &mut String, field: &str) {
    let needs_quotes = field.contains([',', '"', '\n', '\r']) || field.trim() != field;
    if needs_quotes {
        // Writing to a String cannot fail.
        let _ = write!(text, "\"{}\"", field.replace('"', "\"\""));
    } else {
        text.push_str(field);
    }
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
    fn a_csv_reader_gets_back_what_was_written() {
        let fields = ["Ember, \"the hot one\"", "\r\n", "ü", ",", "\"", "", "x"];
        let mut text = String::new();
        push_record(&mut text, fields);
        let mut reader = csv::ReaderBuilder::new().has_headers(false).from_reader(text.as_bytes());
        let record = reader.records().next().expect("one record").expect("well formed");
        assert_eq!(record.iter().collect::<Vec<_>>(), fields);
    }
}
