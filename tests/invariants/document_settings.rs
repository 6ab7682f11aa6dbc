//! Settings and recovery copies: no bytes bring their readers down, and what is written is read without a warning.

use longember::document::recovery::left_behind;
use longember::document::{Settings, Theme};
use proptest::prelude::*;
use std::fs;
use std::path::Path;

fn any_bytes() -> impl Strategy<Value = Vec<u8>> {
    let word = prop::sample::select(vec![
        "LongemberSettings(",
        "LongemberRecovery(",
        "theme: ",
        "Dome",
        "text_scale: ",
        "1.5",
        "recent_files: [",
        "]",
        ")",
        ",",
        "\"/a/b.ron\"",
        "later: ",
        "Some(",
        "file: ",
        "None",
        "scenario: ",
        "Longember(",
        "\"",
        "/*",
        "\n",
        "{",
    ]);
    prop_oneof![
        prop::collection::vec(any::<u8>(), 0..200),
        prop::collection::vec(word, 0..40).prop_map(|words| words.concat().into_bytes()),
    ]
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 128, ..ProptestConfig::default() })]

    #[test]
    fn any_settings_file_is_read_and_written_without_a_second_warning(bytes in any_bytes()) {
        let folder = tempfile::tempdir().expect("a folder");
        let path = folder.path().join("settings.ron");
        fs::write(&path, &bytes).expect("written");
        let (mut settings, _) = Settings::read(&path);
        settings.write(&path).expect("written");
        let (again, warning) = Settings::read(&path);
        prop_assert!(warning.is_none(), "{:?}\n{}", warning, fs::read_to_string(&path).expect("text"));
        prop_assert_eq!(again, settings);
    }

    #[test]
    fn any_copy_is_taken_up_or_set_aside(bytes in any_bytes()) {
        let folder = tempfile::tempdir().expect("a folder");
        fs::write(folder.path().join("session-a.ron"), &bytes).expect("written");
        let found = left_behind(folder.path()).expect("readable");
        prop_assert_eq!(found.copies.len() + found.damaged.len(), 1);
    }

    #[test]
    fn settings_in_any_state_come_back(
        theme in 0..3_usize,
        time_scale in "\\PC{0,12}",
        text_scale in 0.75..2.5_f64,
        names in prop::collection::vec("[^/\0]{1,12}", 0..14),
    ) {
        let folder = tempfile::tempdir().expect("a folder");
        let path = folder.path().join("settings.ron");
        let mut settings = Settings::default();
        (settings.theme, settings.time_scale, settings.text_scale) = (Theme::ALL[theme], time_scale, text_scale);
        for name in names.iter().filter(|name| !matches!(name.as_str(), "." | "..")) {
            settings.remember_file(&Path::new("/scenarios").join(name));
        }
        settings.write(&path).expect("written");
        let (again, warning) = Settings::read(&path);
        prop_assert!(warning.is_none(), "{:?}", warning);
        prop_assert_eq!(again, settings);
    }
}
