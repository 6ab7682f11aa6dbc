//! Numbers as a careful article prints them, and back.
//!
//! Thin spaces group thousands, the minus is the true minus sign, and very large or small
//! values use a power of ten with superscripts. [`parse_number`] reads all of that back,
//! and plain machine notation too.

/// Thin space, U+2009, between groups of three digits.
pub const THIN_SPACE: char = '\u{2009}';
/// The true minus sign, U+2212.
pub const TRUE_MINUS: char = '\u{2212}';

/// Significant digits that figures carry unless a caller says otherwise.
pub const USUAL_DIGITS: usize = 4;

/// Writes `value` with `digits` significant digits for people to read.
///
/// Values from 0.001 to below ten million are written plainly, others with a power of ten.
/// A value that is not finite is written as an en dash: there is no figure to show.
///
/// # Example
/// ```
/// use longember::units::number_text::number;
/// assert_eq!(number(12345.6, 5), "12\u{2009}346");
/// assert_eq!(number(-0.25, 3), "\u{2212}0.250");
/// assert_eq!(number(6.62607e-34, 3), "6.63 × 10⁻³⁴");
/// ```
#[must_use]
pub fn number(value: f64, digits: usize) -> String {
    if !value.is_finite() {
        return "–".to_owned();
    }
    if value == 0.0 {
        return "0".to_owned();
    }
    let digits = digits.clamp(1, 17);
    // Rounding first keeps 9.9996 from being written as 10.000 with a digit too many.
    let scientific = format!("{:.*e}", digits - 1, value.abs());
    let (mantissa, exponent) = split_scientific(&scientific);
    let sign = if value < 0.0 { TRUE_MINUS.to_string() } else { String::new() };
    if (-3..7).contains(&exponent) {
        let decimals = usize::try_from((i32::try_from(digits).unwrap_or(17) - 1 - exponent).max(0)).unwrap_or(0);
        let rounded = scientific.parse::<f64>().unwrap_or(value.abs());
        return format!("{sign}{}", group_thousands(&format!("{rounded:.decimals$}")));
    }
    format!("{sign}{mantissa} × 10{}", superscript(exponent))
}

/// Writes `value` rounded to a fixed number of decimals, grouped and with a true minus.
#[must_use]
pub fn fixed(value: f64, decimals: usize) -> String {
    if !value.is_finite() {
        return "–".to_owned();
    }
    let plain = format!("{:.*}", decimals.min(17), value.abs());
    let is_zero = plain.bytes().all(|byte| matches!(byte, b'0' | b'.'));
    let sign = if value < 0.0 && !is_zero { TRUE_MINUS.to_string() } else { String::new() };
    format!("{sign}{}", group_thousands(&plain))
}

/// Writes an integer exponent with superscript digits.
#[must_use]
pub fn superscript(exponent: i32) -> String {
    exponent
        .to_string()
        .chars()
        .map(|character| match character {
            '-' => '⁻',
            '1' => '¹',
            '2' => '²',
            '3' => '³',
            digit => char::from_u32('⁰' as u32 + (digit as u32 - '0' as u32)).unwrap_or(digit),
        })
        .collect()
}

/// Writes `value` for a machine: the shortest text that reads back to the same `f64`.
///
/// Only finite values have a text; `None` stands for a missing figure (an empty cell, a null).
#[must_use]
pub fn machine(value: f64) -> Option<String> {
    value.is_finite().then(|| {
        let magnitude = value.abs();
        if magnitude != 0.0 && !(1e-4..1e15).contains(&magnitude) { format!("{value:e}") } else { format!("{value}") }
    })
}

/// Reads a number as people type or paste it: `1 234.5`, `−0.3`, `2.4e29`, `6.6 × 10⁻³⁴`, `1_000`.
///
/// A comma is refused rather than guessed at, since it divides thousands for some and decimals for others.
#[must_use]
pub fn parse_number(text: &str) -> Option<f64> {
    let mut plain = String::with_capacity(text.len());
    let mut in_superscript = false;
    for character in text.trim().chars() {
        match character {
            THIN_SPACE | '\u{202f}' | '\u{a0}' | ' ' | '_' | '\'' => {}
            TRUE_MINUS | '–' => plain.push('-'),
            '×' | '·' | '*' => plain.push('×'),
            '⁻' => {
                in_superscript = true;
                plain.push_str("^-");
            }
            '⁰' | '¹' | '²' | '³' | '⁴'..='⁹' => {
                if !in_superscript {
                    plain.push('^');
                    in_superscript = true;
                }
                plain.push(superscript_digit(character));
            }
            other => plain.push(other),
        }
    }
    let plain = plain.replace("×10^", "e").replace("x10^", "e");
    let plain = plain.strip_prefix("10^").map_or(plain.clone(), |exponent| format!("1e{exponent}"));
    let shape_ok = !plain.is_empty()
        && plain
            .chars()
            .all(|character| character.is_ascii_digit() || matches!(character, '.' | '-' | '+' | 'e' | 'E'));
    shape_ok.then(|| plain.parse::<f64>().ok()).flatten().filter(|value| value.is_finite())
}

fn superscript_digit(character: char) -> char {
    match character {
        '¹' => '1',
        '²' => '2',
        '³' => '3',
        other => char::from_u32('0' as u32 + (other as u32).saturating_sub('⁰' as u32)).unwrap_or('0'),
    }
}

fn split_scientific(text: &str) -> (&str, i32) {
    let (mantissa, exponent) = text.split_once('e').unwrap_or((text, "0"));
    (mantissa, exponent.parse().unwrap_or(0))
}

/// Puts thin spaces into the whole part of a plain decimal text; four digits stay together.
fn group_thousands(plain: &str) -> String {
    let (whole, fraction) = plain.split_once('.').map_or((plain, None), |(whole, fraction)| (whole, Some(fraction)));
    let mut grouped = String::with_capacity(plain.len() + 4);
    for (index, digit) in whole.chars().enumerate() {
        if index > 0 && (whole.len() - index) % 3 == 0 && whole.len() > 4 {
            grouped.push(THIN_SPACE);
        }
        grouped.push(digit);
    }
    if let Some(fraction) = fraction {
        grouped.push('.');
        grouped.push_str(fraction);
    }
    grouped
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn significant_digits_round_before_they_choose_the_form() {
        assert_eq!(number(9.9996, 4), "10.00");
        assert_eq!(number(0.000_999_96, 4), "0.001000");
        assert_eq!(number(5772.0, 4), "5772");
        assert_eq!(number(57_721.0, 4), "57\u{2009}720");
        assert_eq!(number(-1.5e12, 3), "\u{2212}1.50 × 10¹²");
        assert_eq!(number(f64::NAN, 3), "–");
        assert_eq!(number(0.0, 3), "0");
    }

    #[test]
    fn what_is_written_is_read_back() {
        for value in [1.5, -0.25, 12_345.0, 6.63e-34, 3e12, -7.25e20, 0.002] {
            let read = parse_number(&number(value, 6)).expect("own text is understood");
            assert!((read / value - 1.0).abs() < 1e-5, "{value} came back as {read}");
        }
        assert_eq!(parse_number("10^6"), Some(1e6));
        assert_eq!(parse_number("1,5"), None);
        assert_eq!(parse_number("nan"), None);
        assert_eq!(parse_number("1e999"), None);
    }

    #[test]
    fn machine_text_reads_back_to_the_same_bits() {
        for value in [0.1, 1e14, 3.0e-300, 5772.0, -1.0 / 3.0, 0.0] {
            let text = machine(value).expect("finite");
            assert_eq!(text.parse::<f64>().expect("a number").to_bits(), value.to_bits());
        }
        assert_eq!(machine(f64::INFINITY), None);
    }

    #[test]
    fn fixed_never_writes_a_negative_zero() {
        assert_eq!(fixed(-0.001, 2), "0.00");
        assert_eq!(fixed(-12_345.678, 1), "\u{2212}12\u{2009}345.7");
    }
}
