//! The moment as a text to type over.

use crate::driver::Driver;
use egui::{Key, Modifiers};

#[test]
fn a_typed_moment_is_gone_to() {
    let mut driver = Driver::demo();
    for (text, moment_yr) in
        [("7.6 Gyr", 7.6e9), ("2 trillion years", 2e12), ("3e9 yr", 3e9), ("12 million years", 12e6), ("0", 0.0)]
    {
        driver.enter("Moment", text);
        assert_eq!(driver.assert_one_instant(), moment_yr, "{text}");
    }
}

#[test]
fn nonsense_stays_with_its_reason_and_the_moment_stays_too() {
    let mut driver = Driver::demo();
    for (text, reason) in [("soon", "is not a span of time"), ("-3 Gyr", "allowed: 0 to"), ("1e15 yr", "allowed: 0 to")]
    {
        driver.enter("Moment", "4.6 billion years");
        let before = driver.outlines("Moment");
        assert!(!driver.shows(reason));
        driver.enter("Moment", text);
        assert_eq!(driver.text_in("Moment"), text);
        assert!(driver.shows(reason), "{text}:\n{}", driver.everything());
        assert!(driver.outlines("Moment").iter().any(|colour| !before.contains(colour)), "{text} is not outlined");
        assert_eq!(driver.workspace().moment_yr, 4.6e9);
        driver.enter("Moment", "4.6 Gyr");
        assert!(!driver.shows(reason));
    }
    driver.assert_one_instant();
}

#[test]
fn escape_gives_up() {
    let mut driver = Driver::demo();
    driver.type_over("Moment", "1 Gyr");
    driver.press(Modifiers::NONE, Key::Escape);
    assert_eq!(driver.assert_one_instant(), 4.6e9);
    driver.enter("Moment", "soon");
    driver.type_over("Moment", "later");
    driver.press(Modifiers::NONE, Key::Escape);
    assert!(!driver.shows("is not a span of time"));
    assert_eq!(driver.assert_one_instant(), 4.6e9);
}

#[test]
fn keys_of_the_strip_are_letters_in_a_field() {
    let mut driver = Driver::demo();
    driver.type_over("Moment", "9");
    driver.harness.key_press(Key::Home);
    driver.harness.key_press(Key::N);
    driver.harness.key_press(Key::Space);
    driver.harness.run_steps(2);
    assert_eq!(driver.workspace().moment_yr, 4.6e9);
    assert!(!driver.workspace().playback.is_running);
}
