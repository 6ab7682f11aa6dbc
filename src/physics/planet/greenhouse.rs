//! Greenhouse warming that the user holds fixed: it knows nothing of ice, runaway or escape.

use super::range::{OutOfRange, non_negative, within};

/// A greenhouse effect that stays as it is while the star changes.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub enum Greenhouse {
    /// No air worth the name: the surface is as warm as the light makes it.
    #[default]
    None,
    /// The surface is a fixed number of kelvin above the equilibrium temperature.
    FixedIncrement {
        /// Surface minus equilibrium temperature, K. About 34 for the Earth, 510 for Venus, 5 for Mars.
        increment_k: f64,
    },
    /// A grey atmosphere of fixed infrared optical depth: `T⁴ = T_eq⁴ (1 + 3τ/4)`.
    Grey {
        /// Infrared optical depth of the air column, dimensionless. About 0.87 for the Earth, 148 for Venus.
        optical_depth: f64,
    },
}

impl Greenhouse {
    /// Stable machine name of the kind.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::None => "none",
            Self::FixedIncrement { .. } => "fixed_increment",
            Self::Grey { .. } => "grey",
        }
    }

    /// The kind in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::None => "no greenhouse",
            Self::FixedIncrement { .. } => "fixed increment",
            Self::Grey { .. } => "grey atmosphere",
        }
    }

    /// Checks the parameter.
    ///
    /// # Errors
    /// [`OutOfRange`] for an increment outside −300 to 2000 K or an optical depth outside 0 to 10⁶.
    pub fn check(self) -> Result<(), OutOfRange> {
        match self {
            Self::None => Ok(()),
            Self::FixedIncrement { increment_k } => {
                within("increment_k", increment_k, -300.0, 2000.0, "-300 to 2000 K").map(|_| ())
            }
            Self::Grey { optical_depth } => within("optical_depth", optical_depth, 0.0, 1e6, "0 to 1e6").map(|_| ()),
        }
    }

    /// The surface temperature for an equilibrium temperature, K. Never below zero.
    ///
    /// # Source
    /// Grey atmosphere in radiative equilibrium, Eddington approximation (textbook form).
    /// # Valid for
    /// Statements of the kind "if the greenhouse stayed as it is".
    /// # Accuracy
    /// As good as the parameter the user holds fixed.
    /// # Errors
    /// [`OutOfRange`] for a negative temperature or a parameter that [`Greenhouse::check`] refuses.
    pub fn surface_temperature_k(self, equilibrium_temperature_k: f64) -> Result<f64, OutOfRange> {
        self.check()?;
        let t_eq = non_negative("equilibrium_temperature_k", equilibrium_temperature_k)?;
        Ok(match self {
            Self::None => t_eq,
            Self::FixedIncrement { increment_k } => (t_eq + increment_k).max(0.0),
            Self::Grey { optical_depth } => t_eq * (1.0 + 0.75 * optical_depth).powf(0.25),
        })
    }
}

/// The optical depth that makes a grey atmosphere of two known temperatures: `τ = 4/3 ((T_s/T_eq)⁴ − 1)`.
///
/// # Source
/// Inverse of the grey form of [`Greenhouse::surface_temperature_k`].
/// # Errors
/// [`OutOfRange`] when the surface is colder than the equilibrium temperature or that is zero.
pub fn grey_optical_depth(surface_temperature_k: f64, equilibrium_temperature_k: f64) -> Result<f64, OutOfRange> {
    let t_eq = within("equilibrium_temperature_k", equilibrium_temperature_k, 1e-6, 1e6, "1e-6 to 1e6 K")?;
    let t_s =
        within("surface_temperature_k", surface_temperature_k, t_eq, 1e7, "at least the equilibrium temperature")?;
    Ok(4.0 / 3.0 * ((t_s / t_eq).powi(4) - 1.0))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn each_kind_warms_by_its_own_rule() {
        let warmed = |greenhouse: Greenhouse| greenhouse.surface_temperature_k(254.0).expect("in range");
        assert!((warmed(Greenhouse::None) - 254.0).abs() < 1e-12);
        assert!((warmed(Greenhouse::FixedIncrement { increment_k: 34.0 }) - 288.0).abs() < 1e-12);
        let optical_depth = grey_optical_depth(288.0, 254.0).expect("warmer");
        assert!((warmed(Greenhouse::Grey { optical_depth }) - 288.0).abs() < 1e-9);
    }

    #[test]
    fn a_large_cooling_stops_at_absolute_zero() {
        let surface_k =
            Greenhouse::FixedIncrement { increment_k: -50.0 }.surface_temperature_k(20.0).expect("in range");
        assert!(surface_k.abs() < 1e-12);
        assert!(Greenhouse::Grey { optical_depth: f64::NAN }.surface_temperature_k(254.0).is_err());
    }
}
