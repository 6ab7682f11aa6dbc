//! Why a star's life cannot be computed.

use super::convective::ConvectiveError;
use thiserror::Error;

/// A star outside what can be computed, or a computation that was stopped.
#[derive(Clone, Debug, PartialEq, Error)]
pub enum StarError {
    /// The body never shines by burning hydrogen.
    #[error(
        "The mass of the star is {value_msun} solar masses. So light a body never burns hydrogen fast enough to shine by \
         it for long: it is a brown dwarf, which is not modelled. Choose a mass of {least_msun} or more; stars with few \
         heavy elements need a little more."
    )]
    BrownDwarf {
        /// The mass asked for, solar masses.
        value_msun: f64,
        /// The least mass allowed, solar masses.
        least_msun: f64,
    },
    /// The star is too light for the analytic fits; its structure can be computed instead.
    #[error(
        "The mass of the star is {value_msun} solar masses. Stars below {least_msun} solar masses are mixed to the centre, \
         and the published fits do not follow them. Choose a mass of {least_msun} or more."
    )]
    BelowFits {
        /// The mass asked for, solar masses.
        value_msun: f64,
        /// The least mass allowed, solar masses.
        least_msun: f64,
    },
    /// The structure of a red dwarf could not be followed.
    #[error("The life of this red dwarf could not be computed: {0}. Choose a slightly different mass or metallicity.")]
    Structure(ConvectiveError),
    /// The computation was asked to stop.
    #[error("The computation was cancelled.")]
    Cancelled,
    /// The mass is no number, not positive or too large.
    #[error(
        "The mass of the star is {value_msun} solar masses. Allowed are {least_msun} to {most_msun} solar masses. \
         Choose a mass in that range."
    )]
    Mass {
        /// The mass asked for, solar masses.
        value_msun: f64,
        /// The least mass allowed, solar masses.
        least_msun: f64,
        /// The greatest mass allowed, solar masses.
        most_msun: f64,
    },
    /// The metallicity is no number or outside the models behind the fits.
    #[error(
        "The metallicity of the star is {value_dex} dex. Allowed are {least_dex} to {most_dex} dex, where 0 is the Sun. \
         Choose a metallicity in that range."
    )]
    Metallicity {
        /// The metallicity asked for, dex.
        value_dex: f64,
        /// The least metallicity allowed, dex.
        least_dex: f64,
        /// The greatest metallicity allowed, dex.
        most_dex: f64,
    },
    /// The mass fraction of heavy elements is outside the models behind the fits.
    #[error(
        "The mass fraction of elements heavier than helium is {value}. Allowed are {least} to {most}. \
         Choose a fraction in that range."
    )]
    HeavyElements {
        /// The mass fraction asked for.
        value: f64,
        /// The least fraction allowed.
        least: f64,
        /// The greatest fraction allowed.
        most: f64,
    },
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_text_says_what_is_wrong_and_what_to_do() {
        let text = StarError::BrownDwarf { value_msun: 0.05, least_msun: 0.07 }.to_string();
        assert!(text.contains("0.05 solar masses") && text.contains("brown dwarf") && text.contains("0.07 or more"));
        let text = StarError::BelowFits { value_msun: 0.2, least_msun: 0.35 }.to_string();
        assert!(text.contains("0.2 solar masses") && text.contains("0.35 or more"));
        let text = StarError::Metallicity { value_dex: 0.5, least_dex: -2.0, most_dex: 0.2 }.to_string();
        assert!(text.contains("0.5 dex") && text.contains("-2 to 0.2 dex"));
    }
}
