//! The star's light.
