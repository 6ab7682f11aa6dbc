//! Handing over from the window: figure, fact sheet and table as files, the fact sheet on the clipboard.

use crate::driver::Driver;
use egui::OutputCommand;
use std::fs;
use std::path::Path;

/// Frames that an export may take.
const MOST_FRAMES: usize = 2000;

/// Chooses an item, types the path, waits until it is written.
fn export(driver: &mut Driver, item: &str, path: &Path) {
    driver.choose("Scenario", item);
    driver.enter("Path of the file", path.to_str().expect("UTF-8"));
    wait(driver);
}

fn wait(driver: &mut Driver) {
    for _ in 0..MOST_FRAMES {
        if !driver.workspace().is_exporting() {
            driver.settle();
            return;
        }
        std::thread::sleep(std::time::Duration::from_millis(2));
        driver.harness.step();
    }
    unreachable!("the export never ends");
}

#[test]
fn the_figure_is_the_one_of_the_page_shown() {
    let folder = tempfile::tempdir().expect("a folder");
    let mut driver = Driver::demo();
    driver.enter("Moment", "7 Gyr");
    for (page, title) in [
        ("Curves", "The life of Veldane"),
        ("Spectrum", "Spectrum of"),
        ("Orbits", "Orbits about"),
        ("Interior", "The inside of"),
        ("Climate", "The climate of"),
    ] {
        driver.click(page);
        let path = folder.path().join(format!("{page}.svg"));
        export(&mut driver, "Export figure", &path);
        let svg = fs::read_to_string(&path).expect("written");
        assert!(svg.contains(title) && svg.contains("7.000 Gyr"), "{page}");
        assert!(driver.shows("Exported"), "{}", driver.everything());
    }
    let path = folder.path().join("page.png");
    export(&mut driver, "Export figure", &path);
    assert!(fs::read(&path).expect("written").starts_with(b"\x89PNG"));
}

#[test]
fn sheet_and_table_are_those_of_the_moment_and_a_missing_end_is_added() {
    let folder = tempfile::tempdir().expect("a folder");
    let mut driver = Driver::demo();
    driver.enter("Moment", "7 Gyr");
    export(&mut driver, "Export fact sheet", &folder.path().join("sheet"));
    let page = fs::read_to_string(folder.path().join("sheet.html")).expect("written");
    assert!(page.contains("7.000 billion years") && page.contains("<svg "));
    export(&mut driver, "Export table", &folder.path().join("table.ecsv"));
    let table = fs::read_to_string(folder.path().join("table.ecsv")).expect("written");
    assert!(table.starts_with("# %ECSV 1.0"));
}

#[test]
fn the_sheet_goes_to_the_clipboard_as_text() {
    let mut driver = Driver::demo();
    driver.click("Scenario");
    driver.the("Copy fact sheet").click();
    let mut copied = None;
    for _ in 0..MOST_FRAMES {
        driver.harness.step();
        let commands = &driver.harness.output().platform_output.commands;
        copied = commands.iter().find_map(|command| match command {
            OutputCommand::CopyText(text) => Some(text.clone()),
            _ => None,
        });
        if copied.is_some() {
            break;
        }
        std::thread::sleep(std::time::Duration::from_millis(2));
    }
    let text = copied.expect("copied");
    assert!(text.contains("SOURCES") && text.contains("Luminosity") && text.contains("[2]"), "{text}");
}

#[test]
fn what_can_t_be_written_is_said_and_nothing_is_left_behind() {
    let folder = tempfile::tempdir().expect("a folder");
    let mut driver = Driver::demo();
    export(&mut driver, "Export figure", &folder.path().join("figure.bmp"));
    assert!(driver.shows("allowed .svg, .pdf, .png"), "{}", driver.everything());
    export(&mut driver, "Export table", &folder.path().join("no/such/table.csv"));
    assert!(driver.shows("can't be written"), "{}", driver.everything());
    assert_eq!(fs::read_dir(folder.path()).expect("readable").count(), 0);
}
