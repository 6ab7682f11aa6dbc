//! What people type into a field: a number, perhaps with a unit or a word.

use super::constants::{
    AU_M, EARTH_MASS_KG, EARTH_MASSES_PER_SOLAR_MASS, EARTH_RADIUS_M, JUPITER_MASS_KG, JUPITER_RADIUS_M, LIGHT_YEAR_M,
    SOLAR_LUMINOSITY_W, SOLAR_MASS_KG, SOLAR_RADIUS_M,
};
use super::number_text::{machine, parse_number};
use super::time_words::parse_span;
use thiserror::Error;

/// Zero degrees Celsius, K. Exact by definition (SI brochure).
const CELSIUS_ZERO_K: f64 = 273.15;

/// What a field holds, which decides the units it understands and the unit it is kept in.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum EntryKind {
    /// A stellar mass, kept in solar masses.
    MassMsun,
    /// A planet's mass, kept in Earth masses.
    MassMearth,
    /// A distance, kept in au.
    DistanceAu,
    /// A planet's radius, kept in Earth radii.
    RadiusRearth,
    /// A difference of temperature, kept in kelvin.
    TemperatureDifferenceK,
    /// A temperature, kept in kelvin; degrees Celsius are understood.
    TemperatureK,
    /// A span of time, kept in years.
    SpanYr,
    /// The length of a day, kept in hours.
    DayH,
    /// A pressure, kept in bar.
    PressureBar,
    /// An angle, kept in degrees.
    AngleDeg,
    /// A logarithmic abundance, kept in dex.
    AbundanceDex,
    /// A luminosity, kept in solar luminosities.
    LuminosityLsun,
    /// A star's radius, kept in solar radii.
    RadiusRsun,
    /// A loss of mass, kept in solar masses per year.
    MassLossMsunYr,
    /// A density, kept in grams per cubic centimetre.
    DensityGCm3,
    /// A wavelength, kept in nanometres.
    WavelengthNm,
    /// A frequency, kept in terahertz.
    FrequencyThz,
    /// Starlight received, kept in units of the Earth's.
    InsolationEarth,
    /// A flux of energy, kept in watts per square metre.
    IrradianceWM2,
    /// A flux of photons, kept in micromoles per square metre and second.
    PhotonFluxUmolM2S,
    /// An illuminance, kept in lux.
    IlluminanceLx,
    /// A luminance, kept in candelas per square metre.
    LuminanceCdM2,
    /// A luminous flux, kept in lumens.
    LuminousFluxLm,
    /// A luminous efficacy, kept in lumens per watt.
    EfficacyLmW,
    /// An acceleration, kept in metres per second squared.
    AccelerationMS2,
    /// A speed, kept in kilometres per second.
    SpeedKmS,
    /// A magnitude.
    Magnitude,
    /// Water, kept in oceans of the Earth.
    WaterOceans,
    /// A plain number; a per cent sign is understood.
    Plain,
}

impl EntryKind {
    /// The symbol of the unit the value is kept in; empty for a plain number.
    #[must_use]
    pub fn symbol(self) -> &'static str {
        match self {
            Self::MassMsun => "M☉",
            Self::MassMearth => "M⊕",
            Self::DistanceAu => "au",
            Self::RadiusRearth => "R⊕",
            Self::TemperatureDifferenceK | Self::TemperatureK => "K",
            Self::SpanYr => "yr",
            Self::DayH => "h",
            Self::PressureBar => "bar",
            Self::AngleDeg => "°",
            Self::AbundanceDex => "dex",
            Self::LuminosityLsun => "L☉",
            Self::RadiusRsun => "R☉",
            Self::MassLossMsunYr => "M☉/yr",
            Self::DensityGCm3 => "g/cm³",
            Self::WavelengthNm => "nm",
            Self::FrequencyThz => "THz",
            Self::InsolationEarth => "S⊕",
            Self::IrradianceWM2 => "W/m²",
            Self::PhotonFluxUmolM2S => "µmol/m²/s",
            Self::IlluminanceLx => "lx",
            Self::LuminanceCdM2 => "cd/m²",
            Self::LuminousFluxLm => "lm",
            Self::EfficacyLmW => "lm/W",
            Self::AccelerationMS2 => "m/s²",
            Self::SpeedKmS => "km/s",
            Self::Magnitude => "mag",
            Self::WaterOceans => "oceans",
            Self::Plain => "",
        }
    }

    /// The unit the value is kept in as it is typed on any keyboard; empty for a plain number.
    #[must_use]
    pub fn typed_unit(self) -> &'static str {
        match self {
            Self::SpanYr => "yr",
            Self::TemperatureDifferenceK => "K",
            other => other.units().iter().find(|(_, factor)| *factor == 1.0).map_or("", |(unit, _)| unit),
        }
    }

    /// Unit spellings and what one of them is in the kept unit.
    fn units(self) -> &'static [(&'static str, f64)] {
        const MASS_MSUN: &[(&str, f64)] = &[
            ("Msun", 1.0),
            ("M☉", 1.0),
            ("M⊙", 1.0),
            ("solar masses", 1.0),
            ("kg", 1.0 / SOLAR_MASS_KG),
            ("Mjup", JUPITER_MASS_KG / SOLAR_MASS_KG),
        ];
        const MASS_MEARTH: &[(&str, f64)] = &[
            ("Mearth", 1.0),
            ("M⊕", 1.0),
            ("earth masses", 1.0),
            ("kg", 1.0 / EARTH_MASS_KG),
            ("Mjup", JUPITER_MASS_KG / EARTH_MASS_KG),
            ("MJ", JUPITER_MASS_KG / EARTH_MASS_KG),
            ("Msun", EARTH_MASSES_PER_SOLAR_MASS),
        ];
        const DISTANCE_AU: &[(&str, f64)] = &[
            ("au", 1.0),
            ("million km", 1e9 / AU_M),
            ("km", 1e3 / AU_M),
            ("Rsun", SOLAR_RADIUS_M / AU_M),
            ("R☉", SOLAR_RADIUS_M / AU_M),
            ("ly", LIGHT_YEAR_M / AU_M),
            ("m", 1.0 / AU_M),
        ];
        const RADIUS_REARTH: &[(&str, f64)] = &[
            ("Rearth", 1.0),
            ("R⊕", 1.0),
            ("earth radii", 1.0),
            ("km", 1e3 / EARTH_RADIUS_M),
            ("Rjup", JUPITER_RADIUS_M / EARTH_RADIUS_M),
            ("RJ", JUPITER_RADIUS_M / EARTH_RADIUS_M),
            ("m", 1.0 / EARTH_RADIUS_M),
        ];
        const PRESSURE_BAR: &[(&str, f64)] =
            &[("mbar", 1e-3), ("bar", 1.0), ("hPa", 1e-3), ("kPa", 1e-2), ("Pa", 1e-5), ("atm", 1.01325)];
        const LUMINOSITY_LSUN: &[(&str, f64)] =
            &[("Lsun", 1.0), ("L☉", 1.0), ("L⊙", 1.0), ("solar luminosities", 1.0), ("W", 1.0 / SOLAR_LUMINOSITY_W)];
        const RADIUS_RSUN: &[(&str, f64)] = &[
            ("Rsun", 1.0),
            ("R☉", 1.0),
            ("R⊙", 1.0),
            ("solar radii", 1.0),
            ("Rearth", EARTH_RADIUS_M / SOLAR_RADIUS_M),
            ("au", AU_M / SOLAR_RADIUS_M),
            ("million km", 1e9 / SOLAR_RADIUS_M),
            ("km", 1e3 / SOLAR_RADIUS_M),
        ];
        match self {
            Self::MassMsun => MASS_MSUN,
            Self::MassMearth => MASS_MEARTH,
            Self::DistanceAu => DISTANCE_AU,
            Self::RadiusRearth => RADIUS_REARTH,
            Self::TemperatureDifferenceK => &[("°C", 1.0), ("K", 1.0), ("C", 1.0)],
            Self::TemperatureK => &[("K", 1.0)],
            Self::SpanYr => &[],
            Self::DayH => &[("hours", 1.0), ("days", 24.0), ("h", 1.0), ("d", 24.0)],
            Self::PressureBar => PRESSURE_BAR,
            Self::AngleDeg => &[("degrees", 1.0), ("deg", 1.0), ("°", 1.0)],
            Self::AbundanceDex => &[("dex", 1.0)],
            Self::LuminosityLsun => LUMINOSITY_LSUN,
            Self::RadiusRsun => RADIUS_RSUN,
            Self::MassLossMsunYr => &[("Msun/yr", 1.0), ("M☉/yr", 1.0), ("solar masses per year", 1.0)],
            Self::DensityGCm3 => &[("g/cm3", 1.0), ("g/cm³", 1.0), ("kg/m3", 1e-3), ("kg/m³", 1e-3)],
            Self::WavelengthNm => &[("nm", 1.0), ("µm", 1e3), ("um", 1e3), ("micrometres", 1e3)],
            Self::FrequencyThz => &[("THz", 1.0), ("GHz", 1e-3)],
            Self::InsolationEarth => &[("Searth", 1.0), ("S⊕", 1.0), ("times the Earth's", 1.0), ("x", 1.0)],
            Self::IrradianceWM2 => &[("W/m2", 1.0), ("W/m²", 1.0), ("W m-2", 1.0), ("W m⁻²", 1.0)],
            Self::PhotonFluxUmolM2S => &[("umol/m2/s", 1.0), ("µmol/m²/s", 1.0)],
            Self::IlluminanceLx => &[("klx", 1e3), ("lx", 1.0), ("lux", 1.0)],
            Self::LuminanceCdM2 => &[("cd/m2", 1.0), ("cd/m²", 1.0)],
            Self::LuminousFluxLm => &[("lm", 1.0), ("lumens", 1.0)],
            Self::EfficacyLmW => &[("lm/W", 1.0)],
            Self::AccelerationMS2 => &[("m/s²", 1.0), ("m/s2", 1.0), ("cm/s2", 0.01)],
            Self::SpeedKmS => &[("km/s", 1.0), ("m/s", 1e-3)],
            Self::Magnitude => &[("mag", 1.0), ("magnitudes", 1.0)],
            Self::WaterOceans => &[("oceans", 1.0), ("ocean", 1.0)],
            Self::Plain => &[("%", 0.01)],
        }
    }
}

/// Why a typed text could not become a value.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
pub enum EntryProblem {
    /// Nothing was typed.
    #[error("type a number")]
    Empty,
    /// No number with a unit known here.
    #[error("\"{text}\" is not understood here; write a number{examples}")]
    NotUnderstood {
        /// The text as it was typed.
        text: String,
        /// The units that are understood, as a clause.
        examples: String,
    },
}

/// Reads a typed value in the unit its kind is kept in. A bare number is in that unit already.
///
/// # Errors
/// [`EntryProblem`] with the units that would be understood.
///
/// # Example
/// ```
/// use longember::units::entry::{parse_entry, EntryKind};
/// assert_eq!(parse_entry("0.12 Msun", EntryKind::MassMsun), Ok(0.12));
/// assert!((parse_entry("2.4e29 kg", EntryKind::MassMsun).unwrap() - 0.1207).abs() < 1e-4);
/// ```
pub fn parse_entry(text: &str, kind: EntryKind) -> Result<f64, EntryProblem> {
    let trimmed = text.trim();
    if trimmed.is_empty() {
        return Err(EntryProblem::Empty);
    }
    if kind == EntryKind::SpanYr {
        return parse_span(trimmed).map_err(|_| not_understood(trimmed, kind));
    }
    if let Some(value) = parse_number(trimmed) {
        return Ok(value);
    }
    if kind == EntryKind::TemperatureK {
        let celsius = ["°C", "C"].iter().find_map(|unit| trimmed.strip_suffix(unit));
        if let Some(value) = celsius.and_then(|number| parse_number(number.trim_end())) {
            // The sum of two decimals is a decimal again, without the noise of their binary forms.
            let kelvin = value + CELSIUS_ZERO_K;
            return Ok(format!("{kelvin:.9}").parse().unwrap_or(kelvin));
        }
    }
    for (unit, factor) in kind.units() {
        let cut = trimmed.len().saturating_sub(unit.len());
        if trimmed.is_char_boundary(cut)
            && trimmed[cut..].eq_ignore_ascii_case(unit)
            && let Some(value) =
                parse_number(&trimmed[..cut]).map(|value| value * factor).filter(|value| value.is_finite())
        {
            return Ok(value);
        }
    }
    Err(not_understood(trimmed, kind))
}

/// Writes a value as the shortest text that [`parse_entry`] reads back to the same value; spans of time get their unit.
///
/// # Example
/// ```
/// use longember::units::entry::{EntryKind, write_entry};
/// assert_eq!(write_entry(4.57e9, EntryKind::SpanYr), "4.57 Gyr");
/// assert_eq!(write_entry(0.12, EntryKind::MassMsun), "0.12");
/// ```
#[must_use]
pub fn write_entry(value: f64, kind: EntryKind) -> String {
    if kind == EntryKind::SpanYr {
        for (length_yr, unit) in [(1e12, "Tyr"), (1e9, "Gyr"), (1e6, "Myr"), (1e3, "kyr")] {
            // A quotient can carry rounding noise, so only a text that reads back exactly will do.
            let text = machine(value / length_yr).map(|number| format!("{number} {unit}"));
            if let Some(text) = text.filter(|text| value.abs() >= length_yr && parse_span(text) == Ok(value)) {
                return text;
            }
        }
        return machine(value).map_or_else(String::new, |number| format!("{number} yr"));
    }
    machine(value).unwrap_or_default()
}

fn not_understood(text: &str, kind: EntryKind) -> EntryProblem {
    let known: Vec<&str> = match kind {
        EntryKind::SpanYr => vec!["Gyr", "trillion years", "yr"],
        EntryKind::TemperatureK => vec!["K", "°C"],
        other => other.units().iter().map(|(unit, _)| *unit).take(4).collect(),
    };
    let examples = if known.is_empty() { String::new() } else { format!(", optionally with {}", known.join(", ")) };
    EntryProblem::NotUnderstood { text: text.chars().take(60).collect(), examples }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn units_convert_to_the_kept_one() {
        let close = |text: &str, kind, expected: f64| {
            let value = parse_entry(text, kind).expect(text);
            assert!((value / expected - 1.0).abs() < 1e-4, "{text}: {value}");
        };
        close("149597870.7 km", EntryKind::DistanceAu, 1.0);
        close("1 Mjup", EntryKind::MassMearth, 317.83);
        close("6378.1 km", EntryKind::RadiusRearth, 1.0);
        close("30 %", EntryKind::Plain, 0.3);
        close("400 mbar", EntryKind::PressureBar, 0.4);
        close("7.6 Gyr", EntryKind::SpanYr, 7.6e9);
        close("15 °C", EntryKind::TemperatureK, 288.15);
        close("-20C", EntryKind::TemperatureK, 253.15);
        close("288 K", EntryKind::TemperatureK, 288.0);
        close("3 days", EntryKind::DayH, 72.0);
        close("10 h", EntryKind::DayH, 10.0);
    }

    #[test]
    fn what_is_written_is_read_back_to_the_same_value() {
        for value in [0.0, 1.0, 4.57e9, 1.234_567_890_123e10, 9.3e8, 0.35, 1e14, 123.456] {
            for kind in [EntryKind::SpanYr, EntryKind::MassMsun, EntryKind::Plain] {
                assert_eq!(parse_entry(&write_entry(value, kind), kind), Ok(value));
            }
        }
    }

    #[test]
    fn a_foreign_unit_is_refused_and_the_known_ones_are_named() {
        let problem = parse_entry("3 parsecs", EntryKind::MassMsun).expect_err("a distance");
        assert!(problem.to_string().contains("Msun"), "{problem}");
        assert_eq!(parse_entry("  ", EntryKind::Plain), Err(EntryProblem::Empty));
    }
}
