//! The page of statements: verdicts at a glance, adding, editing, moving, removing, and the way to the moment.

use crate::driver::{CTRL, Driver};
use egui::{Key, Modifiers, OutputCommand};
use longember::document::Scenario;
use longember::system::statements::{Statement, Verdict, judge, parse_statement};
use longember::window::Page;

const TRUE: &str = "star luminosity at now is about 1 Lsun";
const FALSE: &str = "star radius at now is at least 5 Rsun";

/// The page on a star like the Sun with these lines.
fn page(lines: &[&str]) -> Driver {
    let mut scenario = Scenario::new_untitled();
    for line in lines {
        scenario.statements.push(parse_statement(line, &scenario.system).expect("a statement"));
    }
    let mut driver = Driver::of(scenario);
    driver.click("Statements");
    driver.harness.run_steps(10);
    driver
}

fn lines(driver: &Driver) -> Vec<String> {
    driver.workspace().scenario().statements.iter().map(Statement::line).collect()
}

#[test]
fn every_row_of_the_demo_says_its_verdict_in_words() {
    let mut driver = Driver::demo();
    driver.click("Statements");
    assert_eq!(driver.workspace().page, Page::Statements);
    driver.harness.run_steps(60);
    let workspace = driver.workspace();
    let statements = workspace.scenario().statements.clone();
    assert!(statements.len() >= 12);
    let mut seen = std::collections::HashSet::new();
    for (index, statement) in statements.iter().enumerate() {
        let found = judge(statement, &workspace.history);
        seen.insert(found.verdict);
        let name = format!("Statement {}, {}: {}", index + 1, found.verdict.name(), statement.line());
        assert!(driver.has(&name), "{name}:\n{}", driver.everything());
        assert!(driver.shows(&found.sentence), "{}", found.sentence);
    }
    assert!(seen.contains(&Verdict::Holds) && seen.contains(&Verdict::DoesNotHold), "{seen:?}");
}

#[test]
fn a_typed_line_is_added_and_taken_back() {
    let mut driver = page(&[]);
    assert!(driver.shows("Nothing is stated yet"));
    driver.enter("New statement", "star luminosity now is 1 Lsun");
    assert_eq!(lines(&driver), [TRUE]);
    assert!(driver.has(&format!("Statement 1, holds: {TRUE}")));
    assert_eq!(driver.text_in("New statement"), "");
    driver.press(CTRL, Key::Z);
    assert_eq!(lines(&driver), [""; 0]);
    assert!(driver.shows("Undone: Add a statement"));
}

#[test]
fn what_cannot_be_read_stays_with_its_reason() {
    let mut driver = page(&[]);
    let before = driver.outlines("New statement");
    driver.enter("New statement", "star lumosity now is 1 Lsun");
    assert_eq!(lines(&driver), [""; 0]);
    assert!(driver.shows("column 6") && driver.shows("did you mean luminosity?"));
    assert_eq!(driver.text_in("New statement"), "star lumosity now is 1 Lsun");
    assert!(driver.outlines("New statement").iter().any(|colour| !before.contains(colour)), "it is not outlined");
    driver.type_over("New statement", "star luminosity now is 1 Lsun");
    driver.press(Modifiers::NONE, Key::Enter);
    assert_eq!(lines(&driver), [TRUE]);
}

#[test]
fn a_statement_is_put_together_from_lists() {
    let mut driver = page(&[]);
    driver.click("Put a statement together from lists");
    driver.click("Relation of the new statement");
    driver.click("is at most");
    driver.type_over("Value of the new statement", "2 Lsun");
    driver.click("Add the statement put together");
    assert_eq!(lines(&driver), ["star luminosity at now is at most 2 Lsun"]);
}

#[test]
fn rows_are_edited_moved_and_removed() {
    let mut driver = page(&[TRUE, FALSE]);
    assert!(driver.has(&format!("Statement 2, does not hold: {FALSE}")));
    driver.click("Move statement 2 up");
    assert_eq!(lines(&driver), [FALSE, TRUE]);
    driver.click("Edit statement 1");
    driver.enter("Remark on statement 1", "from the draft, page 3");
    driver.enter("Statement 1", "star radius at now is at most 5 Rsun");
    assert_eq!(lines(&driver)[0], "star radius at now is at most 5 Rsun");
    assert!(driver.shows("Remark: from the draft, page 3"));
    assert_eq!(driver.workspace().scenario().statements[0].note, "from the draft, page 3");
    driver.click("Remove statement 2");
    assert_eq!(lines(&driver).len(), 1);
    for _ in 0..4 {
        driver.press(CTRL, Key::Z);
    }
    assert_eq!(lines(&driver), [TRUE, FALSE]);
}

#[test]
fn a_row_leads_to_its_moment_and_to_the_clipboard() {
    let mut driver = page(&["star highest radius is at least 100 Rsun"]);
    driver.click("Go to the moment of statement 1");
    let largest =
        driver.workspace().history.events().iter().find(|event| event.kind.key() == "largest_radius").copied();
    let largest_yr = largest.expect("a giant").time_yr;
    let moment_yr = driver.workspace().moment_yr;
    assert!((moment_yr / largest_yr - 1.0).abs() < 1e-6, "{moment_yr} {largest_yr}");
    driver.the("Copy statement 1 with its verdict").click();
    let mut copied = String::new();
    for _ in 0..8 {
        driver.harness.step();
        for command in &driver.harness.output().platform_output.commands {
            if let OutputCommand::CopyText(text) = command {
                copied.clone_from(text);
            }
        }
    }
    let statement = driver.workspace().scenario().statements[0].clone();
    let sentence = judge(&statement, &driver.workspace().history).sentence;
    assert!(copied.contains(&statement.line()) && copied.ends_with(&sentence), "{copied}");
}

#[test]
fn a_planet_that_is_renamed_takes_its_statements_along() {
    let mut driver =
        page(&["Planet insolation at now is about 1 Searth", "Planet event 'engulfed by the star' happens"]);
    driver.click(&driver.name_of("Planet, "));
    driver.enter("Name of the planet", "Far Ember");
    assert_eq!(
        lines(&driver),
        ["'Far Ember' insolation at now is about 1 Searth", "'Far Ember' event 'engulfed by the star' happens"]
    );
}
