//! Why the inside of a star is not known layer by layer.

/// Why there is no profile of a star at a moment.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, thiserror::Error)]
pub enum NoProfile {
    /// The life follows published fits.
    #[error(
        "this star follows published fits, which know its light, size and core but not its layers; they are computed for \
         red dwarfs below 0.5 solar masses"
    )]
    Fitted,
    /// Only a quick look is known so far.
    #[error("this is a quick look, which knows no layers; they are here as soon as the exact life is computed")]
    QuickLook,
    /// A cold white dwarf is followed as one crystal.
    #[error("this cold white dwarf is followed as one crystal of one temperature, without layers")]
    Crystal,
    /// The white dwarf left by a giant that could not be followed to its end.
    #[error("this white dwarf follows published cooling tables, which know no layers")]
    CoreAlone,
}
