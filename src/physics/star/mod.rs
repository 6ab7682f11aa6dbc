//! The star's life.
