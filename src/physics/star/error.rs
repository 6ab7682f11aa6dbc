//! Why a star's life cannot be computed.

use thiserror::Error;

/// A star outside what the analytic fits can follow.
#[derive(Clone, Copy, Debug, PartialEq, Error)]
pub enum StarError {
    /// The star is a real one, but the fits do not reach so low.
    #[error(
        "The mass of the star is {value_msun} solar masses. Stars below {least_msun} solar masses are not available yet: \
         they are mixed to the centre, and the published fits do not follow them. Choose a mass of {least_msun} or more."
    )]
    BelowAnalyticRange {
        /// The mass asked for, solar masses.
        value_msun: f64,
        /// The least mass allowed, solar masses.
        least_msun: f64,
    },
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
        let text = StarError::BelowAnalyticRange { value_msun: 0.2, least_msun: 0.35 }.to_string();
        assert!(
            text.contains("0.2 solar masses") && text.contains("not available yet") && text.contains("0.35 or more")
        );
        let text = StarError::Metallicity { value_dex: 0.5, least_dex: -2.0, most_dex: 0.2 }.to_string();
        assert!(text.contains("0.5 dex") && text.contains("-2 to 0.2 dex"));
    }
}
