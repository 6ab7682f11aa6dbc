//! What can go wrong.

/// Why a life could not be computed.
#[derive(Clone, Debug, PartialEq, thiserror::Error)]
#[non_exhaustive]
pub enum ConvectiveError {
    /// An input is not a number or lies outside what was computed and checked.
    #[error("{what} is {value}, allowed {} to {}", allowed[0], allowed[1])]
    OutOfRange {
        /// Name of the input.
        what: &'static str,
        /// Its value.
        value: f64,
        /// Smallest and largest value allowed.
        allowed: [f64; 2],
    },
    /// The star never burns hydrogen fast enough to shine by it: a brown dwarf.
    #[error("a star of {mass_msun} solar masses never settles on the main sequence: it is a brown dwarf")]
    BrownDwarf {
        /// Its mass, solar masses.
        mass_msun: f64,
    },
    /// No contracting young star was found to begin with.
    #[error("no young star of {mass_msun} solar masses was found to begin with")]
    NoStart {
        /// Its mass, solar masses.
        mass_msun: f64,
    },
    /// The structure could not be followed further.
    #[error(
        "the structure of a star of {mass_msun} solar masses could not be followed beyond {age_yr:.4e} years after its \
         birth, at {effective_temperature_k:.0} K"
    )]
    NotConverged {
        /// Its mass, solar masses.
        mass_msun: f64,
        /// Age since birth that was reached, yr.
        age_yr: f64,
        /// Temperature of its surface then, K.
        effective_temperature_k: f64,
    },
    /// The opacity table that is part of the program is damaged.
    #[error("the built-in opacity table is damaged")]
    DamagedTable,
    /// The caller asked to stop.
    #[error("the computation was cancelled")]
    Cancelled,
}
