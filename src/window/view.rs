//! The part of the time axis that strip and charts show.

/// A stretch of the whole axis, as fractions.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct View {
    /// Left end, 0 to 1.
    pub from: f64,
    /// Right end, 0 to 1.
    pub to: f64,
}

/// The whole life.
pub(crate) const WHOLE: View = View { from: 0.0, to: 1.0 };
/// Closest zoom, as a share of the whole axis.
const NARROWEST: f64 = 1e-4;

impl View {
    /// Width as a share of the whole axis.
    #[must_use]
    pub fn width(self) -> f64 {
        self.to - self.from
    }

    /// Place in the view of a place on the axis; outside 0 to 1 when it is not in view.
    #[must_use]
    pub fn place_of(self, fraction: f64) -> f64 {
        (fraction - self.from) / self.width()
    }

    /// Place on the axis of a place in the view.
    #[must_use]
    pub fn fraction_of(self, place: f64) -> f64 {
        (self.from + place * self.width()).clamp(0.0, 1.0)
    }

    /// Zoomed about a place of the view.
    #[must_use]
    pub fn zoomed(self, about: f64, factor: f64) -> Self {
        let width = (self.width() / factor).clamp(NARROWEST, 1.0);
        let centre = self.from + about * self.width();
        Self::of(centre - about * width, width)
    }

    /// Moved by a share of its width.
    #[must_use]
    pub fn panned(self, share: f64) -> Self {
        Self::of(self.from + share * self.width(), self.width())
    }

    /// Moved just as far as needed to show a place on the axis.
    #[must_use]
    pub fn showing(self, fraction: f64) -> Self {
        if fraction < self.from || fraction > self.to {
            Self::of(fraction - 0.5 * self.width(), self.width())
        } else {
            self
        }
    }

    fn of(from: f64, width: f64) -> Self {
        let from = from.clamp(0.0, 1.0 - width);
        Self { from, to: from + width }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn zoom_keeps_the_place_under_the_pointer() {
        let view = WHOLE.zoomed(0.3, 4.0);
        assert!((view.width() - 0.25).abs() < 1e-12);
        assert!((view.fraction_of(0.3) - 0.3).abs() < 1e-12);
        assert_eq!(view.zoomed(0.5, 1e-9), WHOLE);
        assert!(WHOLE.zoomed(0.5, 1e12).width() > 0.999 * NARROWEST);
    }

    #[test]
    fn a_view_never_leaves_the_axis() {
        let view = WHOLE.zoomed(0.5, 10.0).panned(100.0);
        assert!(view.to <= 1.0 && (view.width() - 0.1).abs() < 1e-12);
        assert!(view.showing(0.2).from <= 0.2);
    }
}
