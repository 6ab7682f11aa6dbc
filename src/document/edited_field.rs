//! Which field an edit changes, and the words undo says about it.

use super::scenario::Scenario;
use crate::system::limits;
use crate::system::specification::Body;

/// One input of a scenario.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub struct EditedField {
    /// The body it belongs to; none for the words of the scenario itself.
    pub body: Option<Body>,
    /// Its key in files, such as `bond_albedo` or `title`.
    pub key: &'static str,
}

impl EditedField {
    /// A field of the star or of a planet.
    #[must_use]
    pub fn of(body: Body, key: &'static str) -> Self {
        Self { body: Some(body), key }
    }

    /// The title or the description of the scenario.
    #[must_use]
    pub fn of_scenario(key: &'static str) -> Self {
        Self { body: None, key }
    }

    /// The name of the field for people: `Bond albedo`.
    #[must_use]
    pub fn name(self) -> &'static str {
        let limit = limits::ALL.iter().find(|limit| limit.key == self.key);
        match self.key {
            "name" => "Name",
            "title" => "Title",
            "about" => "Description",
            "red_dwarf_surface" => "Red-dwarf surface",
            "redistribution" => "Heat redistribution",
            "greenhouse" => "Greenhouse",
            "air" => "Air",
            "climate" => "Climate",
            "carbon_dioxide" => "Carbon dioxide",
            "starts_frozen" => "Start",
            "tides" => "Tides",
            key => limit.map_or(key, |limit| limit.name),
        }
    }

    /// What an edit of it is called: `Change Bond albedo of Ember`.
    ///
    /// Taken before the edit, so that a new name is told under the old one.
    #[must_use]
    pub fn change_label(self, scenario: &Scenario) -> String {
        let name = self.name();
        match self.body {
            None => format!("Change {name}"),
            Some(body) => format!("Change {name} of {}", body_name(scenario, body)),
        }
    }
}

/// A body as labels call it: its name, or its place if it has none.
#[must_use]
pub fn body_name(scenario: &Scenario, body: Body) -> String {
    let (name, place) = match body {
        Body::Star => (Some(&scenario.system.star.name), "the star".to_owned()),
        Body::Planet(index) => {
            (scenario.system.planets.get(index).map(|planet| &planet.name), format!("planet {}", index + 1))
        }
    };
    name.filter(|name| !name.trim().is_empty()).cloned().unwrap_or(place)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn labels_name_field_and_body() {
        let mut scenario = Scenario::new_untitled();
        scenario.system.planets[0].name = "Ember".to_owned();
        let label = |field: EditedField| field.change_label(&scenario);
        assert_eq!(label(EditedField::of(Body::Planet(0), "bond_albedo")), "Change Bond albedo of Ember");
        assert_eq!(label(EditedField::of(Body::Star, "mass_msun")), "Change Mass of Star");
        assert_eq!(label(EditedField::of(Body::Planet(4), "name")), "Change Name of planet 5");
        assert_eq!(label(EditedField::of_scenario("about")), "Change Description");
    }

    #[test]
    fn every_input_has_a_name_for_people() {
        for limit in limits::ALL {
            assert_eq!(EditedField::of(Body::Star, limit.key).name(), limit.name);
        }
    }
}
