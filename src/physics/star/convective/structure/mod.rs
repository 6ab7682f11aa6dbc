//! The four equations of stellar structure on a mesh of mass shells, and how they are solved.

mod banded;
mod equations;
mod isentrope;
mod mesh;
mod mixing_length;
mod model;
mod refinement;
mod relaxation;

pub(super) use isentrope::Isentrope;
pub(super) use mesh::Mesh;
pub(super) use model::{Model, Unknowns};
pub(super) use relaxation::Past;
