//! The scenarios that come with the program. All systems in them are invented.

use super::problem::Problem;
use super::scenario::Scenario;
use super::scenario_form::parse_scenario;

/// A scenario that is part of the program.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct BuiltIn {
    /// Its name on the command line, without `.ron`.
    pub name: &'static str,
    /// Its text as a scenario file.
    pub text: &'static str,
}

macro_rules! built_in {
    ($name:literal) => {
        BuiltIn { name: $name, text: include_str!(concat!("../../scenarios/", $name, ".ron")) }
    };
}

static ALL: &[BuiltIn] = &[
    built_in!("sunlike_five_worlds"),
    built_in!("red_dwarf_trillions_of_years"),
    built_in!("tenth_of_a_sun_close_worlds"),
    built_in!("late_spring_of_outer_worlds"),
    built_in!("red_dwarf_that_becomes_a_giant"),
    built_in!("half_solar_mass_slow_star"),
    built_in!("metal_poor_elder"),
    built_in!("frozen_worlds_and_the_giant"),
    built_in!("eccentric_orbit"),
    built_in!("f_star_in_a_hurry"),
    built_in!("two_solar_masses_survivors"),
    built_in!("five_solar_masses_blue_loop"),
    built_in!("twelve_solar_masses_supernova"),
];

/// Every built-in scenario; the demo comes first.
#[must_use]
pub fn all() -> &'static [BuiltIn] {
    ALL
}

/// The built-in scenario of a name.
#[must_use]
pub fn find(name: &str) -> Option<&'static BuiltIn> {
    ALL.iter().find(|built_in| built_in.name == name)
}

/// The scenario shown when none is asked for.
#[must_use]
pub fn demo() -> &'static BuiltIn {
    &ALL[0]
}

impl BuiltIn {
    /// The scenario itself.
    ///
    /// # Errors
    /// Every problem of the text. The project's tests hold that there is none.
    pub fn scenario(&self) -> Result<Scenario, Vec<Problem>> {
        parse_scenario(self.text, self.name)
    }
}
