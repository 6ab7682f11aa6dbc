//! The ages at which a table has its rows.

use crate::system::{History, TimeAxis, TimeScale};
use crate::units::number_text::machine;
use thiserror::Error;

/// Fewest and most rows of a table.
pub const POINTS_RANGE: (usize, usize) = (2, 100_000);

/// Why no table can be made of the span asked for.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum TableAgesProblem {
    /// Too few or too many rows.
    #[error("points is {value}, allowed {} to {}; choose a number in that range", POINTS_RANGE.0, POINTS_RANGE.1)]
    Points {
        /// The number asked for.
        value: usize,
    },
    /// The span ends before it is a year long.
    #[error("the table runs from {} yr to {} yr, allowed is an end at least 1 yr after the start; exchange or widen them", plain(*from_yr), plain(*to_yr))]
    EmptySpan {
        /// Start asked for, yr.
        from_yr: f64,
        /// End asked for, yr.
        to_yr: f64,
    },
    /// A logarithm of zero.
    #[error(
        "the table starts at 0 yr, allowed above 0 with logarithmic spacing; start later or choose another spacing"
    )]
    LogOfZero,
    /// Neighbouring rows would share one `f64`.
    #[error(
        "points is {value}, allowed fewer for a span this short at an age this great, where rows would share a time; ask for fewer or widen the span"
    )]
    TooDense {
        /// The number asked for.
        value: usize,
    },
}

fn plain(value_yr: f64) -> String {
    machine(value_yr).unwrap_or_else(|| "?".to_owned())
}

/// The ages at which a history was computed, between two ages, which are rows themselves: the table then holds the
/// computed life and nothing in between.
///
/// # Errors
/// [`TableAgesProblem`] when the span can't be had.
pub fn node_ages(history: &History, from_yr: Option<f64>, to_yr: Option<f64>) -> Result<Vec<f64>, TableAgesProblem> {
    let (from_yr, to_yr) = (from_yr.unwrap_or(0.0), to_yr.unwrap_or_else(|| history.shown_until_yr()));
    if to_yr - from_yr < 1.0 {
        return Err(TableAgesProblem::EmptySpan { from_yr, to_yr });
    }
    let inside = history.life().node_ages_yr().iter().copied().filter(|age_yr| *age_yr > from_yr && *age_yr < to_yr);
    Ok(std::iter::once(from_yr).chain(inside).chain([to_yr]).collect())
}

/// The ages of a table's rows, rising, from the start to the end of the span, both included.
///
/// Without a start the table begins at birth (with logarithmic spacing, five decades before its end); without an
/// end it runs to the end of what is shown of this history.
///
/// # Errors
/// [`TableAgesProblem`] when the span or the number of rows cannot be had.
pub fn table_ages(
    history: &History,
    from_yr: Option<f64>,
    to_yr: Option<f64>,
    points: usize,
    spacing: TimeScale,
) -> Result<Vec<f64>, TableAgesProblem> {
    if points < POINTS_RANGE.0 || points > POINTS_RANGE.1 {
        return Err(TableAgesProblem::Points { value: points });
    }
    if spacing == TimeScale::Log && from_yr.is_some_and(|from_yr| from_yr <= 0.0) {
        return Err(TableAgesProblem::LogOfZero);
    }
    let (start_yr, end_yr) = (from_yr.unwrap_or(0.0), to_yr.unwrap_or_else(|| history.shown_until_yr()));
    if end_yr - start_yr < 1.0 {
        return Err(TableAgesProblem::EmptySpan { from_yr: start_yr, to_yr: end_yr });
    }
    let axis = TimeAxis::between(history, spacing, start_yr, end_yr);
    let last = points - 1;
    let mut ages_yr: Vec<f64> = (0..points).map(|index| axis.age_at(index as f64 / last as f64)).collect();
    // The ends are what was asked for, to the last bit.
    ages_yr[0] = axis.from_yr();
    ages_yr[last] = axis.to_yr();
    if ages_yr.windows(2).all(|pair| pair[0] < pair[1]) {
        Ok(ages_yr)
    } else {
        Err(TableAgesProblem::TooDense { value: points })
    }
}
