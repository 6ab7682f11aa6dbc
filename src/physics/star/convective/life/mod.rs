//! A whole life, as the rest of the program sees it.

mod compute;
mod error;
mod follow;
mod input;
mod node;
mod profile;
mod profiles;
mod stage;
mod track;
mod young_star;

pub use compute::{compute, compute_with};
pub use error::ConvectiveError;
pub use input::{ConvectiveInput, Options, SurfaceOpacity};
pub use node::{Caution, Ending, Life, Node};
pub use profile::{Layer, Profile};
pub use profiles::profile_at;
pub use stage::Stage;
pub use young_star::YoungStar;
