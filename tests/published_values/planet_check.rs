//! One line per checked value: what, ours, theirs, how close, and who says so.

/// Compares a value with a published one.
pub(crate) fn near(what: &str, ours: f64, published: f64, tolerance: f64, source: &str) {
    assert!((ours - published).abs() <= tolerance, "{what}: {ours} against {published} ± {tolerance} ({source})");
}

/// Compares a value with a published one that is known to a share of itself.
pub(crate) fn near_share(what: &str, ours: f64, published: f64, share: f64, source: &str) {
    near(what, ours, published, share * published.abs(), source);
}
