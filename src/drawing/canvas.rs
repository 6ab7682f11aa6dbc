//! The elements of an SVG, written as text: shapes, text, gradients, clips.

use super::fonts::FAMILY;
use std::fmt::Write;

/// A place, in units of the drawing, to the right and down.
pub(super) type Point = [f64; 2];

/// An upright rectangle.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Area {
    pub left: f64,
    pub top: f64,
    pub right: f64,
    pub bottom: f64,
}

impl Area {
    pub(super) fn width(self) -> f64 {
        self.right - self.left
    }

    pub(super) fn height(self) -> f64 {
        self.bottom - self.top
    }

    pub(super) fn centre(self) -> Point {
        [0.5 * (self.left + self.right), 0.5 * (self.top + self.bottom)]
    }

    pub(super) fn meets(self, other: Self) -> bool {
        self.left < other.right && other.left < self.right && self.top < other.bottom && other.top < self.bottom
    }

    pub(super) fn holds(self, other: Self) -> bool {
        self.left <= other.left && other.right <= self.right && self.top <= other.top && other.bottom <= self.bottom
    }
}

/// How a line is drawn.
#[derive(Clone, Copy, Debug)]
pub(super) struct Stroke<'a> {
    pub ink: &'a str,
    pub width: f64,
    /// Lengths of dashes and gaps; empty for a plain line.
    pub dashes: &'a str,
}

pub(super) fn stroke(ink: &str, width: f64) -> Stroke<'_> {
    Stroke { ink, width, dashes: "" }
}

/// Where a text stands beside its place.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Anchor {
    Start,
    Middle,
    End,
}

/// How a text is written.
#[derive(Clone, Copy, Debug)]
pub(super) struct Lettering<'a> {
    pub ink: &'a str,
    pub size: f64,
    pub anchor: Anchor,
    pub is_bold: bool,
}

pub(super) fn lettering(ink: &str, size: f64, anchor: Anchor) -> Lettering<'_> {
    Lettering { ink, size, anchor, is_bold: false }
}

/// An SVG in the making.
#[derive(Debug)]
pub(super) struct Canvas {
    /// What every name within the document begins with, so that several figures can stand in one page.
    prefix: String,
    body: String,
    names: usize,
}

impl Canvas {
    pub(super) fn new(prefix: &str) -> Self {
        Self { prefix: prefix.to_owned(), body: String::new(), names: 0 }
    }

    /// The whole document. `units` are width and height of the drawing, `size_px` those it is shown at.
    pub(super) fn document(self, units: [f64; 2], size_px: [u32; 2], title: &str, description: &str) -> String {
        let [width, height] = size_px;
        let prefix = &self.prefix;
        format!(
            "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"{width}\" height=\"{height}\" viewBox=\"0 0 {} {}\" \
             role=\"img\" aria-labelledby=\"{prefix}-title {prefix}-desc\" font-family=\"{FAMILY}\">\n\
             <title id=\"{prefix}-title\">{}</title>\n<desc id=\"{prefix}-desc\">{}</desc>\n{}</svg>\n",
            short(units[0]),
            short(units[1]),
            markup_text(title),
            markup_text(description),
            self.body,
        )
    }

    fn add(&mut self, element: std::fmt::Arguments<'_>) {
        // Writing to a String cannot fail.
        let _ = self.body.write_fmt(element);
        self.body.push('\n');
    }

    pub(super) fn rect(&mut self, area: Area, fill: &str) {
        let (x, y, width, height) = (area.left, area.top, area.width().max(0.0), area.height().max(0.0));
        self.add(format_args!(
            "<rect x=\"{}\" y=\"{}\" width=\"{}\" height=\"{}\" fill=\"{fill}\"/>",
            short(x),
            short(y),
            short(width),
            short(height)
        ));
    }

    /// A rectangle that lets what is under it shine through.
    pub(super) fn veil(&mut self, area: Area, fill: &str, opacity: f64) {
        self.add(format_args!(
            "<rect x=\"{}\" y=\"{}\" width=\"{}\" height=\"{}\" fill=\"{fill}\" fill-opacity=\"{}\"/>",
            short(area.left),
            short(area.top),
            short(area.width().max(0.0)),
            short(area.height().max(0.0)),
            short(opacity)
        ));
    }

    pub(super) fn line(&mut self, from: Point, to: Point, stroke: Stroke<'_>) {
        self.polyline(&[from, to], stroke);
    }

    pub(super) fn polyline(&mut self, points: &[Point], stroke: Stroke<'_>) {
        if points.len() > 1 {
            self.add(format_args!("<path d=\"{}\" fill=\"none\"{}/>", path(points), painted(stroke)));
        }
    }

    pub(super) fn polygon(&mut self, points: &[Point], fill: &str) {
        if points.len() > 2 {
            self.add(format_args!("<path d=\"{}Z\" fill=\"{fill}\"/>", path(points)));
        }
    }

    pub(super) fn closed_line(&mut self, points: &[Point], stroke: Stroke<'_>) {
        self.add(format_args!("<path d=\"{}Z\" fill=\"none\"{}/>", path(points), painted(stroke)));
    }

    pub(super) fn disc(&mut self, centre: Point, radius: f64, fill: &str, rim: Option<Stroke<'_>>) {
        self.add(format_args!(
            "<circle cx=\"{}\" cy=\"{}\" r=\"{}\" fill=\"{fill}\"{}/>",
            short(centre[0]),
            short(centre[1]),
            short(radius),
            rim.map(painted).unwrap_or_default()
        ));
    }

    pub(super) fn circle(&mut self, centre: Point, radius: f64, stroke: Stroke<'_>) {
        self.disc(centre, radius, "none", Some(stroke));
    }

    /// A flat ring between two radii.
    pub(super) fn ring(&mut self, centre: Point, inner: f64, outer: f64, fill: &str) {
        let round = |radius: f64| {
            format!(
                "M{} {}a{r} {r} 0 1 0 {} 0a{r} {r} 0 1 0 {} 0Z",
                short(centre[0] - radius),
                short(centre[1]),
                short(2.0 * radius),
                short(-2.0 * radius),
                r = short(radius)
            )
        };
        let inside = if inner > 0.0 { round(inner) } else { String::new() };
        self.add(format_args!("<path d=\"{}{inside}\" fill=\"{fill}\" fill-rule=\"evenodd\"/>", round(outer)));
    }

    /// A line of text on its baseline.
    pub(super) fn text(&mut self, place: Point, text: &str, letters: Lettering<'_>) {
        self.text_turned(place, text, letters, "");
    }

    /// A line of text that reads upwards.
    pub(super) fn text_upwards(&mut self, place: Point, text: &str, letters: Lettering<'_>) {
        let turn = format!(" transform=\"rotate(-90 {} {})\"", short(place[0]), short(place[1]));
        self.text_turned(place, text, letters, &turn);
    }

    fn text_turned(&mut self, place: Point, text: &str, letters: Lettering<'_>, turn: &str) {
        let anchor = match letters.anchor {
            Anchor::Start => "",
            Anchor::Middle => " text-anchor=\"middle\"",
            Anchor::End => " text-anchor=\"end\"",
        };
        let weight = if letters.is_bold { " font-weight=\"700\"" } else { "" };
        self.add(format_args!(
            "<text x=\"{}\" y=\"{}\" font-size=\"{}\" fill=\"{}\"{anchor}{weight}{turn}>{}</text>",
            short(place[0]),
            short(place[1]),
            short(letters.size),
            letters.ink,
            markup_text(text)
        ));
    }

    /// Draws within an area only.
    pub(super) fn clipped(&mut self, area: Area, draw: impl FnOnce(&mut Self)) {
        let name = self.name();
        self.add(format_args!(
            "<clipPath id=\"{name}\"><rect x=\"{}\" y=\"{}\" width=\"{}\" height=\"{}\"/></clipPath>\n\
             <g clip-path=\"url(#{name})\">",
            short(area.left),
            short(area.top),
            short(area.width().max(0.0)),
            short(area.height().max(0.0))
        ));
        draw(self);
        self.add(format_args!("</g>"));
    }

    /// An ink that changes from left to right through colours at rising places; returns its name as a fill or stroke.
    pub(super) fn colours_across(&mut self, stops: &[(f64, String)]) -> String {
        let (Some(first), Some(last)) = (stops.first(), stops.last()) else { return "none".to_owned() };
        let width = last.0 - first.0;
        if width <= 0.0 {
            return first.1.clone();
        }
        let name = self.name();
        let mut inside = String::new();
        for (index, (x, ink)) in stops.iter().enumerate() {
            // What lies within a stretch of one colour changes nothing.
            let is_within =
                index > 0 && index + 1 < stops.len() && stops[index - 1].1 == *ink && stops[index + 1].1 == *ink;
            if !is_within {
                let offset = format!("{:.5}", (x - first.0) / width);
                let _ = write!(inside, "<stop offset=\"{offset}\" stop-color=\"{ink}\"/>");
            }
        }
        self.add(format_args!(
            "<linearGradient id=\"{name}\" gradientUnits=\"userSpaceOnUse\" x1=\"{}\" y1=\"0\" x2=\"{}\" y2=\"0\">{inside}</linearGradient>",
            short(first.0),
            short(last.0)
        ));
        format!("url(#{name})")
    }

    fn name(&mut self) -> String {
        self.names += 1;
        format!("{}-{}", self.prefix, self.names)
    }
}

fn path(points: &[Point]) -> String {
    let mut text = String::with_capacity(14 * points.len());
    for (index, [x, y]) in points.iter().enumerate() {
        let _ = write!(text, "{}{} {}", if index == 0 { "M" } else { "L" }, short(*x), short(*y));
    }
    text
}

fn painted(stroke: Stroke<'_>) -> String {
    let dashes =
        if stroke.dashes.is_empty() { String::new() } else { format!(" stroke-dasharray=\"{}\"", stroke.dashes) };
    format!(" stroke=\"{}\" stroke-width=\"{}\" stroke-linejoin=\"round\"{dashes}", stroke.ink, short(stroke.width))
}

/// A length with as many digits as can be seen; what is not finite stands at the origin.
fn short(value: f64) -> String {
    let text = format!("{:.2}", if value.is_finite() { value.clamp(-1e6, 1e6) } else { 0.0 });
    let trimmed = text.trim_end_matches('0').trim_end_matches('.');
    if trimmed == "-0" { "0".to_owned() } else { trimmed.to_owned() }
}

/// A text that XML and HTML take as nothing but text: signs that end it are written as entities, and what no page shows
/// (control characters, turns of the reading direction, what XML forbids) is left out.
#[must_use]
pub fn markup_text(text: &str) -> String {
    let mut safe = String::with_capacity(text.len());
    for sign in line_of_text(text).chars() {
        match sign {
            '&' => safe.push_str("&amp;"),
            '<' => safe.push_str("&lt;"),
            '>' => safe.push_str("&gt;"),
            '"' => safe.push_str("&quot;"),
            '\'' => safe.push_str("&#39;"),
            sign => safe.push(sign),
        }
    }
    safe
}

/// A text as one line without signs that no page shows.
#[must_use]
pub fn line_of_text(text: &str) -> String {
    let in_line = text.chars().map(|sign| if matches!(sign, '\n' | '\t' | '\r') { ' ' } else { sign });
    in_line.filter(|sign| !is_unfit(*sign)).collect()
}

/// Whether a sign has no place in a line of text.
fn is_unfit(sign: char) -> bool {
    sign.is_control()
        || matches!(sign, '\u{200e}' | '\u{200f}' | '\u{202a}'..='\u{202e}' | '\u{2066}'..='\u{2069}' | '\u{fffe}' | '\u{ffff}')
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn hostile_text_stays_text() {
        assert_eq!(
            markup_text("<script>\"a\"&'b'</script>"),
            "&lt;script&gt;&quot;a&quot;&amp;&#39;b&#39;&lt;/script&gt;"
        );
        assert_eq!(markup_text("a\nb\u{0}\u{202e}c\u{ffff}"), "a bc");
    }

    #[test]
    fn lengths_are_short_and_never_foreign() {
        assert_eq!([1.0, -0.001, 12.346, f64::NAN, 1e300].map(short), ["1", "0", "12.35", "0", "1000000"]);
    }
}
