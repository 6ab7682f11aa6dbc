//! A value with its first and second derivatives with respect to two variables.

use super::{Dual, Number, Partials};
use std::ops::{Add, Div, Mul, Neg, Sub};

/// A quantity and its derivatives with respect to x = ln ρ and y = ln T, up to second order.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(in super::super) struct Jet {
    /// The quantity itself.
    pub(in super::super) value: f64,
    /// ∂/∂x.
    pub(in super::super) x: f64,
    /// ∂/∂y.
    pub(in super::super) y: f64,
    /// ∂²/∂x².
    pub(in super::super) xx: f64,
    /// ∂²/∂x∂y.
    pub(in super::super) xy: f64,
    /// ∂²/∂y².
    pub(in super::super) yy: f64,
}

impl Jet {
    /// The variable x.
    #[inline]
    pub(in super::super) fn variable_x(value: f64) -> Self {
        Self { x: 1.0, ..Self::constant(value) }
    }

    /// The variable y.
    #[inline]
    pub(in super::super) fn variable_y(value: f64) -> Self {
        Self { y: 1.0, ..Self::constant(value) }
    }

    /// The quantity with its first derivatives only.
    #[inline]
    pub(in super::super) fn first_order(self) -> Dual<2> {
        Dual { value: self.value, slope: [self.x, self.y] }
    }

    /// ∂/∂x as a quantity with its own first derivatives.
    #[inline]
    pub(in super::super) fn derivative_x(self) -> Dual<2> {
        Dual { value: self.x, slope: [self.xx, self.xy] }
    }

    /// ∂/∂y as a quantity with its own first derivatives.
    #[inline]
    pub(in super::super) fn derivative_y(self) -> Dual<2> {
        Dual { value: self.y, slope: [self.xy, self.yy] }
    }
}

impl Number for Jet {
    #[inline]
    fn constant(value: f64) -> Self {
        Self { value, x: 0.0, y: 0.0, xx: 0.0, xy: 0.0, yy: 0.0 }
    }

    #[inline]
    fn value(self) -> f64 {
        self.value
    }

    #[inline]
    fn chain(self, value: f64, first: f64, second: f64) -> Self {
        Self {
            value,
            x: first * self.x,
            y: first * self.y,
            xx: first * self.xx + second * self.x * self.x,
            xy: first * self.xy + second * self.x * self.y,
            yy: first * self.yy + second * self.y * self.y,
        }
    }

    #[inline]
    fn chain_two(self, other: Self, p: &Partials) -> Self {
        let second = |ai: f64, aj: f64, bi: f64, bj: f64| p.aa * ai * aj + p.ab * (ai * bj + aj * bi) + p.bb * bi * bj;
        let (a, b) = (self, other);
        Self {
            value: p.value,
            x: p.a * a.x + p.b * b.x,
            y: p.a * a.y + p.b * b.y,
            xx: p.a * a.xx + p.b * b.xx + second(a.x, a.x, b.x, b.x),
            xy: p.a * a.xy + p.b * b.xy + second(a.x, a.y, b.x, b.y),
            yy: p.a * a.yy + p.b * b.yy + second(a.y, a.y, b.y, b.y),
        }
    }
}

impl Add for Jet {
    type Output = Self;
    #[inline]
    fn add(self, o: Self) -> Self {
        Self {
            value: self.value + o.value,
            x: self.x + o.x,
            y: self.y + o.y,
            xx: self.xx + o.xx,
            xy: self.xy + o.xy,
            yy: self.yy + o.yy,
        }
    }
}

impl Sub for Jet {
    type Output = Self;
    #[inline]
    fn sub(self, o: Self) -> Self {
        Self {
            value: self.value - o.value,
            x: self.x - o.x,
            y: self.y - o.y,
            xx: self.xx - o.xx,
            xy: self.xy - o.xy,
            yy: self.yy - o.yy,
        }
    }
}

impl Mul for Jet {
    type Output = Self;
    #[inline]
    fn mul(self, o: Self) -> Self {
        Self {
            value: self.value * o.value,
            x: self.x * o.value + self.value * o.x,
            y: self.y * o.value + self.value * o.y,
            xx: self.xx * o.value + 2.0 * self.x * o.x + self.value * o.xx,
            xy: self.xy * o.value + self.x * o.y + self.y * o.x + self.value * o.xy,
            yy: self.yy * o.value + 2.0 * self.y * o.y + self.value * o.yy,
        }
    }
}

impl Div for Jet {
    type Output = Self;
    #[inline]
    fn div(self, o: Self) -> Self {
        o.recip().mul(self)
    }
}

impl Neg for Jet {
    type Output = Self;
    #[inline]
    fn neg(self) -> Self {
        self * -1.0
    }
}

impl Add<f64> for Jet {
    type Output = Self;
    #[inline]
    fn add(self, other: f64) -> Self {
        Self { value: self.value + other, ..self }
    }
}

impl Sub<f64> for Jet {
    type Output = Self;
    #[inline]
    fn sub(self, other: f64) -> Self {
        Self { value: self.value - other, ..self }
    }
}

impl Mul<f64> for Jet {
    type Output = Self;
    #[inline]
    fn mul(self, k: f64) -> Self {
        Self { value: self.value * k, x: self.x * k, y: self.y * k, xx: self.xx * k, xy: self.xy * k, yy: self.yy * k }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// A formula that uses every operation.
    fn formula(x: Jet, y: Jet) -> Jet {
        let product = (x * y + 2.0).sqrt().ln() * (y - x).exp();
        (product / (x.square() + 1.0)).recip() + (x * 3.0 - y).cbrt() - x
    }

    #[test]
    fn derivatives_match_differences() {
        let at = |x: f64, y: f64| formula(Jet::variable_x(x), Jet::variable_y(y));
        let (x, y, h) = (1.3, 0.7, 1e-5);
        let here = at(x, y);
        let (right, left) = (at(x + h, y), at(x - h, y));
        let (up, down) = (at(x, y + h), at(x, y - h));
        let close = |a: f64, b: f64| assert!((a - b).abs() < 1e-8 * (1.0 + b.abs()), "{a} {b}");
        close(here.x, (right.value - left.value) / (2.0 * h));
        close(here.y, (up.value - down.value) / (2.0 * h));
        close(here.xx, (right.x - left.x) / (2.0 * h));
        close(here.xy, (up.x - down.x) / (2.0 * h));
        close(here.yy, (up.y - down.y) / (2.0 * h));
    }
}
