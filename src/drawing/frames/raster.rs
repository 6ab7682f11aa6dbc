//! Pixels of linear light, and where they look on a flat screen and in a dome.

/// The shape of a frame.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Shape {
    /// Sixteen to nine.
    #[default]
    Flat,
    /// A square dome master: azimuthal equidistant, the zenith in the middle, the horizon at the rim of the circle, the
    /// front below.
    Dome,
}

impl Shape {
    /// Each shape.
    pub const ALL: [Self; 2] = [Self::Flat, Self::Dome];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Flat => "flat",
            Self::Dome => "dome",
        }
    }

    /// Width and height of a frame of this width, pixels; a flat one has an even height.
    #[must_use]
    pub fn sides_px(self, width_px: u32) -> [u32; 2] {
        match self {
            Self::Flat => [width_px, (width_px * 9 / 16).next_multiple_of(2)],
            Self::Dome => [width_px, width_px],
        }
    }
}

/// Linear Rec. 709, row by row from above; 1 is the screen's white.
#[derive(Clone, Debug, PartialEq)]
pub struct Raster {
    /// Width and height, pixels.
    pub sides_px: [u32; 2],
    /// Red, green and blue of every pixel.
    pub pixels: Vec<[f32; 3]>,
}

impl Raster {
    /// A raster of what a closure says of the middle of each pixel, counted in pixels from the upper left corner.
    pub(super) fn of(sides_px: [u32; 2], mut light: impl FnMut(f64, f64) -> [f64; 3]) -> Self {
        let [width, height] = sides_px;
        let mut pixels = Vec::with_capacity(width as usize * height as usize);
        for row in 0..height {
            for column in 0..width {
                pixels.push(light(f64::from(column) + 0.5, f64::from(row) + 0.5).map(|channel| channel as f32));
            }
        }
        Self { sides_px, pixels }
    }
}

/// Share of a pixel that a disc covers: `radius` and the `distance` of its centre in pixels.
///
/// A disc far smaller than a pixel gives its area to the pixels about its centre, so that it dims and does not blink.
pub(super) fn coverage(radius: f64, distance: f64) -> f64 {
    if radius < 0.5 {
        return (3.0 * radius * radius * (1.0 - distance).max(0.0)).min(1.0);
    }
    (radius - distance + 0.5).clamp(0.0, 1.0)
}

/// A mixture of two lights.
pub(super) fn mixed(ground: [f64; 3], figure: [f64; 3], share: f64) -> [f64; 3] {
    if share <= 0.0 {
        return ground;
    }
    if share >= 1.0 {
        return figure;
    }
    [0, 1, 2].map(|channel| ground[channel] + share * (figure[channel] - ground[channel]))
}

/// Direction that a pixel of a dome master looks in: to the right, to the front, up. `None` outside the circle, with the
/// share of the pixel that lies inside as a number from 0 to 1.
pub(super) fn dome_direction(size: f64, x: f64, y: f64) -> (Option<[f64; 3]>, f64) {
    let half = 0.5 * size;
    let (right, below) = (x - half, y - half);
    let distance = right.hypot(below);
    let inside = (half - distance + 0.5).clamp(0.0, 1.0);
    if inside <= 0.0 {
        return (None, 0.0);
    }
    let zenith_rad = distance / half * std::f64::consts::FRAC_PI_2;
    let across = if distance > 0.0 { zenith_rad.sin() / distance } else { 0.0 };
    (Some([right * across, below * across, zenith_rad.cos()]), inside)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_dome_master_is_azimuthal_equidistant() {
        let altitude_deg = |x: f64, y: f64| dome_direction(1000.0, x, y).0.map(|[_, _, up]| up.asin().to_degrees());
        assert!((altitude_deg(500.0, 500.0).expect("inside") - 90.0).abs() < 1e-9);
        // Equal steps towards the rim are equal steps of altitude.
        assert!((altitude_deg(500.0, 750.0).expect("inside") - 45.0).abs() < 1e-9);
        assert!(altitude_deg(999.9, 500.0).expect("inside").abs() < 0.1);
        assert_eq!(altitude_deg(2.0, 2.0), None);
        let [right, front, _] = dome_direction(1000.0, 500.0, 900.0).0.expect("inside");
        assert!(right.abs() < 1e-12 && front > 0.9, "the front is below");
    }

    #[test]
    fn a_shrinking_disc_dims_without_a_jump() {
        let light = |radius: f64| {
            let pixels = (-60..=60).flat_map(|row| (-60..=60).map(move |column| (f64::from(row), f64::from(column))));
            pixels.map(|(row, column)| coverage(radius, row.hypot(column))).sum::<f64>()
        };
        for radius in [0.05, 0.3, 0.5, 2.0, 20.0] {
            let area = std::f64::consts::PI * radius * radius;
            assert!((light(radius) / area - 1.0).abs() < 0.35, "{radius}: {} and {area}", light(radius));
        }
        assert!((light(0.4999) / light(0.5001) - 1.0).abs() < 0.3);
    }
}
