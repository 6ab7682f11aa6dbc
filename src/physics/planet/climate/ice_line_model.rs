//! The annual-mean energy balance of every latitude of a planet with surface water.

use super::super::range::{OutOfRange, positive, within};
use super::infrared::{OutgoingInfrared, checked_carbon_dioxide};
use super::reflection::{ICE_WIDTH_K, Reflection, ice_share};
use super::sunlight_by_latitude::annual_share;
use crate::units::constants::SOLAR_CONSTANT_W_M2;
use std::f64::consts::PI;

/// Cells from the equator to one pole, uniform in latitude; the other hemisphere mirrors them.
pub(crate) const CELLS: usize = 45;
/// One value per cell.
pub(crate) type Profile = [f64; CELLS];

/// Heat transport that gives the Earth its ice line at 72°, W m⁻² K⁻¹.
pub const EARTH_HEAT_TRANSPORT_W_M2_K: f64 = 0.56464;
/// Temperature of the ice line, K.
const ICE_LINE_K: f64 = 263.15;

/// The air and the tilt of a planet with surface water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct WaterWorldAir {
    /// Partial pressure of carbon dioxide, bar, 0.0001 to 3; 0.00028 for the Earth before industry.
    pub carbon_dioxide_bar: f64,
    /// Tilt of the axis, degrees, 0 to 90.
    pub obliquity_deg: f64,
    /// Heat transport by air and sea, W m⁻² K⁻¹; 0.56 for the Earth. Grows with pressure and with a longer day.
    pub heat_transport_w_m2_k: f64,
}

impl WaterWorldAir {
    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        checked_carbon_dioxide(self.carbon_dioxide_bar)?;
        within("obliquity_deg", self.obliquity_deg, 0.0, 90.0, "0 to 90 degrees")?;
        within("heat_transport_w_m2_k", self.heat_transport_w_m2_k, 0.3, 3.0, "0.3 to 3 W/m2/K")?;
        Ok(())
    }
}

impl Default for WaterWorldAir {
    fn default() -> Self {
        Self { carbon_dioxide_bar: 2.8e-4, obliquity_deg: 23.44, heat_transport_w_m2_k: EARTH_HEAT_TRANSPORT_W_M2_K }
    }
}

/// A climate in balance.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Climate {
    /// Starlight, units of 1361.17 W m⁻².
    pub insolation_earth: f64,
    /// Mean surface temperature, K.
    pub mean_k: f64,
    /// Surface temperature at the equator, K.
    pub equator_k: f64,
    /// Surface temperature at the poles, K.
    pub pole_k: f64,
    /// Surface temperature of the warmest latitude, K.
    pub warmest_k: f64,
    /// Share of the surface that is ice, dimensionless.
    pub ice_fraction: f64,
    /// Share of the starlight that is reflected, dimensionless.
    pub planetary_albedo: f64,
    /// Latitude of the ice line, degrees: 90 without ice, 0 when all is ice; `None` for a tilt above 54°, where
    /// ice forms belts.
    pub ice_line_deg: Option<f64>,
    /// The model ends here: the climate asked for is at least this warm.
    pub is_end_of_curve: bool,
}

/// One belt of latitude, the same on both hemispheres.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Latitude {
    /// Latitude of its middle, degrees.
    pub latitude_deg: f64,
    /// Surface temperature, K.
    pub temperature_k: f64,
    /// Share of its surface that is ice, dimensionless.
    pub ice_fraction: f64,
    /// Share of the starlight it reflects, dimensionless.
    pub albedo: f64,
}

/// The energy balance of one planet under one colour of starlight.
///
/// `0 = d/dx [D (1 − x²) dT/dx] + S q(x) (1 − α) − I(T, p)`, x the sine of the latitude.
///
/// # Source
/// Budyko 1969, Sellers 1969, North 1975 (form); Williams & Kasting 1997 (I). D and the mean albedo of the open
/// surface are fitted to the Earth: 288.0 K and an ice line at 72°.
/// # Valid for
/// Rocky planets with surface water and roughly 0.5 to 3 bar of air that are not locked to their star.
/// # Accuracy
/// Sunlight at which the Earth freezes: 0.92 against 0.92 in a three-dimensional model (Shields et al. 2013); the
/// thaw depends on the albedo of ice and is good to 20 %.
#[derive(Clone, Debug)]
pub struct IceLineModel {
    pub(super) infrared: OutgoingInfrared,
    /// Sine of the latitude of each cell.
    sine: Profile,
    /// Share of the globe in each cell.
    weight: Profile,
    /// Starlight on each cell over the flux at the planet.
    sunlight: Profile,
    /// Exchange with the neighbours towards the equator and towards the pole, per unit of the cell, W m⁻² K⁻¹.
    lower: Profile,
    upper: Profile,
    open_albedo: Profile,
    ice_albedo: Profile,
    /// Width of the change from open water to ice, K.
    ice_width_k: f64,
    pub(super) has_ice_line: bool,
}

/// Tilt above which the poles receive more light than the equator, degrees.
const BELTS_ABOVE_DEG: f64 = 54.0;

/// Air and tilt laid out on the latitudes; the colour of the star is still open.
#[derive(Clone, Debug)]
pub(crate) struct Latitudes {
    infrared: OutgoingInfrared,
    sine: Profile,
    weight: Profile,
    sunlight: Profile,
    lower: Profile,
    upper: Profile,
    has_ice_line: bool,
}

impl Latitudes {
    pub(crate) fn new(air: &WaterWorldAir) -> Result<Self, OutOfRange> {
        air.check()?;
        let infrared = OutgoingInfrared::new(air.carbon_dioxide_bar)?;
        let (obliquity_deg, transport) = (air.obliquity_deg, air.heat_transport_w_m2_k);
        let edge = |index: usize| (0.5 * PI * index as f64 / CELLS as f64).sin();
        let sine: Profile = std::array::from_fn(|i| (0.5 * PI * (i as f64 + 0.5) / CELLS as f64).sin());
        let weight: Profile = std::array::from_fn(|i| edge(i + 1) - edge(i));
        let mut sunlight: Profile = std::array::from_fn(|i| annual_share(sine[i], obliquity_deg.to_radians()));
        let total: f64 = (0..CELLS).map(|i| sunlight[i] * weight[i]).sum();
        // The whole planet receives exactly a quarter of the flux, whatever the steps of the averages.
        for share in &mut sunlight {
            *share *= 0.25 / total;
        }
        // Nothing crosses the equator, by symmetry, nor the pole.
        let across = |i: usize| {
            let x = edge(i);
            if i == 0 || i == CELLS { 0.0 } else { transport * (1.0 - x * x) / (sine[i] - sine[i - 1]) }
        };
        let lower: Profile = std::array::from_fn(|i| across(i) / weight[i]);
        let upper: Profile = std::array::from_fn(|i| across(i + 1) / weight[i]);
        Ok(Self { infrared, sine, weight, sunlight, lower, upper, has_ice_line: obliquity_deg <= BELTS_ABOVE_DEG })
    }

    /// The same latitudes under other air.
    pub(crate) fn breathing(&self, infrared: OutgoingInfrared) -> Self {
        Self { infrared, ..self.clone() }
    }

    pub(crate) fn under(&self, teff_k: f64) -> IceLineModel {
        let reflection = Reflection::new(teff_k);
        let open_albedo: Profile = std::array::from_fn(|i| reflection.open(self.sine[i]));
        IceLineModel {
            infrared: self.infrared,
            sine: self.sine,
            weight: self.weight,
            sunlight: self.sunlight,
            lower: self.lower,
            upper: self.upper,
            open_albedo,
            ice_albedo: std::array::from_fn(|i| open_albedo[i].max(reflection.ice)),
            ice_width_k: ICE_WIDTH_K,
            has_ice_line: self.has_ice_line,
        }
    }
}

/// The imbalance of every cell and how it answers to temperature and starlight.
pub(crate) struct Balance {
    pub(crate) excess: Profile,
    /// Slope of the excess with the cell's own temperature, without exchange.
    pub(crate) slope: Profile,
    /// Starlight absorbed per unit of insolation.
    pub(crate) absorbed: Profile,
}

impl IceLineModel {
    /// Prepares the model for a planet's air and a star's effective temperature.
    ///
    /// # Errors
    /// [`OutOfRange`] for a field of `air` out of its range or a temperature that is not positive.
    pub fn new(air: &WaterWorldAir, effective_temperature_k: f64) -> Result<Self, OutOfRange> {
        let teff_k = positive("effective_temperature_k", effective_temperature_k)?;
        Ok(Latitudes::new(air)?.under(teff_k))
    }

    /// A profile that is warm everywhere, K.
    pub(crate) fn warm_start(&self) -> Profile {
        std::array::from_fn(|i| 290.0 - 15.0 * (3.0 * self.sine[i] * self.sine[i] - 1.0))
    }

    /// The balance of a profile, W m⁻².
    pub(crate) fn balance(&self, temperature_k: &Profile, insolation_earth: f64) -> Balance {
        let mut balance = Balance { excess: [0.0; CELLS], slope: [0.0; CELLS], absorbed: [0.0; CELLS] };
        let flux = insolation_earth * SOLAR_CONSTANT_W_M2;
        for i in 0..CELLS {
            let t = temperature_k[i];
            let (ice, ice_slope) = ice_share(t, self.ice_width_k);
            let (open, frozen) = (self.open_albedo[i], self.ice_albedo[i]);
            let absorbed_share = 1.0 - open - ice * (frozen - open);
            let (infrared, infrared_slope) = self.infrared.flux_and_slope(t);
            let exchanged = self.lower[i] * (temperature_k[i.saturating_sub(1)] - t)
                + self.upper[i] * (temperature_k[(i + 1).min(CELLS - 1)] - t);
            balance.absorbed[i] = SOLAR_CONSTANT_W_M2 * self.sunlight[i] * absorbed_share;
            balance.excess[i] = exchanged + balance.absorbed[i] * insolation_earth - infrared;
            balance.slope[i] = -flux * self.sunlight[i] * ice_slope * (frozen - open) - infrared_slope;
        }
        balance
    }

    /// Solves (exchange + diagonal) u = r for two right-hand sides at once, in place: tridiagonal elimination (Thomas).
    pub(crate) fn solve(&self, diagonal: &Profile, first: &mut Profile, second: &mut Profile) {
        let mut above = [0.0; CELLS];
        let (mut last_above, mut last_first, mut last_second) = (0.0, 0.0, 0.0);
        for i in 0..CELLS {
            let (lower, upper) = (self.lower[i], self.upper[i]);
            let pivot = diagonal[i] - lower - upper - lower * last_above;
            let inverse = 1.0 / if pivot.abs() < 1e-12 { 1e-12_f64.copysign(pivot) } else { pivot };
            last_above = upper * inverse;
            last_first = (first[i] - lower * last_first) * inverse;
            last_second = (second[i] - lower * last_second) * inverse;
            (above[i], first[i], second[i]) = (last_above, last_first, last_second);
        }
        for i in (0..CELLS - 1).rev() {
            first[i] -= above[i] * first[i + 1];
            second[i] -= above[i] * second[i + 1];
        }
    }

    /// The mean over the globe.
    pub(crate) fn mean(&self, profile: &Profile) -> f64 {
        (0..CELLS).map(|i| self.weight[i] * profile[i]).sum()
    }

    /// Lets a climate relax to its balance from everywhere warm.
    ///
    /// # Errors
    /// [`OutOfRange`] for an insolation outside 0.01 to 10.
    pub fn from_warm(&self, insolation_earth: f64) -> Result<Climate, OutOfRange> {
        self.relax(insolation_earth, &mut self.warm_start())
    }

    /// Lets a climate relax to its balance from everywhere at 190 K.
    ///
    /// # Errors
    /// [`OutOfRange`] for an insolation outside 0.01 to 10.
    pub fn from_frozen(&self, insolation_earth: f64) -> Result<Climate, OutOfRange> {
        self.relax(insolation_earth, &mut [190.0; CELLS])
    }

    /// Steps a real heat capacity through years, infrared and exchange taken ahead, reflection as it was. Unlike
    /// Newton's method this cannot jump to another branch.
    pub(crate) fn relax(&self, insolation_earth: f64, t: &mut Profile) -> Result<Climate, OutOfRange> {
        let s = within("insolation_earth", insolation_earth, 0.01, 10.0, "0.01 to 10")?;
        // A mixed ocean layer of 50 m over one year, W m⁻² K⁻¹.
        let inertia = 2.1e8 / 3.15576e7;
        for _ in 0..20_000 {
            let balance = self.balance(t, s);
            let diagonal: Profile =
                std::array::from_fn(|i| -(inertia + self.infrared.flux_and_slope(t[i]).1.max(0.05)));
            let mut step: Profile = std::array::from_fn(|i| -balance.excess[i]);
            let mut unused = [0.0; CELLS];
            self.solve(&diagonal, &mut step, &mut unused);
            let mut largest = 0.0_f64;
            for i in 0..CELLS {
                t[i] = (t[i] + step[i]).max(1.0);
                largest = largest.max(step[i].abs());
            }
            if largest < 1e-6 {
                break;
            }
        }
        Ok(self.describe(t, s))
    }

    /// The temperatures of a planet that is ice from pole to pole, K, with heat from inside and from the sky.
    ///
    /// With nothing to melt the balance is nearly linear, so Newton's method settles in a few steps.
    pub(crate) fn all_ice(&self, insolation_earth: f64, other_heat_w_m2: f64, mean_k: f64) -> Profile {
        let mut t = [mean_k.max(1.0); CELLS];
        for _ in 0..60 {
            let mut slope = [0.0; CELLS];
            let mut change = [0.0; CELLS];
            for i in 0..CELLS {
                let (infrared, infrared_slope) = self.infrared.flux_and_slope(t[i]);
                let exchanged = self.lower[i] * (t[i.saturating_sub(1)] - t[i])
                    + self.upper[i] * (t[(i + 1).min(CELLS - 1)] - t[i]);
                let absorbed = insolation_earth * SOLAR_CONSTANT_W_M2 * self.sunlight[i] * (1.0 - self.ice_albedo[i]);
                change[i] = absorbed + exchanged + other_heat_w_m2 - infrared;
                slope[i] = -infrared_slope.max(1e-6);
            }
            self.solve(&slope, &mut change, &mut [0.0; CELLS]);
            let mut largest = 0.0_f64;
            for i in 0..CELLS {
                let step = change[i].clamp(-20.0, 20.0);
                t[i] = (t[i] - step).max(1.0);
                largest = largest.max(step.abs());
            }
            if largest < 1e-4 {
                break;
            }
        }
        t
    }

    /// Latitudes, ice and reflection of a profile, from the equator to a pole.
    pub(crate) fn by_latitude(&self, t: &Profile, is_all_ice: bool) -> Vec<Latitude> {
        (0..CELLS)
            .map(|i| {
                let ice_fraction = if is_all_ice { 1.0 } else { ice_share(t[i], self.ice_width_k).0 };
                Latitude {
                    latitude_deg: (i as f64 + 0.5) * 90.0 / CELLS as f64,
                    temperature_k: t[i],
                    ice_fraction,
                    albedo: self.open_albedo[i] + ice_fraction * (self.ice_albedo[i] - self.open_albedo[i]),
                }
            })
            .collect()
    }

    /// The figures of a profile that is in balance.
    pub(crate) fn describe(&self, t: &Profile, insolation_earth: f64) -> Climate {
        let ice: Profile = std::array::from_fn(|i| ice_share(t[i], self.ice_width_k).0);
        let absorbed = self.balance(t, insolation_earth).absorbed;
        Climate {
            insolation_earth,
            mean_k: self.mean(t),
            equator_k: t[0],
            pole_k: t[CELLS - 1],
            warmest_k: t.iter().copied().fold(0.0, f64::max),
            ice_fraction: self.mean(&ice),
            planetary_albedo: 1.0 - self.mean(&absorbed) / (0.25 * SOLAR_CONSTANT_W_M2),
            ice_line_deg: self.has_ice_line.then(|| ice_line_deg(t)),
            is_end_of_curve: false,
        }
    }
}

/// The latitude where a profile that cools polewards crosses the temperature of the ice line, degrees.
fn ice_line_deg(t: &Profile) -> f64 {
    let cell_deg = 90.0 / CELLS as f64;
    let Some(cold) = t.iter().position(|&local_k| local_k < ICE_LINE_K) else { return 90.0 };
    let Some(warm) = cold.checked_sub(1) else { return 0.0 };
    (warm as f64 + 0.5 + (t[warm] - ICE_LINE_K) / (t[warm] - t[cold])) * cell_deg
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_earth_is_as_it_was_fitted() {
        let model = IceLineModel::new(&WaterWorldAir::default(), 5772.0).expect("in range");
        let earth = model.from_warm(1.0).expect("in range");
        assert!((earth.mean_k - 288.0).abs() < 0.1, "{earth:?}");
        assert!((earth.ice_line_deg.expect("small tilt") - 72.0).abs() < 0.1, "{earth:?}");
        assert!((earth.planetary_albedo - 0.3075).abs() < 1e-3, "{earth:?}");
    }

    #[test]
    fn a_balanced_climate_radiates_what_it_absorbs() {
        let model = IceLineModel::new(&WaterWorldAir::default(), 4400.0).expect("in range");
        let t = model.warm_start();
        let balance = model.balance(&t, 1.0);
        // Exchange moves heat about; over the globe it cancels.
        let radiated: Profile = std::array::from_fn(|i| model.infrared.flux_w_m2(t[i]));
        let net = model.mean(&balance.absorbed) - model.mean(&radiated);
        assert!((model.mean(&balance.excess) - net).abs() < 1e-9);
    }

    /// The annual energy balance of North's kind with his linear infrared, in the configuration of a public climate
    /// library: 210 + 2 T W/m2 (T in °C), D 0.555, open albedo 0.3 + 0.078 P2, ice 0.62 from −10 °C, sunlight
    /// 1 − 0.48 P2. What it should give was run with that library.
    #[test]
    fn another_published_configuration_gives_its_published_climates() {
        let of_public_library = |solar_constant_w_m2: f64| {
            let air = WaterWorldAir { heat_transport_w_m2_k: 0.555, ..WaterWorldAir::default() };
            let mut model = IceLineModel::new(&air, 5772.0).expect("in range");
            let p2: Profile = std::array::from_fn(|i| 0.5 * (3.0 * model.sine[i] * model.sine[i] - 1.0));
            model.infrared = OutgoingInfrared::linear(210.0 - 2.0 * 273.15, 2.0);
            model.open_albedo = std::array::from_fn(|i| 0.3 + 0.078 * p2[i]);
            model.ice_albedo = [0.62; CELLS];
            model.ice_width_k = 0.05;
            model.sunlight = std::array::from_fn(|i| 0.25 * (1.0 - 0.48 * p2[i]));
            // That library starts from 12 °C − 40 P2.
            let mut t: Profile = std::array::from_fn(|i| 285.15 - 40.0 * p2[i]);
            model.relax(solar_constant_w_m2 / SOLAR_CONSTANT_W_M2, &mut t).expect("in range")
        };
        // Where ice begins at a step, its edge can come to rest in more than one cell of 2°, each worth 0.3 K.
        let earth = of_public_library(1365.2);
        assert!((earth.mean_k - 273.15 - 14.288).abs() < 0.35, "{earth:?}");
        assert!((earth.ice_line_deg.expect("small tilt") - 70.0).abs() < 3.0, "{earth:?}");
        let open = of_public_library(1260.0);
        assert!((open.mean_k - 273.15 + 4.2).abs() < 0.1, "{open:?}");
        let snowball = of_public_library(1240.0);
        assert!((snowball.mean_k - 273.15 + 46.1).abs() < 0.05, "{snowball:?}");
    }

    #[test]
    fn a_steep_tilt_has_no_ice_line() {
        let air = WaterWorldAir { obliquity_deg: 80.0, ..WaterWorldAir::default() };
        let climate = IceLineModel::new(&air, 5772.0).expect("in range").from_warm(1.0).expect("in range");
        assert_eq!(climate.ice_line_deg, None);
        assert!(climate.pole_k > climate.equator_k);
    }
}
