//! Statements about a system and what the model says to them.
//!
//! A statement is one line, such as `star radius ever is at least 200 Rsun`; it is judged against the model's own value
//! and the spread of that value: it holds, it is within the spread, or it does not hold.

mod judge;
#[cfg(test)]
mod judge_tests;
mod line;
mod line_problem;
#[cfg(test)]
mod line_tests;
mod line_text;
mod lookup;
mod phrases;
mod quantity;
mod reading;
mod scan;
mod sentence;
mod spans;
mod spread;
mod statement;
mod verdict;

pub use judge::{Judgement, judge};
pub use line::{parse_saved_statement, parse_statement};
pub use line_problem::{LineFault, LineProblem};
pub use quantity::{FigureKey, Quantity, figures_of_planet, figures_of_star, phase_words};
pub use statement::{During, MOST_STATEMENTS, Relation, Statement, Subject, Tolerance, When};
pub use verdict::Verdict;
