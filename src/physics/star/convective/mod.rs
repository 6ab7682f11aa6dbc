//! Red dwarfs.
#![allow(dead_code)]

mod burning;
mod calibration;
mod cgs;
mod composition;
mod gas;
mod numbers;
mod opacity;
