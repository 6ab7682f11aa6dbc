//! Nuclear burning: how fast, how much heat, and what becomes of the nuclei.

mod change;
mod heat;
mod rates;
mod screening;

pub(super) use change::{burn, helium3_after};
pub(super) use heat::{Burning, Helium3, burning};
pub(super) use rates::{REACTIONS, Rates};
