//! The sheet as one HTML file that needs nothing else: no script, no font, no picture from outside.

use super::content::{FactSheet, Group, MomentSheet, PLANETS_ACROSS, figure_names};
use crate::drawing::markup_text as text;
use std::fmt::Write;

const STYLE: &str = include_str!("../../../assets/pages/fact_sheet.css");

/// A fact sheet as HTML that prints well, light or dark as its reader likes it.
#[must_use]
pub fn sheet_html(sheet: &FactSheet) -> String {
    let mut page = String::new();
    // Writing to a String cannot fail.
    let title = text(&sheet.title);
    let _ = write!(
        page,
        "<!DOCTYPE html>\n<html lang=\"en-GB\">\n<head>\n<meta charset=\"utf-8\">\n\
         <meta http-equiv=\"Content-Security-Policy\" content=\"default-src 'none'; style-src 'unsafe-inline'\">\n\
         <meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n\
         <meta name=\"generator\" content=\"{program}\">\n<title>{title}: fact sheet</title>\n<style>\n{STYLE}</style>\n\
         </head>\n<body>\n<main>\n<header>\n<p class=\"kind\">Fact sheet</p>\n<h1>{title}</h1>\n",
        program = text(&sheet.program),
    );
    for paragraph in &sheet.about {
        let _ = writeln!(page, "<p class=\"about\">{}</p>", text(paragraph));
    }
    page.push_str("</header>\n");
    push_inputs(&mut page, sheet);
    for moment in &sheet.moments {
        push_moment(&mut page, sheet, moment);
    }
    page.push_str("<section>\n<h2>Cautions</h2>\n<ul>\n");
    for caution in &sheet.cautions {
        let _ = writeln!(page, "<li>{}</li>", text(caution));
    }
    page.push_str("</ul>\n</section>\n");
    push_sources(&mut page, sheet);
    let _ = writeln!(
        page,
        "<footer><p>Made with {}. Every number carries the mark of its source line.</p></footer>\n</main>\n</body>\n</html>",
        text(&sheet.program)
    );
    page
}

fn mark(number: usize) -> String {
    format!("<a class=\"mark\" href=\"#source-{number}\" aria-label=\"source {number}\">{number}</a>")
}

fn push_inputs(page: &mut String, sheet: &FactSheet) {
    page.push_str("<section>\n<h2>The system as given</h2>\n");
    let (star, planets) = sheet.inputs.split_at(sheet.inputs.len().min(1));
    page.push_str("<p class=\"inputs\">");
    for group in star {
        let figures: Vec<String> = group
            .figures
            .iter()
            .map(|figure| {
                format!(
                    "{} {}{}",
                    figure.name.to_lowercase().replace("[fe/h]", "[Fe/H]"),
                    text(&figure.value),
                    mark(figure.mark)
                )
            })
            .collect();
        let _ = write!(page, "The star <strong>{}</strong>: {}.", text(&group.name), figures.join(", "));
    }
    page.push_str("</p>\n");
    push_table(page, planets, false);
    page.push_str("</section>\n");
}

/// Bodies side by side, a few at a time.
fn push_table(page: &mut String, groups: &[Group], with_words: bool) {
    for block in groups.chunks(PLANETS_ACROSS) {
        page.push_str("<div class=\"wide\"><table>\n<thead><tr><td></td>");
        for group in block {
            let _ = write!(page, "<th scope=\"col\">{}</th>", text(&group.name));
        }
        page.push_str("</tr></thead>\n<tbody>\n");
        if with_words {
            page.push_str("<tr><th scope=\"row\">State</th>");
            for group in block {
                let _ = write!(page, "<td>{}</td>", text(&group.words));
            }
            page.push_str("</tr>\n");
        }
        for name in figure_names(block) {
            let _ = write!(page, "<tr><th scope=\"row\">{}</th>", text(name));
            for group in block {
                match group.figures.iter().find(|figure| figure.name == name) {
                    Some(figure) => {
                        let _ = write!(page, "<td>{}{}</td>", text(&figure.value), mark(figure.mark));
                    }
                    None => page.push_str("<td>–</td>"),
                }
            }
            page.push_str("</tr>\n");
        }
        page.push_str("</tbody>\n</table></div>\n");
    }
}

fn push_moment(page: &mut String, sheet: &FactSheet, moment: &MomentSheet) {
    let _ = writeln!(
        page,
        "<section class=\"moment\">\n<h2>{} <small>after the star reached the main sequence</small></h2>\n\
         <h3>{}: {}</h3>\n<div class=\"columns\"><div class=\"wide\"><table>\n\
         <thead><tr><td></td><th scope=\"col\">Value</th><th scope=\"col\">Spread</th></tr></thead>\n<tbody>",
        text(&moment.time),
        text(&sheet.star),
        text(&moment.star.words)
    );
    for figure in &moment.star.figures {
        let spread = figure.spread.as_ref().map_or_else(String::new, |spread| format!("± {}", text(spread)));
        let _ = writeln!(
            page,
            "<tr><th scope=\"row\">{}</th><td>{}{}</td><td>{spread}</td></tr>",
            text(figure.name),
            text(&figure.value),
            mark(figure.mark)
        );
    }
    page.push_str("</tbody>\n</table></div>\n");
    if !moment.chronicle.is_empty() {
        page.push_str("<div><h3>Before and after</h3>\n<ol class=\"chronicle\">\n");
        for dated in &moment.chronicle {
            let doubt = dated.doubt.as_ref().map_or_else(String::new, |doubt| format!(" <em>{}</em>", text(doubt)));
            let _ = writeln!(
                page,
                "<li class=\"{}\"><span class=\"date\">{}{}</span> <span>{}{doubt}</span></li>",
                if dated.is_past { "past" } else { "ahead" },
                text(&dated.date),
                mark(dated.mark),
                text(&dated.what)
            );
        }
        page.push_str("</ol></div>\n");
    }
    page.push_str("</div>\n");
    if !moment.planets.is_empty() {
        page.push_str("<h3>Planets</h3>\n");
        push_table(page, &moment.planets, true);
    }
    page.push_str("<div class=\"figures\">\n");
    for [light, dark] in &moment.drawings {
        let _ = writeln!(page, "<figure><div class=\"light\">{light}</div><div class=\"dark\">{dark}</div></figure>");
    }
    page.push_str("</div>\n");
    if !moment.notes.is_empty() {
        page.push_str("<h3>Notes</h3>\n<ul>\n");
        for note in &moment.notes {
            let _ = writeln!(page, "<li>{}</li>", text(note));
        }
        page.push_str("</ul>\n");
    }
    page.push_str("</section>\n");
}

fn push_sources(page: &mut String, sheet: &FactSheet) {
    page.push_str("<section class=\"sources\">\n<h2>Sources</h2>\n<ol>\n");
    for (index, source) in sheet.sources.iter().enumerate() {
        let _ = writeln!(
            page,
            "<li id=\"source-{}\"><strong>{}.</strong> {} <b>Source</b> {}. <b>Valid for</b> {}. <b>Accuracy</b> {}.</li>",
            index + 1,
            text(source.name),
            text(source.relation),
            text(source.source),
            text(source.valid_for),
            text(source.accuracy)
        );
    }
    page.push_str("</ol>\n</section>\n");
}
