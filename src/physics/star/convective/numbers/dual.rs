//! A value with its first derivatives.

use super::{Number, Partials};
use std::ops::{Add, Div, Mul, Neg, Sub};

/// A quantity and its first derivatives with respect to `N` variables.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(in super::super) struct Dual<const N: usize> {
    /// The quantity itself.
    pub(in super::super) value: f64,
    /// Its derivative with respect to each variable.
    pub(in super::super) slope: [f64; N],
}

impl<const N: usize> Default for Dual<N> {
    fn default() -> Self {
        Self { value: 0.0, slope: [0.0; N] }
    }
}

impl<const N: usize> Dual<N> {
    /// Variable number `index` of the `N`.
    #[inline]
    pub(in super::super) fn variable(value: f64, index: usize) -> Self {
        let mut slope = [0.0; N];
        slope[index] = 1.0;
        Self { value, slope }
    }

    /// Value and slopes combined term by term: a·f(a) + b·f(b).
    #[inline]
    fn combine(self, self_factor: f64, other: Self, other_factor: f64, value: f64) -> Self {
        Self { value, slope: std::array::from_fn(|i| self_factor * self.slope[i] + other_factor * other.slope[i]) }
    }
}

impl Dual<2> {
    /// The same quantity seen as one of four variables, of which it depends on the first two.
    #[inline]
    pub(in super::super) fn widen(self) -> Dual<4> {
        Dual { value: self.value, slope: [self.slope[0], self.slope[1], 0.0, 0.0] }
    }

    /// The value after small changes of both variables, to first order.
    #[inline]
    pub(in super::super) fn moved(self, by: [f64; 2]) -> f64 {
        self.value + self.slope[0] * by[0] + self.slope[1] * by[1]
    }
}

impl<const N: usize> Number for Dual<N> {
    #[inline]
    fn constant(value: f64) -> Self {
        Self { value, slope: [0.0; N] }
    }

    #[inline]
    fn value(self) -> f64 {
        self.value
    }

    #[inline]
    fn chain(self, value: f64, first: f64, _second: f64) -> Self {
        Self { value, slope: self.slope.map(|s| first * s) }
    }

    #[inline]
    fn chain_two(self, other: Self, partials: &Partials) -> Self {
        self.combine(partials.a, other, partials.b, partials.value)
    }
}

impl<const N: usize> Add for Dual<N> {
    type Output = Self;
    #[inline]
    fn add(self, other: Self) -> Self {
        self.combine(1.0, other, 1.0, self.value + other.value)
    }
}

impl<const N: usize> Sub for Dual<N> {
    type Output = Self;
    #[inline]
    fn sub(self, other: Self) -> Self {
        self.combine(1.0, other, -1.0, self.value - other.value)
    }
}

impl<const N: usize> Mul for Dual<N> {
    type Output = Self;
    #[inline]
    fn mul(self, other: Self) -> Self {
        self.combine(other.value, other, self.value, self.value * other.value)
    }
}

impl<const N: usize> Div for Dual<N> {
    type Output = Self;
    #[inline]
    fn div(self, other: Self) -> Self {
        let inverse = other.value.recip();
        let value = self.value * inverse;
        self.combine(inverse, other, -value * inverse, value)
    }
}

impl<const N: usize> Neg for Dual<N> {
    type Output = Self;
    #[inline]
    fn neg(self) -> Self {
        self * -1.0
    }
}

impl<const N: usize> Add<f64> for Dual<N> {
    type Output = Self;
    #[inline]
    fn add(self, other: f64) -> Self {
        Self { value: self.value + other, ..self }
    }
}

impl<const N: usize> Sub<f64> for Dual<N> {
    type Output = Self;
    #[inline]
    fn sub(self, other: f64) -> Self {
        Self { value: self.value - other, ..self }
    }
}

impl<const N: usize> Mul<f64> for Dual<N> {
    type Output = Self;
    #[inline]
    fn mul(self, factor: f64) -> Self {
        Self { value: self.value * factor, slope: self.slope.map(|s| s * factor) }
    }
}
