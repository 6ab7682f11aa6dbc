//! How far a figure about light can be trusted when it is more than a plain result.

/// A caution that travels with a value to whoever shows it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Caution {
    /// A blackbody stands in for the star's spectrum; lines, bands and activity are left out.
    BlackbodyStandsIn,
    /// Below about 2200 K molecules and alkali metals shape the colour; the blackbody is a sketch only.
    MolecularAbsorption,
    /// The colour lies outside sRGB and is shown as the nearest the screen has.
    OutsideSrgb,
    /// The relation was asked outside the range it was made for.
    OutsideRelation,
    /// A large change of the answer follows from a small change of the colour.
    IllConditioned,
    /// The air is clean: no dust, haze, cloud, ozone or other absorber.
    CleanAirOnly,
    /// Close to the horizon the light path follows the curvature of the Earth and its air.
    LowStar,
    /// The air is so thick that light is scattered many times; the dome is an average only.
    ThickAir,
    /// Good to a factor of a few.
    OrderOfMagnitude,
}

impl Caution {
    /// Every caution, in the order they are explained.
    pub const ALL: [Self; 9] = [
        Self::BlackbodyStandsIn,
        Self::MolecularAbsorption,
        Self::OutsideSrgb,
        Self::OutsideRelation,
        Self::IllConditioned,
        Self::CleanAirOnly,
        Self::LowStar,
        Self::ThickAir,
        Self::OrderOfMagnitude,
    ];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::BlackbodyStandsIn => "blackbody_stands_in",
            Self::MolecularAbsorption => "molecular_absorption",
            Self::OutsideSrgb => "outside_srgb",
            Self::OutsideRelation => "outside_relation",
            Self::IllConditioned => "ill_conditioned",
            Self::CleanAirOnly => "clean_air_only",
            Self::LowStar => "low_star",
            Self::ThickAir => "thick_air",
            Self::OrderOfMagnitude => "order_of_magnitude",
        }
    }

    /// The caution in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::BlackbodyStandsIn => "a blackbody stands in for the star's spectrum",
            Self::MolecularAbsorption => "molecules shape the real colour; the blackbody is a sketch",
            Self::OutsideSrgb => "outside sRGB, shown as nearest",
            Self::OutsideRelation => "outside the range the relation was made for",
            Self::IllConditioned => "ill-conditioned: hot colours hardly differ",
            Self::CleanAirOnly => "deep, clean sky: no dust, cloud or ozone",
            Self::LowStar => "low star: path length as on Earth",
            Self::ThickAir => "thick air: average of the dome only",
            Self::OrderOfMagnitude => "order of magnitude",
        }
    }
}
