//! Every character that the program writes has a glyph in its fonts.

use crate::driver::Driver;
use egui::{FontFamily, FontId};
use longember::document::built_in;
use longember::system::limits;
use longember::system::provenance::METHODS;
use longember::system::quantities::{PLANET, STAR};
use longember::window::{SPECIAL_CHARACTERS, key_bindings};
use std::fs;
use std::path::Path;

/// Families that the window writes with.
fn families() -> [FontFamily; 3] {
    [FontFamily::Proportional, FontFamily::Monospace, FontFamily::Name("bold".into())]
}

/// Characters of a text that a family lacks.
fn lacking(driver: &Driver, family: &FontFamily, text: &str) -> String {
    let font = FontId::new(13.0, family.clone());
    driver.harness.ctx.fonts_mut(|fonts| {
        text.chars().filter(|sign| !sign.is_whitespace() && !fonts.has_glyph(&font, *sign)).collect()
    })
}

/// Every character between the quotes of the source, beyond plain letters.
fn characters_of_source(folder: &Path, found: &mut String) {
    for entry in fs::read_dir(folder).expect("readable") {
        let path = entry.expect("an entry").path();
        if path.is_dir() {
            characters_of_source(&path, found);
        } else if path.extension().is_some_and(|extension| extension == "rs") {
            let text = fs::read_to_string(&path).expect("readable");
            let text = text.split("\n#[cfg(test)]\nmod tests").next().unwrap_or_default();
            let code = text
                .lines()
                .map(|line| line.split("// ").next().unwrap_or_default())
                .filter(|line| !line.trim_start().starts_with("//"));
            found.extend(code.flat_map(str::chars).filter(|sign| !sign.is_ascii()));
        }
    }
}

#[test]
fn the_fonts_have_every_special_character() {
    let driver = Driver::demo();
    for family in families() {
        assert_eq!(lacking(&driver, &family, SPECIAL_CHARACTERS), "", "{family:?}");
        assert_eq!(lacking(&driver, &family, "Zoë Ångström, naïve 0123456789"), "", "{family:?}");
        assert_eq!(lacking(&driver, &family, "a\u{13000}"), "\u{13000}", "what no font has is noticed");
    }
}

#[test]
fn the_fonts_have_every_text_of_the_engine() {
    let driver = Driver::demo();
    let mut texts: Vec<String> = Vec::new();
    for method in METHODS {
        texts.extend(
            [method.name, method.relation, method.source, method.valid_for, method.accuracy].map(str::to_owned),
        );
    }
    texts.extend(STAR.iter().flat_map(|quantity| [quantity.name, quantity.symbol]).map(str::to_owned));
    texts.extend(PLANET.iter().flat_map(|quantity| [quantity.name, quantity.symbol]).map(str::to_owned));
    texts.extend(
        limits::ALL.iter().flat_map(|limit| [limit.name.to_owned(), limit.meaning.to_owned(), limit.allowed()]),
    );
    texts.extend(key_bindings().iter().map(|binding| driver.harness.ctx.format_shortcut(&binding.shortcut)));
    for built_in in built_in::all() {
        let scenario = built_in.scenario().expect("sound");
        texts.extend([scenario.title, scenario.about]);
    }
    assert!(texts.len() > 100);
    for text in texts {
        assert_eq!(lacking(&driver, &FontFamily::Proportional, &text), "", "{text}");
    }
}

#[test]
fn the_fonts_have_every_character_of_the_source() {
    let driver = Driver::demo();
    let mut found = String::new();
    characters_of_source(&Path::new(env!("CARGO_MANIFEST_DIR")).join("src"), &mut found);
    assert!(found.contains('☉') && found.contains('⊕'));
    assert_eq!(lacking(&driver, &FontFamily::Proportional, &found), "");
}
