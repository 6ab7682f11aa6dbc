//! Which tides act, and how strongly bodies dissipate.

use super::super::range::{OutOfRange, within};

/// How dissipation depends on the tidal frequency.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum TideForm {
    /// No tide changes the orbit, except perhaps a giant's envelope.
    Off,
    /// The same fraction of the tidal energy is lost in every cycle. Jackson, Greenberg & Barnes 2008.
    ConstantQuality,
    /// The bulge lags by the same time whatever the period. Hut 1981; Leconte et al. 2010.
    ConstantLag,
}

impl TideForm {
    /// Every form.
    pub const ALL: [Self; 3] = [Self::Off, Self::ConstantQuality, Self::ConstantLag];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Off => "off",
            Self::ConstantQuality => "constant_quality",
            Self::ConstantLag => "constant_lag",
        }
    }

    /// The form in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Off => "no tide",
            Self::ConstantQuality => "constant Q",
            Self::ConstantLag => "constant time lag",
        }
    }
}

/// How the convective envelope of a giant drags a planet inwards.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum GiantDrag {
    /// No drag: the planet only answers to the mass loss.
    Off,
    /// Eddy viscosity whatever the period. Zahn 1989 as used by Schröder & Smith 2008.
    Zahn,
    /// Eddies slower than the tide count less. Mustill & Villaver 2012.
    FrequencyLimited,
}

impl GiantDrag {
    /// Every choice.
    pub const ALL: [Self; 3] = [Self::Off, Self::Zahn, Self::FrequencyLimited];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Off => "off",
            Self::Zahn => "zahn",
            Self::FrequencyLimited => "frequency_limited",
        }
    }

    /// The choice in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Off => "no drag",
            Self::Zahn => "eddy viscosity",
            Self::FrequencyLimited => "eddy viscosity, slow eddies discounted",
        }
    }
}

/// The tides that shape an orbit.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Tides {
    /// Form of the tide raised on the planet and on a star that is no giant.
    pub form: TideForm,
    /// Form of the drag by a giant's envelope.
    pub giant_drag: GiantDrag,
    /// Modified quality factor of the star, Q' = 3Q/(2 k₂), dimensionless. Published values run from 10⁵ to 10⁸.
    pub star_quality: f64,
    /// Modified quality factor of the planet, Q' = 3Q/(2 k₂), dimensionless. Some 60 to 500 for rock, 10⁵ for gas giants.
    pub planet_quality: f64,
}

/// Orbital period at which both forms dissipate alike, s: 5 d, typical of the planets the quality factors come from.
pub(crate) const REFERENCE_PERIOD_S: f64 = 5.0 * 86_400.0;

impl Tides {
    /// The default: constant lag and the frequency-limited drag, with usual dissipation for a planet of this mass.
    ///
    /// # Source
    /// Stellar Q' = 10⁷: Penev et al. 2012, `ApJ` 751, 96 (recalled). Rock: Q between 12 and 100 with k₂ = 0.3; gas
    /// giants 10⁵: Goldreich & Soter 1966 (recalled). The step at 10 Earth masses is our own choice.
    #[must_use]
    pub fn usual(planet_mass_mearth: f64) -> Self {
        Self {
            form: TideForm::ConstantLag,
            giant_drag: GiantDrag::FrequencyLimited,
            star_quality: 1e7,
            planet_quality: if planet_mass_mearth > 10.0 { 1e5 } else { 200.0 },
        }
    }

    /// The same dissipation in the other published forms: the second answer to every tidal question.
    #[must_use]
    pub fn second_opinion(&self) -> Self {
        let form = match self.form {
            TideForm::Off => TideForm::Off,
            TideForm::ConstantQuality => TideForm::ConstantLag,
            TideForm::ConstantLag => TideForm::ConstantQuality,
        };
        let giant_drag = match self.giant_drag {
            GiantDrag::Off => GiantDrag::Off,
            GiantDrag::Zahn => GiantDrag::FrequencyLimited,
            GiantDrag::FrequencyLimited => GiantDrag::Zahn,
        };
        Self { form, giant_drag, ..*self }
    }

    /// No tide at all.
    #[must_use]
    pub fn off() -> Self {
        Self { form: TideForm::Off, giant_drag: GiantDrag::Off, star_quality: 1e7, planet_quality: 200.0 }
    }

    /// Whether nothing acts.
    #[must_use]
    pub fn is_off(&self) -> bool {
        self.form == TideForm::Off && self.giant_drag == GiantDrag::Off
    }

    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        within("star_quality", self.star_quality, 1e3, 1e12, "1e3 to 1e12")?;
        within("planet_quality", self.planet_quality, 1.0, 1e12, "1 to 1e12")?;
        Ok(())
    }
}
