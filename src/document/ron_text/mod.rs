//! The text form of our files: a subset of RON, read with every place kept and every problem collected.
//!
//! The subset: structs with or without a name, tuples (for `Some(…)` and variants), lists, strings with escapes
//! and raw strings, decimal numbers with underscores and exponents, `true` and `false`, names of variants,
//! trailing commas, `//` and nested `/* */` comments. Maps, characters, bytes and extensions are left out.
//!
//! A ready-made reader stops at the first problem; a person who mends a file wants all of them at once.

mod lexer;
mod lines;
mod parser;
mod syntax;
mod tree;
mod writer;

pub use lines::Lines;
pub use parser::{Parsed, parse};
pub use syntax::SyntaxFault;
pub use tree::{Field, Node, Record, Span, Value};
pub use writer::{Writer, number_text, quoted};
