//! Numbers that carry their own derivatives, so that each formula is written once and its slopes come along.

mod dual;
mod jet;
mod number;

pub(super) use dual::Dual;
pub(super) use jet::Jet;
pub(super) use number::{Number, Partials, smoothstep};
