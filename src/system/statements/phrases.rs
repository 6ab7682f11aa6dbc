//! Pieces of a typed line: words, quoted names, values.

use super::quantity::Quantity;
use crate::units::entry::{EntryKind, write_entry};

/// Quotation marks around a name, the ones that are written first.
const QUOTES: [(char, char); 3] = [('\'', '\''), ('"', '"'), ('“', '”')];

/// A name in quotation marks. What stands in its way inside is told by a backslash.
#[must_use]
pub(super) fn quoted(name: &str) -> String {
    if let Some((open, close)) = QUOTES.into_iter().find(|(_, close)| !name.contains([*close, '\\'])) {
        return format!("{open}{name}{close}");
    }
    let mut text = String::from("'");
    for sign in name.chars() {
        if matches!(sign, '\'' | '\\') {
            text.push('\\');
        }
        text.push(sign);
    }
    text.push('\'');
    text
}

/// The name at the start of a text, and how many bytes it takes with its quotation marks; none without a closing one.
#[must_use]
pub(super) fn unquoted(text: &str) -> Option<(String, usize)> {
    let open = text.chars().next()?;
    let (_, close) = QUOTES.into_iter().find(|(known, _)| *known == open)?;
    let mut name = String::new();
    let mut is_escaped = false;
    for (at, sign) in text.char_indices().skip(1) {
        if is_escaped {
            name.push(sign);
            is_escaped = false;
        } else if sign == '\\' {
            is_escaped = true;
        } else if sign == close {
            return Some((name, at + sign.len_utf8()));
        } else {
            name.push(sign);
        }
    }
    None
}

/// Whether a text starts with a quotation mark.
#[must_use]
pub(super) fn is_quoted(text: &str) -> bool {
    text.starts_with(|sign| QUOTES.iter().any(|(open, _)| *open == sign))
}

/// Bytes of `words` at the start of a text, whatever their case and the space between them; none if others stand there.
#[must_use]
pub(super) fn starts_with_words(text: &str, words: &str) -> Option<usize> {
    let mut used = 0;
    for (index, word) in words.split(' ').enumerate() {
        let rest = &text[used..];
        let trimmed = rest.trim_start();
        if index > 0 && trimmed.len() == rest.len() {
            return None;
        }
        let found = trimmed.get(..word.len()).filter(|found| found.eq_ignore_ascii_case(word) || *found == word)?;
        used += rest.len() - trimmed.len() + found.len();
    }
    let joins = |sign: char| sign.is_alphanumeric() || sign == '_';
    let ends = words.chars().next_back().is_none_or(|sign| !joins(sign)) || !text[used..].starts_with(joins);
    ends.then_some(used)
}

/// A value with the unit it is kept in, as it is typed.
#[must_use]
pub(super) fn value_text(value: f64, kind: EntryKind) -> String {
    let number = write_entry(value, kind);
    match kind.typed_unit() {
        unit if unit.is_empty() || kind == EntryKind::SpanYr => number,
        unit => format!("{number} {unit}"),
    }
}

/// Whether values of a quantity are compared by their difference only: magnitudes and colour coordinates.
#[must_use]
pub(super) fn is_logarithmic(quantity: &Quantity) -> bool {
    matches!(quantity.entry(), EntryKind::Magnitude | EntryKind::Plain)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn any_name_comes_back_from_its_quotes() {
        for name in ["largest radius", "Ember's end", "say \"so\"", "it's \"so\" “high”", "back\\slash", "", "日"]
        {
            let text = quoted(name);
            assert_eq!(unquoted(&text), Some((name.to_owned(), text.len())), "{text}");
        }
        assert_eq!(unquoted("'open"), None);
    }

    #[test]
    fn words_end_where_words_end() {
        assert_eq!(starts_with_words("At  Least 3", "at least"), Some(9));
        assert_eq!(starts_with_words("atleast 3", "at least"), None);
        assert_eq!(starts_with_words("radiuses", "radius"), None);
        assert_eq!(starts_with_words(">=3", ">="), Some(2));
    }
}
