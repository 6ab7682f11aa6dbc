//! What every number with derivatives can do.

use std::ops::{Add, Div, Mul, Neg, Sub};

/// Arithmetic common to [`Dual`](super::Dual) (first derivatives) and [`Jet`](super::Jet) (first and second derivatives).
pub(in super::super) trait Number:
    Copy
    + Add<Output = Self>
    + Sub<Output = Self>
    + Mul<Output = Self>
    + Div<Output = Self>
    + Neg<Output = Self>
    + Add<f64, Output = Self>
    + Sub<f64, Output = Self>
    + Mul<f64, Output = Self>
{
    /// A number that does not change.
    fn constant(value: f64) -> Self;

    /// The value without derivatives.
    fn value(self) -> f64;

    /// A function of this number, from its value and its first two derivatives there.
    fn chain(self, value: f64, first: f64, second: f64) -> Self;

    /// A function of two numbers, from its value and its partial derivatives there.
    fn chain_two(self, other: Self, partials: &Partials) -> Self;

    /// 1/x.
    #[inline]
    fn recip(self) -> Self {
        let inverse = self.value().recip();
        self.chain(inverse, -inverse * inverse, 2.0 * inverse * inverse * inverse)
    }

    /// eˣ.
    #[inline]
    fn exp(self) -> Self {
        let value = self.value().exp();
        self.chain(value, value, value)
    }

    /// Natural logarithm.
    #[inline]
    fn ln(self) -> Self {
        let inverse = self.value().recip();
        self.chain(self.value().ln(), inverse, -inverse * inverse)
    }

    /// Square root.
    #[inline]
    fn sqrt(self) -> Self {
        let value = self.value().sqrt();
        let first = 0.5 / value;
        self.chain(value, first, -0.5 * first / self.value())
    }

    /// Cube root.
    #[inline]
    fn cbrt(self) -> Self {
        let value = self.value().cbrt();
        let first = value / (3.0 * self.value());
        self.chain(value, first, -2.0 / 3.0 * first / self.value())
    }

    /// x².
    #[inline]
    fn square(self) -> Self {
        self * self
    }

    /// The smaller of this number and a limit; at the limit it no longer changes.
    #[inline]
    fn at_most(self, limit: f64) -> Self {
        if self.value() > limit { Self::constant(limit) } else { self }
    }

    /// The larger of this number and a limit; at the limit it no longer changes.
    #[inline]
    fn at_least(self, limit: f64) -> Self {
        if self.value() < limit { Self::constant(limit) } else { self }
    }
}

/// A function of two variables a and b with its partial derivatives up to second order.
#[derive(Clone, Copy, Debug)]
pub(in super::super) struct Partials {
    /// The function.
    pub(in super::super) value: f64,
    /// ∂/∂a.
    pub(in super::super) a: f64,
    /// ∂/∂b.
    pub(in super::super) b: f64,
    /// ∂²/∂a².
    pub(in super::super) aa: f64,
    /// ∂²/∂a∂b.
    pub(in super::super) ab: f64,
    /// ∂²/∂b².
    pub(in super::super) bb: f64,
}

/// Smooth rise from 0 at u ≤ 0 to 1 at u ≥ 1: u²(3 − 2u).
#[inline]
pub(in super::super) fn smoothstep<N: Number>(u: N) -> N {
    let u = u.at_least(0.0).at_most(1.0);
    u.square() * (u * -2.0 + 3.0)
}
