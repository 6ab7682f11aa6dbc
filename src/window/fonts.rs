//! The bundled fonts: one family with figures of equal width, and the symbols it lacks.

use egui::{FontData, FontDefinitions, FontFamily};
use std::sync::Arc;

/// Name of the bold family.
pub(crate) const BOLD: &str = "bold";

const REGULAR_FONT: &[u8] = include_bytes!("../../assets/fonts/NotoSans-Regular-subset.ttf");
const BOLD_FONT: &[u8] = include_bytes!("../../assets/fonts/NotoSans-Bold-subset.ttf");
const MATH_FONT: &[u8] = include_bytes!("../../assets/fonts/NotoSansMath-subset.ttf");
const SYMBOL_FONT: &[u8] = include_bytes!("../../assets/fonts/NotoSansSymbols2-subset.ttf");

/// Every character the program writes beyond plain letters; a test holds the fonts to it.
pub const SPECIAL_CHARACTERS: &str = "☉⊕×·±−–—…°µ²³⁰¹⁴⁵⁶⁷⁸⁹⁻₂¼½¾√σετδηαλ≈≤≥→←↑↓\u{2009}\u{202f}";

/// Installs the fonts; the toolkit's own stay as a last resort for foreign names.
pub(crate) fn install(context: &egui::Context) {
    context.set_fonts(definitions());
}

/// The font definitions of the window.
#[must_use]
pub fn definitions() -> FontDefinitions {
    let mut fonts = FontDefinitions::default();
    let bundled = [("regular", REGULAR_FONT), (BOLD, BOLD_FONT), ("math", MATH_FONT), ("symbols", SYMBOL_FONT)];
    for (name, bytes) in bundled {
        let mut data = FontData::from_static(bytes);
        if name == "symbols" {
            // The sign of the Sun stands too high beside letters in this font.
            data.tweak.y_offset_factor = 0.14;
        }
        fonts.font_data.insert(name.to_owned(), Arc::new(data));
    }
    let fallback: Vec<String> = fonts.families.get(&FontFamily::Proportional).cloned().unwrap_or_default();
    let family = |first: &[&str]| -> Vec<String> {
        first.iter().map(|name| (*name).to_owned()).chain(fallback.iter().cloned()).collect()
    };
    fonts.families.insert(FontFamily::Proportional, family(&["regular", "math", "symbols"]));
    fonts.families.insert(FontFamily::Monospace, family(&["regular", "math", "symbols"]));
    fonts.families.insert(FontFamily::Name(BOLD.into()), family(&[BOLD, "regular", "math", "symbols"]));
    fonts
}
