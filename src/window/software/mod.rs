//! Drawing without OpenGL: the same window, its triangles filled by the processor.
//!
//! [`Canvas`] is a plain picture in memory and needs no display, so tests look at pages with it too.

mod canvas;
mod runner;
mod textures;
mod triangle;

pub use canvas::Canvas;
pub(super) use runner::run;
