//! The parsed text: values with the places they stand at.

/// A stretch of the text, as byte offsets.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Span {
    /// Offset of the first byte.
    pub start: usize,
    /// Offset just past the last byte.
    pub end: usize,
}

/// A value and where it stands.
#[derive(Clone, Debug, PartialEq)]
pub struct Node {
    /// Where it stands.
    pub span: Span,
    /// What it is.
    pub value: Value,
}

/// What a text can say.
#[derive(Clone, Debug, PartialEq)]
pub enum Value {
    /// A finite number.
    Number(f64),
    /// A string, its escapes resolved.
    Text(String),
    /// `true` or `false`.
    Truth(bool),
    /// A bare name, such as a variant without content.
    Name(String),
    /// `[…]`
    List(Vec<Node>),
    /// `Name(key: value, …)`, the name optional.
    Record(Record),
    /// `Name(value, …)`, the name optional.
    Tuple {
        /// The name before the bracket.
        name: Option<String>,
        /// The values.
        items: Vec<Node>,
    },
    /// Something that was reported already.
    Broken,
}

/// A struct with named fields.
#[derive(Clone, Debug, PartialEq)]
pub struct Record {
    /// The name before the bracket.
    pub name: Option<String>,
    /// The fields in the order of the text, repeated ones included.
    pub fields: Vec<Field>,
    /// A part could not be read, so a field that is not here may only have been unreadable.
    pub damaged: bool,
}

/// One field of a struct.
#[derive(Clone, Debug, PartialEq)]
pub struct Field {
    /// The key as written.
    pub key: String,
    /// Where the key stands.
    pub key_span: Span,
    /// The value.
    pub value: Node,
}

impl Node {
    /// The value in words for a message: `"0.3" (text)`, `a list`.
    #[must_use]
    pub fn described(&self) -> String {
        match &self.value {
            Value::Number(number) => super::number_text(*number),
            Value::Text(text) => format!("{} (text)", super::quoted(&shortened(text))),
            Value::Truth(truth) => truth.to_string(),
            Value::Name(name) => shortened(name),
            Value::List(_) => "a list […]".to_owned(),
            Value::Record(Record { name, .. }) | Value::Tuple { name, .. } => {
                name.as_ref().map_or_else(|| "a group (…)".to_owned(), |name| format!("{}(…)", shortened(name)))
            }
            Value::Broken => "not readable".to_owned(),
        }
    }
}

/// A text short enough for one line of a message.
pub(super) fn shortened(text: &str) -> String {
    const LONGEST: usize = 40;
    if text.chars().count() <= LONGEST {
        return text.to_owned();
    }
    text.chars().take(LONGEST).chain(std::iter::once('…')).collect()
}
