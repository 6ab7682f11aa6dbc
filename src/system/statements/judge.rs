//! A statement against the model.

use super::lookup::planet_named;
use super::quantity::{FigureKey, Quantity, figure};
use super::reading::{Reader, Reading};
use super::scan::{Scan, Timed};
use super::sentence;
use super::spans::{duration, lifetime_yr, mild, zone_time};
use super::spread::{Range, range_of, range_of_date, range_of_span};
use super::statement::{During, Relation, Statement, Subject, When};
use super::verdict::{Verdict, allowed, verdict};
use crate::physics::planet::{Caution, PlanetEventKind};
use crate::physics::star::WholeLife;
use crate::system::events::{Event, EventKind};
use crate::system::history::History;
use crate::system::moment_request::{MomentRequest, is_kind_named};
use crate::system::provenance::{Method, method};
use crate::system::specification::Body;
use crate::units::likeness::likest;

/// What the model says to a statement.
#[derive(Clone, Debug, PartialEq)]
pub struct Judgement {
    /// The verdict.
    pub verdict: Verdict,
    /// The model's own value, in the unit that the quantity is kept in; none where there is none.
    pub value: Option<f64>,
    /// The figure is above the value, and by how much is not known.
    pub is_bound: bool,
    /// Ends of the range in which the value may lie, where that is published.
    pub lowest: Option<f64>,
    /// See [`Judgement::lowest`].
    pub highest: Option<f64>,
    /// The moment that decides, yr; where the window goes.
    pub time_yr: Option<f64>,
    /// The model's value over the stated one.
    pub factor: Option<f64>,
    /// The model's value minus the stated one, in the unit that the quantity is kept in.
    pub difference: Option<f64>,
    /// What was found, in neutral sentences that can stand in a letter to an editor.
    pub sentence: String,
    /// Key of the method in [`METHODS`](crate::system::provenance::METHODS).
    pub method: &'static str,
    /// What to know about the value.
    pub notes: Vec<String>,
}

/// What was found before it is put into words.
#[derive(Clone, Debug)]
pub(super) struct Finding {
    pub(super) value: Option<f64>,
    pub(super) is_bound: bool,
    pub(super) known: Option<Range>,
    pub(super) time_yr: Option<f64>,
    pub(super) method: &'static str,
    pub(super) notes: Vec<String>,
    /// Whether an event takes place is undecided.
    pub(super) is_undecided: bool,
    /// Why there is no value, as a clause.
    pub(super) reason: Option<String>,
    /// Ends of the values over the stretch of time, where it is about one.
    pub(super) ends: Option<(f64, f64)>,
}

impl Finding {
    fn none(method: &'static str, reason: String) -> Self {
        Self {
            value: None,
            is_bound: false,
            known: None,
            time_yr: None,
            method,
            notes: Vec::new(),
            is_undecided: false,
            reason: Some(reason),
            ends: None,
        }
    }

    fn span(method: &'static str, span_yr: f64, known: Option<Range>, time_yr: Option<f64>) -> Self {
        Self { value: Some(span_yr), known, time_yr, reason: None, ..Self::none(method, String::new()) }
    }
}

/// Judges a statement on a history.
#[must_use]
pub fn judge(statement: &Statement, history: &History) -> Judgement {
    let finding = match body_of(statement, history) {
        Ok(body) => find(statement, history, body),
        Err(reason) => Finding::none(any_method(&statement.quantity), reason),
    };
    let verdict = verdict_on(statement, &finding);
    let stated = stated_value(statement, &finding);
    let factor = finding.value.zip(stated).and_then(|(value, stated)| {
        let is_ratio = stated != 0.0 && value / stated > 0.0 && !super::phrases::is_logarithmic(&statement.quantity);
        is_ratio.then(|| value / stated).filter(|factor| factor.is_finite())
    });
    let difference = finding.value.zip(stated).map(|(value, stated)| value - stated);
    let sentence = sentence::sentence(statement, history, &finding, verdict, factor, difference);
    Judgement {
        verdict,
        value: finding.value,
        is_bound: finding.is_bound,
        lowest: finding.known.and_then(|known| known.lowest),
        highest: finding.known.and_then(|known| known.highest),
        time_yr: finding.time_yr,
        factor,
        difference,
        sentence,
        method: finding.method,
        notes: finding.notes,
    }
}

impl Judgement {
    /// The model's value with its unit, for people; none where there is none.
    #[must_use]
    pub fn value_text(&self, statement: &Statement) -> Option<String> {
        self.value.map(|value| sentence::model_value(&statement.quantity, value, self.is_bound))
    }

    /// The spread of the value in words; none where none is published.
    #[must_use]
    pub fn spread_text(&self, statement: &Statement) -> Option<String> {
        let known = Range { lowest: self.lowest, highest: self.highest };
        sentence::range_words(&statement.quantity, self.value?, self.is_bound, Some(known))
    }

    /// How the value is made.
    #[must_use]
    pub fn method(&self) -> Option<&'static Method> {
        method(self.method)
    }
}

fn verdict_on(statement: &Statement, finding: &Finding) -> Verdict {
    match (statement.relation, finding.value, &finding.reason) {
        // An event that does not take place has no date: that is an answer.
        (Relation::Happens, None, Some(_)) if is_of_an_event(finding) => event_verdict(finding, Verdict::DoesNotHold),
        (Relation::NeverHappens, None, Some(_)) if is_of_an_event(finding) => event_verdict(finding, Verdict::Holds),
        (Relation::Happens, Some(_), _) => event_verdict(finding, Verdict::Holds),
        (Relation::NeverHappens, Some(_), _) => event_verdict(finding, Verdict::DoesNotHold),
        (_, None, _) => Verdict::NotJudged,
        (relation, Some(value), _) => verdict(value, finding.known, relation, &statement.quantity),
    }
}

/// An event whose latest date is open may never happen.
fn event_verdict(finding: &Finding, sure: Verdict) -> Verdict {
    let may_never = finding.known.is_some_and(|known| known.highest.is_none());
    if may_never || finding.is_undecided { Verdict::WithinSpread } else { sure }
}

/// A finding without a value that comes from looking for an event of a body that is there.
fn is_of_an_event(finding: &Finding) -> bool {
    finding.reason.as_deref() == Some(NEVER)
}

/// Why an event has no date.
pub(super) const NEVER: &str = "it never takes place";

/// The value that the model's is held against: the stated one, or the edge that is nearest to it.
fn stated_value(statement: &Statement, finding: &Finding) -> Option<f64> {
    match statement.relation {
        Relation::About(value, _) | Relation::AtLeast(value) | Relation::AtMost(value) => Some(value),
        Relation::Between(low, high) => {
            let value = finding.value?;
            if value < low { Some(low) } else { (value > high).then_some(high) }
        }
        Relation::Happens | Relation::NeverHappens => None,
    }
}

fn body_of(statement: &Statement, history: &History) -> Result<Body, String> {
    let Subject::Planet(name) = &statement.subject else { return Ok(Body::Star) };
    let planets = &history.system().planets;
    let known = planet_named(history.system(), name);
    let index = known.and_then(|known| planets.iter().position(|planet| planet.name == known));
    index.map(Body::Planet).ok_or_else(|| {
        let names: Vec<&str> = planets.iter().map(|planet| planet.name.as_str()).collect();
        let likely = likest(name, &names).map_or_else(String::new, |likely| format!("; did you mean {likely}?"));
        format!("there is no planet named \"{name}\" here{likely}")
    })
}

fn find(statement: &Statement, history: &History, body: Body) -> Finding {
    match &statement.quantity {
        Quantity::Figure(key) => figure_finding(statement, key, history, body),
        Quantity::Highest(key) => extreme_finding(statement, key, history, body, true),
        Quantity::Lowest(key) => extreme_finding(statement, key, history, body, false),
        Quantity::Date(name) => date_finding(name, history, body),
        Quantity::Lifetime => match lifetime_yr(history) {
            Some(span_yr) => {
                let known = range_of_span(history, span_yr);
                with_dates_remark(Finding::span(life_method(history), span_yr, Some(known), Some(span_yr)), history)
            }
            None => Finding::none("star_life", "the star shines on beyond all that is computed".to_owned()),
        },
        Quantity::Duration(phase) => {
            let Some((from_yr, span_yr)) = duration(history, *phase) else {
                let is_ever = history.spans().iter().any(|span| span.phase == *phase);
                let reason = if is_ever { "the star stays in it for good" } else { "the star is never in this phase" };
                return Finding::none("star_life", reason.to_owned());
            };
            let known = range_of_span(history, span_yr);
            with_dates_remark(Finding::span(life_method(history), span_yr, Some(known), Some(from_yr)), history)
        }
        Quantity::MildTime | Quantity::LongestMildTime | Quantity::HabitableZoneTime => {
            span_finding(statement, history, body)
        }
    }
}

fn span_finding(statement: &Statement, history: &History, body: Body) -> Finding {
    let method = any_method(&statement.quantity);
    let Body::Planet(index) = body else { return Finding::none(method, "a star has no such span".to_owned()) };
    let during = match &statement.when {
        When::Life(during) => during.as_ref(),
        _ => None,
    };
    let (from_yr, to_yr) = match ends(during, history) {
        Ok(ends) => ends,
        Err(reason) => return Finding::none(method, reason),
    };
    let length = match statement.quantity {
        Quantity::MildTime => mild(history, index, from_yr, to_yr, true),
        Quantity::LongestMildTime => mild(history, index, from_yr, to_yr, false),
        _ => zone_time(history, index, from_yr, to_yr),
    };
    let has_climate = history.planets().get(index).is_some_and(|past| past.specification().water.is_some());
    let mut finding = Finding::span(method, length.span_yr, length.known, length.from_yr);
    if !has_climate && method == "climate" {
        finding.method = "surface_temperature";
        finding.notes.push("its greenhouse effect is held fixed; it knows nothing of ice or boiling seas".to_owned());
    }
    finding
}

/// The ends of a stretch of time, yr: the whole of what is shown where nothing is said.
fn ends(during: Option<&During>, history: &History) -> Result<(f64, f64), String> {
    let Some(During { from, to }) = during else { return Ok((0.0, history.shown_until_yr())) };
    let (from_yr, to_yr) = (time_of(from, history)?, time_of(to, history)?);
    if from_yr > to_yr { Err("the stretch of time ends before it starts".to_owned()) } else { Ok((from_yr, to_yr)) }
}

fn time_of(moment: &MomentRequest, history: &History) -> Result<f64, String> {
    let present_age_yr = history.system().star.present_age_yr;
    moment.time_yr(history, Some(present_age_yr)).map_err(|problem| problem.to_string())
}

fn figure_finding(statement: &Statement, key: FigureKey, history: &History, body: Body) -> Finding {
    let reader = Reader::new(history, body);
    let during = match &statement.when {
        When::At(moment) => {
            return match time_of(moment, history) {
                Err(reason) => Finding::none(any_method(&statement.quantity), reason),
                Ok(time_yr) => reader.at(key, time_yr).map_or_else(
                    || {
                        let method = method_at(&reader, key, time_yr);
                        Finding { time_yr: Some(time_yr), ..Finding::none(method, reader.why_none(time_yr)) }
                    },
                    |reading| finding_of(&reader, key, Timed { time_yr, reading }),
                ),
            };
        }
        When::Ever(during) | When::Always(during) | When::Life(during) => during.as_ref(),
    };
    let (from_yr, to_yr) = match ends(during, history) {
        Ok(ends) => ends,
        Err(reason) => return Finding::none(any_method(&statement.quantity), reason),
    };
    let scan = Scan::new(&reader, key, from_yr, to_yr);
    let is_always = matches!(statement.when, When::Always(_));
    let target = allowed(statement.relation, &statement.quantity);
    let (low, high) = (target.lowest.unwrap_or(f64::MIN), target.highest.unwrap_or(f64::MAX));
    let deciding = match (statement.relation, is_always) {
        (Relation::AtLeast(_), false) | (Relation::AtMost(_), true) => scan.highest(&reader, key),
        (Relation::AtMost(_), false) | (Relation::AtLeast(_), true) => scan.lowest(&reader, key),
        (_, false) => scan.nearest(&reader, key, low, high),
        (_, true) => scan.farthest(&reader, key, low, high),
    };
    scanned(&reader, key, &scan, deciding, from_yr)
}

fn extreme_finding(statement: &Statement, key: FigureKey, history: &History, body: Body, is_highest: bool) -> Finding {
    let reader = Reader::new(history, body);
    let during = match &statement.when {
        When::Life(during) | When::Ever(during) | When::Always(during) => during.as_ref(),
        When::At(_) => None,
    };
    let (from_yr, to_yr) = match ends(during, history) {
        Ok(ends) => ends,
        Err(reason) => return Finding::none(any_method(&statement.quantity), reason),
    };
    let scan = Scan::new(&reader, key, from_yr, to_yr);
    let deciding = if is_highest { scan.highest(&reader, key) } else { scan.lowest(&reader, key) };
    scanned(&reader, key, &scan, deciding, from_yr)
}

fn scanned(reader: &Reader<'_>, key: FigureKey, scan: &Scan, deciding: Option<Timed>, from_yr: f64) -> Finding {
    let Some(deciding) = deciding else {
        return Finding::none(method_at(reader, key, from_yr), reader.why_none(from_yr));
    };
    let mut finding = finding_of(reader, key, deciding);
    let value = |timed: Timed| timed.reading.value;
    finding.ends = scan.lowest(reader, key).map(value).zip(scan.highest(reader, key).map(value));
    if scan.has_gaps {
        finding.notes.push("at some of these times there is no such figure".to_owned());
    }
    finding
}

fn finding_of(reader: &Reader<'_>, key: FigureKey, timed: Timed) -> Finding {
    let Timed { time_yr, reading } = timed;
    let Reading { value, is_bound } = reading;
    let moment = reader.history.moment(time_yr);
    let is_meant = |about: &str| about == key || (about == "habitable_zone_au" && key.starts_with("habitable_zone_"));
    let notes = moment.notes.iter().filter(|note| note.body == reader.body && is_meant(note.about));
    Finding {
        value: Some(value),
        is_bound,
        known: range_of(reader, key, time_yr, reading),
        time_yr: Some(time_yr),
        method: method_at(reader, key, time_yr),
        notes: notes.map(|note| note.text.clone()).collect(),
        is_undecided: false,
        reason: None,
        ends: None,
    }
}

fn date_finding(name: &str, history: &History, body: Body) -> Finding {
    let events = history.events().iter().filter(|event| event.body == body);
    let matching: Vec<&Event> = events.filter(|event| is_kind_named(event.kind, name)).collect();
    let Some(first) = matching.first() else { return no_event(name, history, body) };
    let known = range_of_date(history, first);
    let mut finding = Finding::span(first.kind.method(), first.time_yr, Some(known), Some(first.time_yr));
    if matching.len() > 1 {
        finding.notes.push(format!("it takes place {} times; the first time is meant", matching.len()));
    }
    match first.caution {
        Some(Caution::Undecided) => {
            finding.is_undecided = true;
            finding.notes.push("it is undecided: the tides could let it end otherwise".to_owned());
        }
        Some(Caution::OrderOfMagnitude) => finding.notes.push("its date is known to an order of magnitude".to_owned()),
        _ => {}
    }
    with_dates_remark(finding, history)
}

/// An event that does not take place, or that nobody knows by this name.
fn no_event(name: &str, history: &History, body: Body) -> Finding {
    let kinds = EventKind::all_of(body);
    let Some(kind) = kinds.iter().find(|kind| is_kind_named(**kind, name)) else {
        let is_colour =
            name.to_lowercase().starts_with("light turns ") || name.eq_ignore_ascii_case("no visible glow any more");
        if body == Body::Star && is_colour {
            return Finding::none("blackbody", NEVER.to_owned());
        }
        let names: Vec<String> = kinds.iter().map(|kind| kind.name().into_owned()).collect();
        let names: Vec<&str> = names.iter().map(String::as_str).collect();
        let likely = likest(name, &names).map_or_else(String::new, |likely| format!("; did you mean \"{likely}\"?"));
        let reason =
            format!("no event of this body is called \"{name}\", name one of these: {}{likely}", names.join(", "));
        return Finding::none("star_life", reason);
    };
    let mut finding = Finding::none(kind.method(), NEVER.to_owned());
    let is_end = matches!(kind, EventKind::Planet(PlanetEventKind::Engulfed | PlanetEventKind::TornApart));
    if let Body::Planet(index) = body
        && is_end
        && history.planets().get(index).and_then(|past| past.history().orbit_caution()) == Some(Caution::Undecided)
    {
        finding.is_undecided = true;
        finding
            .notes
            .push("its fate is undecided: forms of the tide disagree or the giant misses it by under 15 %".to_owned());
    }
    finding
}

fn with_dates_remark(mut finding: Finding, history: &History) -> Finding {
    finding.notes.extend(history.dates_remark().map(|remark| remark.trim_end_matches('.').to_owned()));
    finding
}

fn life_method(history: &History) -> &'static str {
    let is_red_dwarf = WholeLife::needs_structure(history.system().star.mass_msun);
    if is_red_dwarf { "red_dwarf" } else { "star_life" }
}

/// The method of a quantity where there is no moment to ask at.
fn any_method(quantity: &Quantity) -> &'static str {
    match quantity {
        Quantity::Figure(key) | Quantity::Highest(key) | Quantity::Lowest(key) => {
            figure(key).map_or("star_life", |figure| figure.method)
        }
        Quantity::Date(_) | Quantity::Lifetime | Quantity::Duration(_) => "star_life",
        Quantity::MildTime | Quantity::LongestMildTime => "climate",
        Quantity::HabitableZoneTime => "habitable_zone",
    }
}

/// The method of a figure at an age: the life of a star is told by several.
fn method_at(reader: &Reader<'_>, key: FigureKey, age_yr: f64) -> &'static str {
    let of_the_figure = figure(key).map_or("star_life", |figure| figure.method);
    match of_the_figure {
        "star_life" | "effective_temperature" => {
            let star = reader.star(age_yr);
            if star.phase.is_white_dwarf() {
                "white_dwarf"
            } else if star.interior.is_some() {
                "red_dwarf"
            } else {
                of_the_figure
            }
        }
        "surface_temperature" => match reader.planet(age_yr) {
            Some(planet) if planet.surface_temperature_k.is_none() && planet.surface_hotter_than_k.is_some() => "steam",
            Some(planet) if planet.ice_fraction.is_some() => "climate",
            _ => of_the_figure,
        },
        other => other,
    }
}
