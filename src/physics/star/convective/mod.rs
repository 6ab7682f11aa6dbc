//! Red dwarfs from birth to black dwarf, computed from the equations of stellar structure.
//!
//! Stars of 0.08 to some 0.35 solar masses mix (almost) throughout while they burn hydrogen for up to trillions of
//! years; no published fit follows them to their end. Here the four structure equations are solved on a mesh of mass
//! shells (Henyey's relaxation) from the contracting young star through the burning of its hydrogen to the helium white
//! dwarf, and a one-zone crystal carries on from 1000 K. Below some 0.21 solar masses the whole star becomes that white
//! dwarf; heavier ones become small red giants first and lose part of their envelope in a wind.
//!
//! # Scope
//! Equation of state with arbitrarily degenerate electrons, ionisation, molecules and Coulomb forces; OPAL and
//! Ferguson opacity and electron conduction; proton–proton chains with ³He followed, CN cycle; mixing length; Reimers'
//! wind of giants.
//!
//! # Simplifications
//! Grey surface with a calibrated molecular opacity; no diffusion, overshooting, rotation or magnetism; no deuterium, so
//! that ages below a few million years mean little; late hydrogen flashes are levelled off.
//!
//! # Out of scope
//! Burning of helium: cores that would ignite it (stars above half a solar mass) are not followed.
//!
//! # Accuracy
//! Today's stars: luminosity 6 %, radius 2 %, temperature 2 % of Baraffe et al. 2015 (A&A 577, A42). Lifetimes: 1 % from
//! numbers, some 10 % from physics; the famous lifetimes of Laughlin, Bodenheimer & Adams 1997 (Astrophys. J. 482, 420)
//! are 1.6 times longer because their surfaces were more opaque (see [`SurfaceOpacity::Of1997`]). Peak temperature of
//! blue dwarfs 15 %, their peak luminosity a factor of two at given mass, white-dwarf cooling ages 25 %.

mod burning;
mod calibration;
mod cgs;
mod composition;
mod evolution;
mod gas;
mod life;
mod matter;
mod numbers;
mod opacity;
mod star_matter;
mod structure;

pub use evolution::Resolution;
pub use life::{
    Caution, ConvectiveError, ConvectiveInput, Ending, Layer, Life, Node, Options, Profile, Stage, SurfaceOpacity,
    YoungStar, compute, compute_with, profile_at,
};
pub use star_matter::{GasState, StarMatter};
