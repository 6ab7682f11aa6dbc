//! The bundled fonts, and how wide a text is in them.

use std::sync::LazyLock;
use ttf_parser::Face;

/// Noto Sans.
pub const REGULAR: &[u8] = include_bytes!("../../assets/fonts/NotoSans-Regular-subset.ttf");
/// Noto Sans Bold.
pub const BOLD: &[u8] = include_bytes!("../../assets/fonts/NotoSans-Bold-subset.ttf");
/// Signs of mathematics that Noto Sans lacks.
pub const MATH: &[u8] = include_bytes!("../../assets/fonts/NotoSansMath-subset.ttf");
/// The sign of the Sun.
pub const SYMBOLS: &[u8] = include_bytes!("../../assets/fonts/NotoSansSymbols2-subset.ttf");

/// The family that figures ask for, and what a reader without it may use.
pub(super) const FAMILY: &str = "'Noto Sans', 'Noto Sans Math', 'Noto Sans Symbols2', 'DejaVu Sans', Arial, sans-serif";

/// Width of a sign that no bundled font has, as a share of the size: an em, as for most signs of other scripts.
const FOREIGN_WIDTH: f64 = 1.0;

static PLAIN: LazyLock<Vec<Face<'static>>> = LazyLock::new(|| faces([REGULAR, MATH, SYMBOLS]));
static HEAVY: LazyLock<Vec<Face<'static>>> = LazyLock::new(|| faces([BOLD, MATH, SYMBOLS]));

fn faces(fonts: [&'static [u8]; 3]) -> Vec<Face<'static>> {
    fonts.into_iter().filter_map(|font| Face::parse(font, 0).ok()).collect()
}

/// Width of a text of a size in the unit of that size.
pub(super) fn width(text: &str, size: f64, is_bold: bool) -> f64 {
    let faces: &[Face<'_>] = if is_bold { &HEAVY } else { &PLAIN };
    let of_sign = |sign: char| {
        let found = faces.iter().find_map(|face| {
            let advance = face.glyph_hor_advance(face.glyph_index(sign)?)?;
            Some(f64::from(advance) / f64::from(face.units_per_em()))
        });
        found.unwrap_or(FOREIGN_WIDTH)
    };
    size * text.chars().map(of_sign).sum::<f64>()
}

/// The text, or as much of it as fits with an ellipsis.
pub(super) fn fitted(text: &str, room: f64, size: f64, is_bold: bool) -> String {
    if width(text, size, is_bold) <= room {
        return text.to_owned();
    }
    let mut kept: Vec<char> = text.chars().collect();
    while !kept.is_empty() {
        kept.pop();
        let short: String = kept.iter().collect::<String>().trim_end().to_owned() + "…";
        if width(&short, size, is_bold) <= room {
            return short;
        }
    }
    String::new()
}

/// The text in lines no wider than a room, at most so many; what is left over ends in an ellipsis.
pub(super) fn wrapped(text: &str, room: f64, size: f64, most_lines: usize) -> Vec<String> {
    let mut lines: Vec<String> = Vec::new();
    let mut line = String::new();
    let mut words = text.split(' ').filter(|word| !word.is_empty()).peekable();
    while let Some(word) = words.next() {
        let longer = if line.is_empty() { word.to_owned() } else { format!("{line} {word}") };
        if width(&longer, size, false) <= room || line.is_empty() {
            line = longer;
        } else if lines.len() + 1 == most_lines {
            let rest: Vec<&str> = std::iter::once(word).chain(words.by_ref()).collect();
            line = format!("{line} {}", rest.join(" "));
        } else {
            lines.push(std::mem::replace(&mut line, word.to_owned()));
        }
    }
    lines.push(line);
    lines.into_iter().map(|line| fitted(&line, room, size, false)).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn figures_have_equal_widths_and_bold_is_wider() {
        assert_eq!(width("1111", 10.0, false), width("8888", 10.0, false));
        assert!(width("Luminosity", 10.0, true) > width("Luminosity", 10.0, false));
        assert!(width("L☉ M⊕ 10⁻⁴ σ", 10.0, false) > 10.0);
    }

    #[test]
    fn lines_fit_and_keep_every_word_while_there_is_room() {
        let text = "one two three four five six seven eight nine ten";
        let lines = wrapped(text, 80.0, 12.0, 9);
        assert!(lines.len() > 2 && lines.iter().all(|line| width(line, 12.0, false) <= 80.0), "{lines:?}");
        assert_eq!(lines.join(" "), text);
        let short = wrapped(text, 80.0, 12.0, 2);
        assert!(short.len() == 2 && short[1].ends_with('…'), "{short:?}");
        assert_eq!(fitted("abc", 0.0, 12.0, false), "");
    }
}
