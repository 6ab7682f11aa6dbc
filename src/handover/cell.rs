//! One value of a table or an object, and its two machine forms.

use crate::units::number_text::machine;
use serde_json::{Number, Value};
use std::borrow::Cow;

/// A value on its way out.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Cell {
    /// A word or a name.
    Text(Cow<'static, str>),
    /// A number; what is not finite counts as missing.
    Number(f64),
    /// No value applies or none is modelled.
    Missing,
}

impl Cell {
    /// A number that may be missing.
    pub(super) fn number(value: Option<f64>) -> Self {
        value.filter(|value| value.is_finite()).map_or(Self::Missing, Self::Number)
    }

    /// A word that may be missing.
    pub(super) fn word(value: Option<&'static str>) -> Self {
        value.map_or(Self::Missing, |word| Self::Text(Cow::Borrowed(word)))
    }

    /// Whether there is nothing to show.
    pub(super) fn is_missing(&self) -> bool {
        match self {
            Self::Text(_) => false,
            Self::Number(value) => !value.is_finite(),
            Self::Missing => true,
        }
    }

    /// The value as a cell of a text table; empty when missing.
    pub(super) fn plain(&self) -> Cow<'_, str> {
        match self {
            Self::Text(text) => Cow::Borrowed(text),
            Self::Number(value) => Cow::Owned(machine(*value).unwrap_or_default()),
            Self::Missing => Cow::Borrowed(""),
        }
    }

    /// The value as JSON; null when missing.
    pub(super) fn json(&self) -> Value {
        match self {
            Self::Text(text) => Value::from(text.as_ref()),
            Self::Number(value) => Number::from_f64(*value).map_or(Value::Null, Value::Number),
            Self::Missing => Value::Null,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_is_not_finite_is_missing_everywhere() {
        for odd in [f64::NAN, f64::INFINITY, f64::NEG_INFINITY] {
            assert_eq!(Cell::number(Some(odd)), Cell::Missing);
            let cell = Cell::Number(odd);
            assert!(cell.is_missing());
            assert_eq!((cell.plain().as_ref(), cell.json()), ("", Value::Null));
        }
    }

    #[test]
    fn numbers_read_back_to_the_same_bits_from_both_forms() {
        for value in [1.0 / 3.0, 1e14, 5e-324, -0.0, f64::MAX, 2.2250738585072014e-308, 4.57e9] {
            let cell = Cell::Number(value);
            let plain: f64 = cell.plain().parse().expect("a number");
            let json: f64 = serde_json::from_str(&cell.json().to_string()).expect("a number");
            assert_eq!((plain.to_bits(), json.to_bits()), (value.to_bits(), value.to_bits()), "{value:e}");
        }
    }
}
