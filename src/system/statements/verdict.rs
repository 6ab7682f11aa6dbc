//! The verdict on a value that is known within a range.

use super::quantity::Quantity;
use super::spread::Range;
use super::statement::{Relation, Tolerance};
use crate::units::entry::EntryKind;

/// What the model says to a statement.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Verdict {
    /// It agrees.
    Holds,
    /// It can neither confirm nor contradict: the edge of what is stated lies within the spread of its value.
    WithinSpread,
    /// It contradicts.
    DoesNotHold,
    /// It has no value to judge by.
    NotJudged,
}

impl Verdict {
    /// Every verdict.
    pub const ALL: [Self; 4] = [Self::Holds, Self::WithinSpread, Self::DoesNotHold, Self::NotJudged];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Holds => "holds",
            Self::WithinSpread => "within_the_spread",
            Self::DoesNotHold => "does_not_hold",
            Self::NotJudged => "not_judged",
        }
    }

    /// The verdict in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Holds => "holds",
            Self::WithinSpread => "within the spread",
            Self::DoesNotHold => "does not hold",
            Self::NotJudged => "cannot be judged",
        }
    }

    /// Whether nothing speaks against the statement.
    #[must_use]
    pub fn is_upheld(self) -> bool {
        matches!(self, Self::Holds | Self::WithinSpread)
    }
}

/// How near "about" is where nothing is said: 10 %, as common rounding to one or two digits goes; 2 % of temperatures,
/// 0.1 mag, 0.05 of shares, 0.01 of colour coordinates. Own choice.
pub(super) fn usual_tolerance(quantity: &Quantity) -> Tolerance {
    let key = match quantity {
        Quantity::Figure(key) | Quantity::Highest(key) | Quantity::Lowest(key) => *key,
        _ => "",
    };
    match quantity.entry() {
        EntryKind::TemperatureK => Tolerance::Percent(2.0),
        EntryKind::Magnitude => Tolerance::Difference(0.1),
        EntryKind::Plain if key.ends_with("_fraction") => Tolerance::Difference(0.05),
        EntryKind::Plain if key.ends_with("_x") || key.ends_with("_y") || key.ends_with("_prime") => {
            Tolerance::Difference(0.01)
        }
        _ => Tolerance::Percent(10.0),
    }
}

/// The range of values that a relation allows.
pub(super) fn allowed(relation: Relation, quantity: &Quantity) -> Range {
    match relation {
        Relation::About(value, tolerance) => {
            let reach = match tolerance.unwrap_or_else(|| usual_tolerance(quantity)) {
                Tolerance::Percent(percent) => (value * percent / 100.0).abs(),
                Tolerance::Difference(difference) => difference,
            };
            Range { lowest: Some(value - reach), highest: Some(value + reach) }
        }
        Relation::AtLeast(value) => Range { lowest: Some(value), highest: None },
        Relation::AtMost(value) => Range { lowest: None, highest: Some(value) },
        Relation::Between(low, high) => Range { lowest: Some(low), highest: Some(high) },
        Relation::Happens | Relation::NeverHappens => Range { lowest: None, highest: None },
    }
}

/// Judges a value with its range.
///
/// "About" holds when the model's own value is near enough. The other relations hold when the whole range of the value
/// satisfies them. Where only a part of the range does, the statement is within the spread.
pub(super) fn verdict(value: f64, known: Option<Range>, relation: Relation, quantity: &Quantity) -> Verdict {
    let allowed = allowed(relation, quantity);
    let known = known.unwrap_or(Range { lowest: Some(value), highest: Some(value) });
    let is_exact = known.lowest.is_some() && known.highest.is_some();
    let above =
        |known: Option<f64>, edge: Option<f64>| edge.is_none_or(|edge| known.is_some_and(|known| known >= edge));
    let below =
        |known: Option<f64>, edge: Option<f64>| edge.is_none_or(|edge| known.is_some_and(|known| known <= edge));
    let is_inside = above(known.lowest, allowed.lowest) && below(known.highest, allowed.highest);
    let is_near = above(Some(value), allowed.lowest) && below(Some(value), allowed.highest);
    let misses = known.highest.zip(allowed.lowest).is_some_and(|(highest, edge)| highest < edge)
        || known.lowest.zip(allowed.highest).is_some_and(|(lowest, edge)| lowest > edge);
    if is_inside || (matches!(relation, Relation::About(..)) && is_near && is_exact) {
        Verdict::Holds
    } else if misses {
        Verdict::DoesNotHold
    } else {
        Verdict::WithinSpread
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const LUMINOSITY: Quantity = Quantity::Figure("luminosity_lsun");

    fn judged(value: f64, share: f64, relation: Relation) -> Verdict {
        let known = Range { lowest: Some(value * (1.0 - share)), highest: Some(value * (1.0 + share)) };
        verdict(value, Some(known), relation, &LUMINOSITY)
    }

    #[test]
    fn each_relation_has_three_verdicts() {
        use Verdict::{DoesNotHold, Holds, WithinSpread};
        for (value, relation, expected) in [
            (1.0, Relation::About(1.05, None), Holds),
            (1.0, Relation::About(1.15, None), WithinSpread),
            (1.0, Relation::About(1.3, None), DoesNotHold),
            (1.0, Relation::About(1.05, Some(Tolerance::Percent(1.0))), WithinSpread),
            (1.0, Relation::AtLeast(0.9), Holds),
            (1.0, Relation::AtLeast(1.02), WithinSpread),
            (1.0, Relation::AtLeast(1.1), DoesNotHold),
            (1.0, Relation::AtMost(1.1), Holds),
            (1.0, Relation::AtMost(0.98), WithinSpread),
            (1.0, Relation::AtMost(0.9), DoesNotHold),
            (1.0, Relation::Between(0.9, 1.1), Holds),
            (1.0, Relation::Between(0.99, 2.0), WithinSpread),
            (1.0, Relation::Between(1.1, 2.0), DoesNotHold),
        ] {
            assert_eq!(judged(value, 0.05, relation), expected, "{relation:?}");
        }
    }

    #[test]
    fn a_bound_contradicts_only_what_lies_below_it() {
        let bound = Some(Range { lowest: Some(700.0), highest: None });
        let surface = Quantity::Figure("surface_temperature_k");
        let judged = |relation| verdict(700.0, bound, relation, &surface);
        assert_eq!(judged(Relation::AtLeast(373.0)), Verdict::Holds);
        assert_eq!(judged(Relation::AtMost(300.0)), Verdict::DoesNotHold);
        assert_eq!(judged(Relation::About(288.0, None)), Verdict::DoesNotHold);
        assert_eq!(judged(Relation::About(1500.0, None)), Verdict::WithinSpread);
        assert_eq!(judged(Relation::AtLeast(1500.0)), Verdict::WithinSpread);
    }
}
