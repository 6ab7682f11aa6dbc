//! Nuclear burning: how fast, how much heat, and what becomes of the nuclei.

mod change;
mod heat;
mod rates;
mod screening;

pub(super) use change::{burn, helium3_after};
pub(super) use heat::{BURNS_ABOVE_LN_K, Burning, Helium3, burning};
pub(super) use rates::{REACTIONS, Rates};
