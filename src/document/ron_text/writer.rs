//! Values to text: one field a line, so that a change of one value is a change of one line.

use crate::units::number_text::machine;

/// Where long strings are broken, in characters.
const WIDTH: usize = 100;
const INDENT: &str = "    ";

/// Writes structs and lists with one member a line.
#[derive(Debug, Default)]
pub struct Writer {
    text: String,
    depth: usize,
}

impl Writer {
    /// An empty text.
    #[must_use]
    pub fn new() -> Self {
        Self::default()
    }

    /// Opens a struct or list as a member: `key: Name(`; key and name may be empty.
    pub fn open(&mut self, key: &str, name: &str, bracket: char) {
        self.begin(key);
        self.text.push_str(name);
        self.text.push(bracket);
        self.text.push('\n');
        self.depth += 1;
    }

    /// Closes the innermost struct or list.
    pub fn close(&mut self, bracket: char) {
        self.depth = self.depth.saturating_sub(1);
        self.begin("");
        self.text.push(bracket);
        self.text.push_str(if self.depth == 0 { "\n" } else { ",\n" });
    }

    /// Writes `key: value,` with a value that is text of this form already; the key may be empty.
    pub fn field(&mut self, key: &str, value: &str) {
        self.begin(key);
        self.text.push_str(value);
        self.text.push_str(",\n");
    }

    /// Writes a finite number.
    pub fn number(&mut self, key: &str, value: f64) {
        self.field(key, &number_text(value));
    }

    /// Writes a string on one line.
    pub fn string(&mut self, key: &str, value: &str) {
        self.field(key, &quoted(value));
    }

    /// Writes a string over as many lines as it needs.
    pub fn paragraph(&mut self, key: &str, value: &str) {
        let indent = INDENT.repeat(self.depth + 1);
        let text = wrapped(value, &indent, INDENT.len() * self.depth + key.len() + 2);
        self.field(key, &text);
    }

    /// The text so far.
    #[must_use]
    pub fn finish(self) -> String {
        self.text
    }

    fn begin(&mut self, key: &str) {
        for _ in 0..self.depth {
            self.text.push_str(INDENT);
        }
        if !key.is_empty() {
            self.text.push_str(key);
            self.text.push_str(": ");
        }
    }
}

/// The shortest text that reads back to the same number.
///
/// The form has no text for a value that is not finite; sound documents hold none, and zero never stands in for it:
/// such a value is written as `NaN` or `inf`, which our reader refuses.
#[must_use]
pub fn number_text(value: f64) -> String {
    let Some(plain) = machine(value) else { return value.to_string() };
    let scientific = format!("{value:e}");
    // Nobody counts nine zeros.
    if value.abs() >= 1e6 && scientific.len() < plain.len() { scientific } else { plain }
}

/// A string with quotes and escapes.
#[must_use]
pub fn quoted(text: &str) -> String {
    format!("\"{}\"", escaped(text))
}

fn escaped(text: &str) -> String {
    let mut written = String::with_capacity(text.len());
    for character in text.chars() {
        push_escaped(&mut written, character);
    }
    written
}

fn escaped_length(text: &str) -> usize {
    escaped(text).chars().count()
}

fn push_escaped(written: &mut String, character: char) {
    match character {
        '"' => written.push_str("\\\""),
        '\\' => written.push_str("\\\\"),
        '\n' => written.push_str("\\n"),
        '\t' => written.push_str("\\t"),
        '\r' => written.push_str("\\r"),
        _ if character.is_control() || matches!(character, '\u{2028}' | '\u{2029}') => {
            written.extend(character.escape_unicode());
        }
        _ => written.push(character),
    }
}

/// A string broken between words and after line ends by a backslash, which swallows the indent that follows.
fn wrapped(text: &str, indent: &str, used: usize) -> String {
    let mut written = String::from("\"");
    let mut column = used + 1;
    let mut rest = text;
    while !rest.is_empty() {
        let piece = &rest[..piece_length(rest)];
        rest = &rest[piece.len()..];
        let escaped = escaped(piece);
        let ends_line = piece.ends_with('\n') && !rest.is_empty();
        // A swallowed space would be lost: no break before one.
        let may_break = !rest.starts_with([' ', '\t', '\r', '\n']);
        column += escaped_length(piece);
        written.push_str(&escaped);
        let next = escaped_length(&rest[..piece_length(rest)]);
        // Room for the backslash, or for the quote and the comma.
        if may_break && !rest.is_empty() && (ends_line || column + next + 2 > WIDTH) {
            written.push_str("\\\n");
            written.push_str(indent);
            column = indent.len();
        }
    }
    written.push('"');
    written
}

/// A word with the one space or all the line ends after it.
fn piece_length(text: &str) -> usize {
    let Some(at) = text.find([' ', '\n']) else { return text.len() };
    let line_ends = text[at..].bytes().take_while(|byte| *byte == b'\n').count();
    at + line_ends.max(1)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn long_text_breaks_between_words() {
        let mut writer = Writer::new();
        writer.open("", "Longember", '(');
        writer.paragraph("about", &format!("{} end.\n\nSecond \"paragraph\".", "word ".repeat(30)));
        writer.close(')');
        let text = writer.finish();
        assert!(text.lines().all(|line| line.chars().count() <= WIDTH), "{text}");
        assert_eq!(text.lines().count(), 5, "{text}");
        assert!(text.contains("end.\\n\\n\\\n        Second \\\"paragraph\\\"."), "{text}");
    }

    #[test]
    fn control_characters_are_escaped() {
        assert_eq!(quoted("a\u{1b}\r\n\\"), "\"a\\u{1b}\\r\\n\\\\\"");
    }
}
