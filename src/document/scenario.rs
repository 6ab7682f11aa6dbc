//! A scenario: what is saved, undone and handed on.

use super::problem::{Fault, Problem, Subject};
use crate::system::cues::{Cue, LONGEST_SHOW_S, MOST_CUES};
use crate::system::specification::{Body, PlanetSpecification, StarSpecification, System};
use crate::system::statements::{MOST_STATEMENTS, Statement};

/// Longest title, in characters.
pub const LONGEST_TITLE: usize = 120;
/// Longest description, in characters.
pub const LONGEST_ABOUT: usize = 4000;
/// Longest note of a statement or a cue, in characters.
pub const LONGEST_NOTE: usize = 1000;

/// A system with the words that go with it.
#[derive(Clone, Debug, PartialEq)]
pub struct Scenario {
    /// One line that says the subject.
    pub title: String,
    /// What to look for; may be empty, may hold several paragraphs.
    pub about: String,
    /// The star and its planets.
    pub system: System,
    /// Claims about the system that are to be checked, in the order of the rows.
    pub statements: Vec<Statement>,
    /// The cues of a show, in the order of the rows.
    pub cues: Vec<Cue>,
}

impl Scenario {
    /// A star like the Sun with one planet like the Earth, to start from.
    #[must_use]
    pub fn new_untitled() -> Self {
        Self {
            title: "Untitled".to_owned(),
            about: String::new(),
            system: System { star: StarSpecification::default(), planets: vec![PlanetSpecification::default()] },
            statements: Vec::new(),
            cues: Vec::new(),
        }
    }

    /// Everything that is wrong, without places; empty for a scenario that can be computed and saved.
    #[must_use]
    pub fn problems(&self) -> Vec<Problem> {
        let texts = [("title", title_fault(&self.title)), ("about", about_fault(&self.about))];
        let texts = texts.into_iter().filter_map(|(key, fault)| {
            fault.map(|fault| Problem { subject: Subject::Whole, key: Some(key), fault, place: None })
        });
        let inputs = self.system.problems().into_iter().map(|problem| {
            // The list of planets belongs to no body.
            let subject = if problem.key == "planets" { Subject::Whole } else { self.subject(problem.body) };
            Problem { subject, key: Some(problem.key), fault: problem.fault.into(), place: None }
        });
        texts.chain(inputs).chain(self.statement_problems()).chain(self.cue_problems()).collect()
    }

    fn statement_problems(&self) -> impl Iterator<Item = Problem> + '_ {
        let rows = self.statements.iter().enumerate().filter_map(|(index, statement)| {
            let fault = note_fault(&statement.note)?;
            Some(Problem { subject: Subject::Statement { index }, key: Some("note"), fault, place: None })
        });
        too_many("statements", self.statements.len(), MOST_STATEMENTS).into_iter().chain(rows)
    }

    fn cue_problems(&self) -> impl Iterator<Item = Problem> + '_ {
        let rows = self.cues.iter().enumerate().flat_map(|(index, cue)| {
            let is_in_show = (0.0..=LONGEST_SHOW_S).contains(&cue.show_time_s);
            let show_time = (!is_in_show).then(|| {
                let allowed = format!("0 to {LONGEST_SHOW_S} s");
                ("show_time_s", Fault::OutOfRange { key: "show_time_s", value: cue.show_time_s, allowed })
            });
            let faults = show_time.into_iter().chain(note_fault(&cue.note).map(|fault| ("note", fault)));
            let subject = Subject::Cue { index };
            faults.map(move |(key, fault)| Problem { subject: subject.clone(), key: Some(key), fault, place: None })
        });
        too_many("cues", self.cues.len(), MOST_CUES).into_iter().chain(rows)
    }

    /// Gives a planet another name, and everything that calls it by its name.
    pub fn rename_planet(&mut self, index: usize, name: &str) {
        let Some(planet) = self.system.planets.get_mut(index) else { return };
        let before = std::mem::replace(&mut planet.name, name.to_owned());
        for statement in &mut self.statements {
            statement.rename(&before, name);
        }
        for cue in &mut self.cues {
            if let Some(moment) = cue.moment.renamed(&before, name) {
                cue.moment = moment;
            }
        }
    }

    /// A body as problems name it.
    #[must_use]
    pub fn subject(&self, body: Body) -> Subject {
        match body {
            Body::Star => Subject::Star { name: self.system.star.name.clone() },
            Body::Planet(index) => {
                let name = self.system.planets.get(index).map_or_else(String::new, |planet| planet.name.clone());
                Subject::Planet { index, name }
            }
        }
    }
}

impl Default for Scenario {
    fn default() -> Self {
        Self::new_untitled()
    }
}

fn title_fault(title: &str) -> Option<Fault> {
    let length = title.chars().count();
    if title.trim().is_empty() {
        return Some(Fault::EmptyText { key: "title", most: LONGEST_TITLE });
    }
    let bad = length > LONGEST_TITLE || title.chars().any(char::is_control);
    bad.then_some(Fault::BadText { key: "title", length, most: LONGEST_TITLE })
}

fn too_many(key: &'static str, count: usize, most: usize) -> Option<Problem> {
    let fault = (count > most).then_some(Fault::TooMany { key, count, most })?;
    Some(Problem { subject: Subject::Whole, key: Some(key), fault, place: None })
}

fn note_fault(note: &str) -> Option<Fault> {
    let length = note.chars().count();
    let bad = length > LONGEST_NOTE || note.chars().any(char::is_control);
    bad.then_some(Fault::BadText { key: "note", length, most: LONGEST_NOTE })
}

fn about_fault(about: &str) -> Option<Fault> {
    let length = about.chars().count();
    let bad = length > LONGEST_ABOUT || about.chars().any(|character| character.is_control() && character != '\n');
    bad.then_some(Fault::BadText { key: "about", length, most: LONGEST_ABOUT })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_new_scenario_is_sound() {
        assert_eq!(Scenario::new_untitled().problems(), []);
    }

    #[test]
    fn problems_name_the_body() {
        let mut scenario = Scenario::new_untitled();
        scenario.title = " ".to_owned();
        scenario.about = "one\ntwo\u{7}".to_owned();
        scenario.system.planets[0].name = "Ember".to_owned();
        scenario.system.planets[0].bond_albedo = 1.4;
        let lines: Vec<_> = scenario.problems().iter().map(ToString::to_string).collect();
        assert_eq!(
            lines,
            [
                "title is empty, allowed 1 to 120 characters",
                "about is 8 characters long or holds control characters, allowed up to 4000 printable characters",
                "planet 1 \"Ember\": bond_albedo is 1.4, allowed 0 to 1",
            ]
        );
    }
}
