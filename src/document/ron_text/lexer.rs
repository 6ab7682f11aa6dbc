//! From characters to words: brackets, names, numbers, strings.

use super::syntax::{Faults, SyntaxFault};
use super::tree::{Span, shortened};

/// A word of the text.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Word {
    Open(char),
    Close(char),
    Comma,
    Colon,
    Name(String),
    Number(f64),
    Text(String),
    /// A word with a fault that was reported already.
    Faulty,
    End,
}

/// A word and where it stands.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Token {
    pub(super) word: Word,
    pub(super) span: Span,
}

/// Cuts a text into words, one at a time.
#[derive(Debug)]
pub(super) struct Lexer<'t> {
    pub(super) text: &'t str,
    at: usize,
    pub(super) faults: Faults,
    /// A comment was met.
    pub(super) comments: usize,
}

impl<'t> Lexer<'t> {
    pub(super) fn new(text: &'t str) -> Self {
        // Some editors begin a file with a byte order mark.
        let at = if text.starts_with('\u{feff}') { '\u{feff}'.len_utf8() } else { 0 };
        Self { text, at, faults: Faults::default(), comments: 0 }
    }

    /// The next word; the end again and again after the last.
    pub(super) fn next(&mut self) -> Token {
        self.skip_space();
        let start = self.at;
        let word = match self.peek() {
            None => Word::End,
            // Nobody reads a hundred problems: the rest of the text is left alone.
            Some(_) if self.faults.full => {
                self.at = self.text.len();
                Word::End
            }
            Some(character) => self.word(character),
        };
        Token { word, span: Span { start, end: self.at } }
    }

    fn word(&mut self, character: char) -> Word {
        match character {
            '(' | '[' | '{' => self.single(Word::Open(character)),
            ')' | ']' | '}' => self.single(Word::Close(character)),
            ',' => self.single(Word::Comma),
            ':' => self.single(Word::Colon),
            '"' => self.string(),
            'r' if self.raw_hashes().is_some() => self.raw_string(),
            '0'..='9' | '+' | '-' | '.' => self.number(),
            _ if character.is_alphabetic() || character == '_' => {
                Word::Name(self.take_while(|character| character.is_alphanumeric() || character == '_').to_owned())
            }
            _ => {
                self.faults.push(self.at, foreign(character));
                self.single(Word::Faulty)
            }
        }
    }

    fn peek(&self) -> Option<char> {
        self.text[self.at..].chars().next()
    }

    fn take(&mut self) -> Option<char> {
        let character = self.peek()?;
        self.at += character.len_utf8();
        Some(character)
    }

    fn take_while(&mut self, keep: impl Fn(char) -> bool) -> &'t str {
        let rest = &self.text[self.at..];
        let length = rest.find(|character| !keep(character)).unwrap_or(rest.len());
        self.at += length;
        &rest[..length]
    }

    fn single(&mut self, word: Word) -> Word {
        self.take();
        word
    }

    /// Passes over space and comments.
    fn skip_space(&mut self) {
        loop {
            self.take_while(is_space);
            let rest = &self.text[self.at..];
            if rest.starts_with("//") {
                self.comments += 1;
                self.take_while(|character| character != '\n');
            } else if rest.starts_with("/*") {
                self.comments += 1;
                self.skip_block_comment();
            } else {
                return;
            }
        }
    }

    fn skip_block_comment(&mut self) {
        let start = self.at;
        let mut depth = 0_usize;
        loop {
            let rest = &self.text[self.at..];
            if rest.starts_with("/*") {
                depth += 1;
                self.at += 2;
            } else if rest.starts_with("*/") {
                depth -= 1;
                self.at += 2;
                if depth == 0 {
                    return;
                }
            } else if self.take().is_none() {
                self.faults.push(start, SyntaxFault::UnclosedComment);
                return;
            }
        }
    }

    fn number(&mut self) -> Word {
        let start = self.at;
        while let Some(character) = self.peek() {
            let sign_fits = self.at == start || self.text[..self.at].ends_with(['e', 'E']);
            match character {
                '+' | '-' if sign_fits => self.at += 1,
                '.' | '_' => self.at += 1,
                _ if character.is_alphanumeric() => self.at += character.len_utf8(),
                _ => break,
            }
        }
        let text = &self.text[start..self.at];
        let fault = match decimal(text) {
            Some(value) if value.is_finite() => return Word::Number(value),
            Some(_) => SyntaxFault::NumberTooLarge { text: shortened(text) },
            None => SyntaxFault::BadNumber { text: shortened(text) },
        };
        self.faults.push(start, fault);
        Word::Faulty
    }

    fn string(&mut self) -> Word {
        let start = self.at;
        self.take();
        let mut resolved = String::new();
        loop {
            resolved.push_str(self.take_while(|character| character != '"' && character != '\\'));
            match self.take() {
                Some('"') => return Word::Text(resolved),
                Some(_) => self.escape(&mut resolved),
                None => {
                    self.faults.push(start, SyntaxFault::UnclosedText);
                    return Word::Faulty;
                }
            }
        }
    }

    /// Resolves what follows a backslash.
    fn escape(&mut self, resolved: &mut String) {
        let start = self.at - 1;
        let character = match self.take() {
            Some('n') => Some('\n'),
            Some('r') => Some('\r'),
            Some('t') => Some('\t'),
            Some('0') => Some('\0'),
            Some(same @ ('"' | '\'' | '\\')) => Some(same),
            Some('x') => self.hexadecimal(2).filter(char::is_ascii),
            Some('u') => self.braced_hexadecimal(),
            Some('\n') => {
                self.take_while(|character| matches!(character, ' ' | '\t' | '\r' | '\n'));
                return;
            }
            Some('\r') if self.peek() == Some('\n') => {
                self.take_while(|character| matches!(character, ' ' | '\t' | '\r' | '\n'));
                return;
            }
            // The end of the text is reported as an unclosed string.
            None => return,
            Some(_) => None,
        };
        if let Some(character) = character {
            resolved.push(character);
        } else {
            let escape = shortened(&self.text[start..self.at]).escape_debug().to_string().replace("\\\\", "\\");
            self.faults.push(start, SyntaxFault::BadEscape { escape });
        }
    }

    /// Up to `most` hexadecimal digits as a character.
    fn hexadecimal(&mut self, most: usize) -> Option<char> {
        let rest = &self.text[self.at..];
        let length = rest.bytes().take(most).take_while(u8::is_ascii_hexdigit).count();
        self.at += length;
        u32::from_str_radix(&rest[..length], 16).ok().and_then(char::from_u32)
    }

    fn braced_hexadecimal(&mut self) -> Option<char> {
        if self.peek() != Some('{') {
            return None;
        }
        self.take();
        let character = self.hexadecimal(6);
        if self.peek() != Some('}') {
            return None;
        }
        self.take();
        character
    }

    /// How many `#` stand between the `r` here and a quote; none if this is no raw string.
    fn raw_hashes(&self) -> Option<usize> {
        let rest = &self.text[self.at + 1..];
        let hashes = rest.bytes().take_while(|byte| *byte == b'#').count();
        rest[hashes..].starts_with('"').then_some(hashes)
    }

    fn raw_string(&mut self) -> Word {
        let start = self.at;
        let hashes = self.raw_hashes().unwrap_or(0);
        let closing = format!("\"{}", "#".repeat(hashes));
        let content = start + 1 + hashes + 1;
        if let Some(length) = self.text[content..].find(&closing) {
            self.at = content + length + closing.len();
            return Word::Text(self.text[content..content + length].to_owned());
        }
        self.at = self.text.len();
        self.faults.push(start, SyntaxFault::UnclosedText);
        Word::Faulty
    }
}

/// The characters RON counts as space.
fn is_space(character: char) -> bool {
    matches!(
        character,
        ' ' | '\n' | '\t' | '\r' | '\u{b}' | '\u{c}' | '\u{85}' | '\u{200e}' | '\u{200f}' | '\u{2028}' | '\u{2029}'
    )
}

/// A decimal number with underscores between digits; none if the text is no such number.
fn decimal(text: &str) -> Option<f64> {
    let unsigned = text.strip_prefix(['+', '-']).unwrap_or(text);
    let (mantissa, exponent) =
        unsigned.split_once(['e', 'E']).map_or((unsigned, None), |(mantissa, exponent)| (mantissa, Some(exponent)));
    let (whole, fraction) = mantissa.split_once('.').unwrap_or((mantissa, ""));
    let are_digits = |part: &str| {
        part.is_empty() || (!part.starts_with('_') && part.bytes().all(|byte| byte.is_ascii_digit() || byte == b'_'))
    };
    let exponent_fits = exponent.is_none_or(|exponent| {
        let digits = exponent.strip_prefix(['+', '-']).unwrap_or(exponent);
        !digits.is_empty() && are_digits(digits)
    });
    if (whole.is_empty() && fraction.is_empty()) || !are_digits(whole) || !are_digits(fraction) || !exponent_fits {
        return None;
    }
    text.replace('_', "").parse().ok()
}

fn foreign(character: char) -> SyntaxFault {
    let remedy = match character {
        '\u{2212}' | '–' => Some("write the minus sign as a hyphen, -"),
        '“' | '”' | '„' | '«' | '»' => Some("write quotes as \""),
        '\'' => Some("put text into double quotes"),
        '=' => Some("write a colon between key and value"),
        ';' => Some("write a comma"),
        '#' => Some("write comments as // …"),
        '\u{a0}' | '\u{202f}' | '\u{2009}' | '\u{feff}' => Some("replace this special space by a usual one"),
        _ => None,
    };
    SyntaxFault::Unexpected {
        found: format!("the character {}", character.escape_debug()),
        wanted: "keys, numbers, quoted text, brackets and commas",
        remedy: remedy.map(str::to_owned),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn words(text: &str) -> (Vec<Word>, Vec<SyntaxFault>) {
        let mut lexer = Lexer::new(text);
        let mut words = Vec::new();
        loop {
            match lexer.next().word {
                Word::End => break,
                word => words.push(word),
            }
        }
        (words, lexer.faults.found.into_iter().map(|(_, fault)| fault).collect())
    }

    fn one(text: &str) -> Word {
        let (mut words, faults) = words(text);
        assert_eq!((words.len(), faults), (1, Vec::new()), "{text}");
        words.remove(0)
    }

    #[test]
    fn numbers_in_every_permitted_form() {
        for (text, value) in [
            ("0", 0.0),
            ("-20", -20.0),
            ("+1.5", 1.5),
            (".5", 0.5),
            ("5.", 5.0),
            ("1_000", 1e3),
            ("2.5E-3", 2.5e-3),
            ("4_5e1_0", 45e10),
        ] {
            assert_eq!(one(text), Word::Number(value), "{text}");
        }
        for text in ["1e", "0x10", "1.2.3", "-", "-inf", "1f64", "._5", "1e_3", "--1", "3M☉"] {
            let (_, faults) = words(text);
            assert!(
                matches!(faults[0], SyntaxFault::BadNumber { .. } | SyntaxFault::Unexpected { .. }),
                "{text}: {faults:?}"
            );
        }
        assert!(matches!(words("1e999").1[0], SyntaxFault::NumberTooLarge { .. }));
    }

    #[test]
    fn strings_resolve_their_escapes() {
        assert_eq!(one(r#""a\"\\\n\t\x41\u{263a}b""#), Word::Text("a\"\\\n\tA☺b".to_owned()));
        assert_eq!(one("\"one \\\n     two \\\r\n  three\""), Word::Text("one two three".to_owned()));
        assert_eq!(one("r\"a\\n\""), Word::Text("a\\n".to_owned()));
        assert_eq!(one("r##\"a\"#b\"##"), Word::Text("a\"#b".to_owned()));
        for text in [r#""\q""#, r#""\u{d800}""#, r#""\x9f""#, r#""\u12""#, r#""\u{1234567}""#] {
            assert!(matches!(words(text).1[0], SyntaxFault::BadEscape { .. }), "{text}");
        }
        assert_eq!(words("\"open").1, [SyntaxFault::UnclosedText]);
        assert_eq!(words("r#\"open\"").1, [SyntaxFault::UnclosedText]);
        assert_eq!(words("\"open\\").1, [SyntaxFault::UnclosedText]);
    }

    #[test]
    fn comments_nest_and_are_counted() {
        let mut lexer = Lexer::new("\u{feff}/* a /* b */ c */ x // d\n");
        assert_eq!(lexer.next().word, Word::Name("x".to_owned()));
        assert_eq!(lexer.next().word, Word::End);
        assert_eq!(lexer.comments, 2);
        assert_eq!(words("/* /* */").1, [SyntaxFault::UnclosedComment]);
    }

    #[test]
    fn a_flood_of_faults_ends_the_reading() {
        let (words, faults) = words(&"§".repeat(5000));
        assert!(words.len() <= Faults::MOST + 1);
        assert_eq!(faults.len(), Faults::MOST + 1);
        assert_eq!(faults.last(), Some(&SyntaxFault::TooMany { most: Faults::MOST }));
    }
}
