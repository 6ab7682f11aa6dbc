//! How far a figure can be trusted when it is more than a plain result.

/// A caution that travels with a value to whoever shows it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Caution {
    /// The relation was asked outside the range it was made for and answers with its end value.
    Extrapolated,
    /// Inputs nobody knows well (tidal dissipation, stellar activity) make this good to a factor of a few.
    OrderOfMagnitude,
    /// Two published assumptions give different answers; both are shown.
    Undecided,
    /// The user holds the quantity fixed; it does not answer to the star.
    HeldByUser,
    /// The relation does not apply here; the value is left out.
    NotApplicable,
}

impl Caution {
    /// Every caution, in the order they are explained.
    pub const ALL: [Self; 5] =
        [Self::Extrapolated, Self::OrderOfMagnitude, Self::Undecided, Self::HeldByUser, Self::NotApplicable];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Extrapolated => "extrapolated",
            Self::OrderOfMagnitude => "order_of_magnitude",
            Self::Undecided => "undecided",
            Self::HeldByUser => "held_by_user",
            Self::NotApplicable => "not_applicable",
        }
    }

    /// The caution in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Extrapolated => "extrapolated",
            Self::OrderOfMagnitude => "order of magnitude",
            Self::Undecided => "undecided",
            Self::HeldByUser => "held fixed by you",
            Self::NotApplicable => "not applicable",
        }
    }
}
