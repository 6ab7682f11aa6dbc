//! One life for every star: computed structure for red dwarfs, published fits for the others, blended where they meet.
//!
//! Below [`COMPUTED_BELOW_MSUN`] a life is that of the structure calculation ([`super::convective`]), from
//! [`FITTED_FROM_MSUN`] on that of the analytic fits ([`Track`](super::Track)). Between them both are computed and
//! joined at equal evolutionary points, so that no quantity jumps as the mass rises. Each engine keeps its own solar
//! anchor of metallicity.

mod blend;
mod computed;
mod fitted;
mod interior;
mod life;
mod moment;
mod no_profile;
pub mod quick_look;
mod told;
mod version;
mod zero_age;

pub use interior::Interior;
pub use life::{COMPUTED_BELOW_MSUN, FITTED_FROM_MSUN, LifeOptions, WholeLife};
pub use no_profile::NoProfile;
pub use version::STRUCTURE_VERSION;
pub use zero_age::{ZeroAgeStar, zero_age_line};
