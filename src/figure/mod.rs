//! Every plot as plain data: samples, scales, series, bands. Whoever draws adds nothing but ink.

pub mod chart;
pub mod curves;
pub mod distance;
pub mod hr_diagram;
pub mod interior;
pub mod latitudes;
pub mod light_and_thresholds;
pub mod light_gauge;
pub mod orbit_plan;
pub mod ribbon;
pub mod samples;
pub mod sky_picture;
pub mod spectrum;
pub mod value_axis;

pub use chart::{Band, Chart, Level, Owner, Run, Series};
pub use hr_diagram::HrDiagram;
pub use interior::InteriorPicture;
pub use latitudes::LatitudeFigure;
pub use light_gauge::LightGauge;
pub use orbit_plan::OrbitPlan;
pub use ribbon::Ribbon;
pub use samples::Samples;
pub use sky_picture::{SkyLight, SkyPicture, SkyView};
pub use spectrum::{Spectrum, SpectrumView};
pub use value_axis::{ValueAxis, ValueTick};
