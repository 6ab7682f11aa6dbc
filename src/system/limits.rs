//! The permitted range of every input, declared once: files, fields and checks all read it here.

use crate::physics::star::{END_YR, MASS_RANGE_MSUN, METALLICITY_RANGE_DEX};
use crate::units::entry::EntryKind;
use crate::units::number_text::number;
use thiserror::Error;

/// An input quantity: its key in files, its name for people, its permitted range.
#[derive(Debug, PartialEq)]
pub struct Limit {
    /// Key with unit suffix, as scenario files and errors write it.
    pub key: &'static str,
    /// Name for people.
    pub name: &'static str,
    /// Smallest permitted value, in the unit of the key.
    pub lowest: f64,
    /// Largest permitted value, in the unit of the key.
    pub highest: f64,
    /// How the value is typed and which unit it is kept in.
    pub entry: EntryKind,
    /// One sentence that says what the quantity is.
    pub meaning: &'static str,
}

/// A value outside its permitted range.
#[derive(Clone, Debug, Error, PartialEq)]
#[error("{key} is {value}, allowed {allowed}")]
pub struct OutOfLimit {
    /// Key of the quantity.
    pub key: &'static str,
    /// The value as given.
    pub value: f64,
    /// The permitted range in words.
    pub allowed: String,
}

impl Limit {
    /// Passes a permitted value on.
    ///
    /// # Errors
    /// [`OutOfLimit`] when the value is outside the range or not a number.
    pub fn check(&self, value: f64) -> Result<f64, OutOfLimit> {
        if value >= self.lowest && value <= self.highest {
            return Ok(value);
        }
        Err(OutOfLimit { key: self.key, value, allowed: self.allowed() })
    }

    /// A value some steps of an arrow key further, within the range and with at most four digits.
    ///
    /// A step is a hundredth of the value; where the range holds zero, a five-hundredth of the range.
    #[must_use]
    pub fn nudged(&self, value: f64, steps: f64) -> f64 {
        let moved = if self.lowest > 0.0 {
            value * STEP_RATIO.powf(steps)
        } else {
            value + steps * (self.highest - self.lowest) / STEPS_OF_RANGE
        };
        // Ten digits below the largest the last one is noise of the arithmetic.
        let scale = moved.abs().max(1e-9 * (self.highest - self.lowest));
        let unit = 10_f64.powf(scale.log10().floor() - 3.0);
        ((moved / unit).round() * unit).clamp(self.lowest, self.highest)
    }

    /// The permitted range in words, with its unit: `0.35 to 100 M☉`.
    #[must_use]
    pub fn allowed(&self) -> String {
        let unit = self.entry.symbol();
        let gap = if unit.is_empty() { "" } else { " " };
        format!("{} to {}{gap}{unit}", bound(self.lowest), bound(self.highest))
    }
}

/// One step of a value that is never zero.
const STEP_RATIO: f64 = 1.01;
/// Steps from end to end of a range that holds zero.
const STEPS_OF_RANGE: f64 = 500.0;

/// A bound as a person would write it: no trailing zeros.
fn bound(value: f64) -> String {
    if value != 0.0 && !(1e-4..1e6).contains(&value.abs()) {
        number(value, 1)
    } else {
        format!("{value}").replace('-', "−")
    }
}

/// Mass of the star at birth.
pub const STAR_MASS: Limit = Limit {
    key: "mass_msun",
    name: "Mass",
    lowest: MASS_RANGE_MSUN.0,
    highest: MASS_RANGE_MSUN.1,
    entry: EntryKind::MassMsun,
    meaning: "Mass of the star when it reaches the main sequence.",
};
/// Metallicity of the star.
pub const METALLICITY: Limit = Limit {
    key: "metallicity_dex",
    name: "Metallicity",
    lowest: METALLICITY_RANGE_DEX.0,
    highest: METALLICITY_RANGE_DEX.1,
    entry: EntryKind::AbundanceDex,
    meaning: "Share of elements heavier than helium, as the logarithm of its ratio to the Sun's, [Fe/H].",
};
/// Present age of the star.
pub const PRESENT_AGE: Limit = Limit {
    key: "present_age_yr",
    name: "Present age",
    lowest: 0.0,
    highest: END_YR,
    entry: EntryKind::SpanYr,
    meaning: "Time since the star reached the main sequence, at the moment the scenario calls now.",
};
/// Semi-major axis of a planet's orbit.
pub const SEMI_MAJOR_AXIS: Limit = Limit {
    key: "semi_major_axis_au",
    name: "Semi-major axis",
    lowest: 1e-4,
    highest: 1e5,
    entry: EntryKind::DistanceAu,
    meaning: "Half the long axis of the orbit when the star reaches the main sequence.",
};
/// Eccentricity of a planet's orbit.
pub const ECCENTRICITY: Limit = Limit {
    key: "eccentricity",
    name: "Eccentricity",
    lowest: 0.0,
    highest: 0.99,
    entry: EntryKind::Plain,
    meaning: "How far the orbit is from a circle: 0 is a circle.",
};
/// Mass of a planet.
pub const PLANET_MASS: Limit = Limit {
    key: "mass_mearth",
    name: "Mass",
    lowest: 1e-6,
    highest: 4200.0,
    entry: EntryKind::MassMearth,
    meaning: "Mass of the planet; above about 4200 Earth masses a body burns deuterium and is no planet.",
};
/// Radius of a planet.
pub const PLANET_RADIUS: Limit = Limit {
    key: "radius_rearth",
    name: "Radius",
    lowest: 0.01,
    highest: 30.0,
    entry: EntryKind::RadiusRearth,
    meaning: "Radius of the planet.",
};
/// Bond albedo of a planet.
pub const BOND_ALBEDO: Limit = Limit {
    key: "bond_albedo",
    name: "Bond albedo",
    lowest: 0.0,
    highest: 1.0,
    entry: EntryKind::Plain,
    meaning: "Share of all starlight that the planet throws back.",
};
/// Infrared emissivity of a planet.
pub const EMISSIVITY: Limit = Limit {
    key: "emissivity",
    name: "Emissivity",
    lowest: 0.1,
    highest: 1.0,
    entry: EntryKind::Plain,
    meaning: "How well the planet radiates heat, against a perfect radiator.",
};
/// Warming of a fixed-increment greenhouse.
pub const GREENHOUSE_INCREMENT: Limit = Limit {
    key: "increment_k",
    name: "Increment",
    lowest: -300.0,
    highest: 2000.0,
    entry: EntryKind::TemperatureDifferenceK,
    meaning: "Surface minus equilibrium temperature, held fixed.",
};
/// Infrared optical depth of a grey greenhouse.
pub const OPTICAL_DEPTH: Limit = Limit {
    key: "optical_depth",
    name: "Optical depth",
    lowest: 0.0,
    highest: 1e6,
    entry: EntryKind::Plain,
    meaning: "Infrared optical depth of the air, held fixed.",
};

/// Pressure of a planet's air.
pub const SURFACE_PRESSURE: Limit = Limit {
    key: "surface_pressure_bar",
    name: "Pressure",
    lowest: 1e-6,
    highest: 1000.0,
    entry: EntryKind::PressureBar,
    meaning: "Pressure of the air at the ground, held fixed; it makes the sky.",
};

/// Mean temperature that rocks and volcanoes hold.
pub const REGULATED_MEAN: Limit = Limit {
    key: "mean_k",
    name: "Held mean",
    lowest: 275.0,
    highest: 310.0,
    entry: EntryKind::TemperatureK,
    meaning: "Mean surface temperature that weathering and volcanoes hold by adjusting carbon dioxide, as long as they can.",
};
/// Partial pressure of carbon dioxide.
pub const CARBON_DIOXIDE: Limit = Limit {
    key: "carbon_dioxide_bar",
    name: "CO₂",
    lowest: 1e-4,
    highest: 3.0,
    entry: EntryKind::PressureBar,
    meaning: "Partial pressure of carbon dioxide, held fixed; 0.00028 bar on the Earth before industry.",
};
/// Water of a planet.
pub const WATER: Limit = Limit {
    key: "water_oceans",
    name: "Water, oceans",
    lowest: 1e-3,
    highest: 1000.0,
    entry: EntryKind::Plain,
    meaning: "Water at the start, in oceans of the Earth (1.4 × 10²¹ kg).",
};
/// Tilt of a planet's axis.
pub const OBLIQUITY: Limit = Limit {
    key: "obliquity_deg",
    name: "Axial tilt",
    lowest: 0.0,
    highest: 90.0,
    entry: EntryKind::AngleDeg,
    meaning: "Tilt of the axis against the orbit.",
};
/// Heat transport between latitudes.
pub const HEAT_TRANSPORT: Limit = Limit {
    key: "heat_transport_w_m2_k",
    name: "Heat transport",
    lowest: 0.3,
    highest: 3.0,
    entry: EntryKind::Plain,
    meaning: "Heat that air and sea carry between latitudes, W m⁻² K⁻¹; 0.565 on the Earth, more under denser air or a longer day.",
};
/// Age at which a planet has its ocean.
pub const OCEAN_AFTER: Limit = Limit {
    key: "ocean_after_yr",
    name: "Ocean after",
    lowest: 0.0,
    highest: 1e12,
    entry: EntryKind::SpanYr,
    meaning: "Age of the star when the planet has its ocean; climate and loss of water begin then.",
};
/// Length of a planet's first day.
pub const INITIAL_DAY: Limit = Limit {
    key: "initial_day_h",
    name: "First day",
    lowest: 1.0,
    highest: 1e5,
    entry: EntryKind::DayH,
    meaning: "Length of the day when the star reaches the main sequence, from which tides slow the turning.",
};
/// A surface temperature whose first and last moment are dated.
pub const MARKED_TEMPERATURE: Limit = Limit {
    key: "marked_temperature_k",
    name: "Marked temp.",
    lowest: 3.0,
    highest: 10_000.0,
    entry: EntryKind::TemperatureK,
    meaning: "Mean surface temperature whose first and last moment the chronicle dates.",
};

/// Every limit, for tables in documents and tests.
pub const ALL: [&Limit; 20] = [
    &STAR_MASS,
    &METALLICITY,
    &PRESENT_AGE,
    &SEMI_MAJOR_AXIS,
    &ECCENTRICITY,
    &PLANET_MASS,
    &PLANET_RADIUS,
    &BOND_ALBEDO,
    &EMISSIVITY,
    &GREENHOUSE_INCREMENT,
    &OPTICAL_DEPTH,
    &SURFACE_PRESSURE,
    &REGULATED_MEAN,
    &CARBON_DIOXIDE,
    &WATER,
    &OBLIQUITY,
    &HEAT_TRANSPORT,
    &OCEAN_AFTER,
    &INITIAL_DAY,
    &MARKED_TEMPERATURE,
];

/// Most planets a system may hold.
pub const MOST_PLANETS: usize = 24;
/// Longest name, in characters.
pub const LONGEST_NAME: usize = 60;

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_range_reads_like_a_sentence() {
        assert_eq!(METALLICITY.allowed(), "−2 to 0.2 dex");
        assert_eq!(BOND_ALBEDO.allowed(), "0 to 1");
        assert_eq!(PRESENT_AGE.allowed(), "0 to 1 × 10¹⁴ yr");
        let error = BOND_ALBEDO.check(1.4).expect_err("more than all light");
        assert_eq!(error.to_string(), "bond_albedo is 1.4, allowed 0 to 1");
    }

    #[test]
    fn nothing_that_is_not_a_number_passes() {
        for limit in ALL {
            assert!(limit.check(f64::NAN).is_err(), "{}", limit.key);
            assert!(limit.lowest < limit.highest);
            assert_eq!(limit.check(limit.lowest), Ok(limit.lowest));
        }
    }

    #[test]
    fn steps_stay_in_the_range_and_come_back() {
        for limit in ALL {
            for start in [limit.lowest, 0.5 * (limit.lowest + limit.highest), limit.highest] {
                for steps in [-1.0, -0.1, 0.1, 1.0, 25.0] {
                    let moved = limit.nudged(start, steps);
                    assert!(limit.check(moved).is_ok(), "{}: {start} by {steps} gives {moved}", limit.key);
                    assert!(
                        (moved - start) * steps >= 0.0 || (moved - start).abs() < 1e-3 * start.abs(),
                        "{}",
                        limit.key
                    );
                }
            }
        }
        assert_eq!(STAR_MASS.nudged(1.0, 1.0), 1.01);
        assert!((STAR_MASS.nudged(1.01, -1.0) - 1.0).abs() < 1e-12);
    }
}
