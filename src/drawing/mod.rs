//! Figures for print: the plain data of every plot as SVG in publication style, and that SVG as a picture or a page.
//!
//! An SVG keeps its text as text; pictures and pages are made of the same SVG with the bundled fonts, so that a figure
//! looks alike on every machine.

mod canvas;
mod caption;
#[cfg(test)]
mod checks;
mod climate;
pub mod fonts;
pub mod frames;
mod hr_diagram;
mod ink;
mod interior;
mod latitudes;
mod legend;
mod life_strip;
mod light_gauge;
mod orbits;
mod page;
mod picture;
mod plot;
mod sky;
mod spectrum;
mod state_mark;
mod time_chart;

pub use canvas::{line_of_text, markup_text};
pub use ink::Look;
pub use picture::{MOST_PIXELS, PictureProblem, SIDE_RANGE_PX, Size, pdf, pixels, png};
pub use plot::{Plot, Subject, figure_svg};
