//! `sheet`: fact sheets as HTML, Markdown and text.

use crate::program::{DEMO, edited_demo, refusal, result, run_with_input};
use std::collections::HashSet;

/// Every part of a page between two texts.
fn between<'a>(page: &'a str, from: &str, to: &str) -> Vec<&'a str> {
    page.split(from).skip(1).filter_map(|rest| rest.split(to).next()).collect()
}

fn html(words: &[&str]) -> String {
    result([&["sheet", DEMO, "--format", "html"], words].concat())
}

#[test]
fn every_number_of_the_page_leads_to_a_source_line_and_every_line_is_used() {
    let page = html(&["--at", "4.57Gyr", "--at", "event:\"largest radius\""]);
    let targets: HashSet<&str> = between(&page, "<li id=\"", "\"").into_iter().collect();
    let marks: HashSet<&str> = between(&page, "class=\"mark\" href=\"#", "\"").into_iter().collect();
    assert_eq!(targets, marks);
    assert!(targets.len() > 15, "{targets:?}");
    // Each cell that holds a figure of star or planet has its mark inside.
    let cells = between(&page, "<td>", "</td>");
    let figures = cells.iter().filter(|cell| cell.starts_with(|sign: char| sign.is_ascii_digit()));
    let bare: Vec<&&str> = figures.filter(|cell| !cell.contains("class=\"mark\"")).collect();
    assert_eq!(bare, Vec::<&&str>::new());
    assert!(page.contains("Never look at the Sun"));
}

#[test]
fn the_page_needs_nothing_from_outside_and_runs_nothing() {
    let page = html(&["--at", "now"]);
    for word in
        ["<script", "<link", "<img", "<iframe", "http-equiv=\"refresh", " onload", "url(http", "@import", "src="]
    {
        assert!(!page.contains(word), "{word}");
    }
    let addresses = between(&page, "http://", "\"");
    assert!(addresses.iter().all(|address| *address == "www.w3.org/2000/svg"), "{addresses:?}");
    assert!(page.contains("default-src 'none'") && page.contains("@media print"));
    assert!(page.matches("<svg ").count() >= 6, "each figure for either ground");
    let names = between(&page, " id=\"", "\"");
    assert_eq!(names.iter().collect::<HashSet<_>>().len(), names.len(), "every name once");
}

#[test]
fn numbers_agree_with_the_state_of_the_same_moment() {
    let page = result(["sheet", DEMO, "--at", "4.57Gyr"]);
    let state = crate::program::json(["state", DEMO, "--at", "4.57Gyr", "--format", "json"]);
    let kelvin = state["star"]["effective_temperature_k"].as_f64().expect("a number");
    assert!(page.contains(&format!("| Temperature | {kelvin:.0} K | ± 3 % |")), "{page}");
    assert!(page.contains("[\\[2\\]](#source-2)") && page.contains("2. <a id=\"source-2\"></a>"));
    let text = result(["sheet", DEMO, "--at", "4.57Gyr", "--format", "text"]);
    assert!(text.lines().all(|line| line.chars().count() <= 80), "{text}");
    assert!(text.contains(&format!("{kelvin:.0} K ± 3 % [3]")), "{text}");
}

#[test]
fn hostile_names_stay_text_in_every_form() {
    let title = "title: \"<script>alert(1)</script> | # *x* `y` [z](http://a)\"";
    let scenario = edited_demo("title: \"Five worlds of a star like the Sun\"", title);
    let scenario = scenario.replace("\"Talune\"", "\"<b>T|a</b>\"");
    let sheet = |format: &str| {
        let finished = run_with_input(["sheet", "-", "--at", "now", "--format", format], scenario.as_bytes());
        assert_eq!((finished.code, finished.messages.as_str()), (0, ""));
        finished.results
    };
    let page = sheet("html");
    assert!(!page.contains("<script") && !page.contains("<b>T") && page.contains("&lt;script&gt;"));
    let page = sheet("markdown");
    assert!(page.contains("# \\<script\\>alert(1)\\</script\\> \\| \\# \\*x\\* \\`y\\` \\[z\\](http\\://a)"), "{page}");
    assert!(page.contains("\\<b\\>T\\|a\\</b\\>") && !page.contains("<b>T"));
    assert!(sheet("text").contains("<b>T|a</b>"));
}

#[test]
fn what_is_no_sheet_is_refused() {
    assert!(refusal(["sheet", DEMO, "--at", "now", "--out", "a.docx"], 2).contains(".html, .md and .txt"));
    let mut words = vec!["sheet", DEMO];
    words.extend(["--at", "1Gyr"].repeat(21));
    assert!(refusal(words, 2).contains("allowed 1 to 20"));
    assert_eq!(crate::program::run(["sheet", DEMO]).code, 2);
}
