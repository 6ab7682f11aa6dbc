//! The bundled fonts: one family with figures of equal width, and the symbols it lacks.

use crate::drawing::fonts;
use egui::{FontData, FontDefinitions, FontFamily};
use std::sync::Arc;

/// Name of the bold family.
pub(crate) const BOLD: &str = "bold";

/// Every character the program writes beyond plain letters; a test holds the fonts to it.
pub const SPECIAL_CHARACTERS: &str = "☉⊕×·±−–—…°µ²³⁰¹⁴⁵⁶⁷⁸⁹⁻₂¼½¾√σετδηαλ≈≤≥→←↑↓\u{2009}\u{202f}";

/// Installs the fonts; the toolkit's own stay as a last resort for foreign names.
pub(crate) fn install(context: &egui::Context) {
    context.set_fonts(definitions());
}

/// The font definitions of the window.
#[must_use]
pub fn definitions() -> FontDefinitions {
    let mut definitions = FontDefinitions::default();
    let bundled =
        [("regular", fonts::REGULAR), (BOLD, fonts::BOLD), ("math", fonts::MATH), ("symbols", fonts::SYMBOLS)];
    for (name, bytes) in bundled {
        let mut data = FontData::from_static(bytes);
        if name == "symbols" {
            // The sign of the Sun stands too high beside letters in this font.
            data.tweak.y_offset_factor = 0.14;
        }
        definitions.font_data.insert(name.to_owned(), Arc::new(data));
    }
    let fallback: Vec<String> = definitions.families.get(&FontFamily::Proportional).cloned().unwrap_or_default();
    let family = |first: &[&str]| -> Vec<String> {
        first.iter().map(|name| (*name).to_owned()).chain(fallback.iter().cloned()).collect()
    };
    definitions.families.insert(FontFamily::Proportional, family(&["regular", "math", "symbols"]));
    definitions.families.insert(FontFamily::Monospace, family(&["regular", "math", "symbols"]));
    definitions.families.insert(FontFamily::Name(BOLD.into()), family(&[BOLD, "regular", "math", "symbols"]));
    definitions
}
