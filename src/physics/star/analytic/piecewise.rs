//! Straight lines through a few points.

/// Value at `x` of the line through `points` in rising order, constant before the first and after the last.
pub(super) fn linear_through(x: f64, points: &[(f64, f64)]) -> f64 {
    let Some((&first, rest)) = points.split_first() else { return 0.0 };
    let mut before = first;
    if x <= before.0 {
        return before.1;
    }
    for &after in rest {
        if x <= after.0 {
            let width = after.0 - before.0;
            return if width > 0.0 { before.1 + (after.1 - before.1) * (x - before.0) / width } else { after.1 };
        }
        before = after;
    }
    before.1
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lines_meet_at_the_points_and_stay_level_outside() {
        let points = [(1.0, 10.0), (2.0, 20.0), (2.0, 20.0), (4.0, 0.0)];
        let wanted = [(0.0, 10.0), (1.0, 10.0), (1.5, 15.0), (2.0, 20.0), (3.0, 10.0), (9.0, 0.0)];
        for (x, y) in wanted {
            assert_eq!(linear_through(x, &points), y);
        }
    }
}
