//! X-rays and extreme ultraviolet of a star through its life.

use super::range::{OutOfRange, non_negative, positive, within};

/// Share of the luminosity that a young, saturated star gives off at high energies.
const SATURATED_SHARE: f64 = 1e-3;
/// Steepness of the decline after saturation. Ribas et al. 2005.
const DECLINE: f64 = 1.23;

/// Saturation ends at this age for this mass, M☉ and yr; in between both run straight in logarithms.
const SATURATION: [(f64, f64); 6] = [(0.09, 5e9), (0.12, 1e9), (0.4, 1e9), (0.6, 3e8), (0.8, 3e8), (0.9, 4.5e7)];

/// The age up to which a star of a mass emits as much high-energy light as it can, yr.
///
/// 45 Myr from 0.9 M☉ up, which gives the Sun 4.6 erg s⁻¹ cm⁻² at 1 au today; 0.3 Gyr at 0.7, 1 Gyr from 0.4 down to
/// 0.12 and 5 Gyr below 0.09 M☉.
///
/// # Source
/// Our own choice between published ages, made to meet the present Sun (Ribas et al. 2005) and two late red dwarfs
/// (Ribas et al. 2016, Wheatley et al. 2017); values from 0.1 to more than 5 Gyr are in print for red dwarfs.
/// # Accuracy
/// 0.5 dex in the light at a given age: it hangs on how fast the star was born spinning.
/// # Errors
/// [`OutOfRange`] for a mass that is not positive.
pub fn saturation_age_yr(star_mass_msun: f64) -> Result<f64, OutOfRange> {
    Ok(saturation_age_of(positive("star_mass_msun", star_mass_msun)?))
}

fn saturation_age_of(mass_msun: f64) -> f64 {
    let last = SATURATION.len() - 1;
    if mass_msun <= SATURATION[0].0 {
        return SATURATION[0].1;
    }
    if mass_msun >= SATURATION[last].0 {
        return SATURATION[last].1;
    }
    let above = SATURATION.partition_point(|(mass, _)| *mass <= mass_msun);
    let ((m0, t0), (m1, t1)) = (SATURATION[above - 1], SATURATION[above]);
    t0 * (t1 / t0).powf((mass_msun / m0).ln() / (m1 / m0).ln())
}

/// The high-energy luminosity (0.1 to 120 nm) of a star before its giant phase, solar luminosities:
/// 10⁻³ L until saturation ends, then `10⁻³ L (t/t_sat)^−1.23`.
///
/// # Source
/// Ribas et al. 2005, `ApJ` 622, 680; Luger & Barnes 2015, Astrobiology 15, 119.
/// # Valid for
/// Contracting and main-sequence stars; not giants, white dwarfs or other remnants. `age_yr` counts from the star's
/// formation.
/// # Accuracy
/// 0.5 dex.
/// # Errors
/// [`OutOfRange`] for a mass that is not positive, a negative luminosity or age.
pub fn high_energy_luminosity_lsun(luminosity_lsun: f64, star_mass_msun: f64, age_yr: f64) -> Result<f64, OutOfRange> {
    let l = non_negative("luminosity_lsun", luminosity_lsun)?;
    let age = non_negative("age_yr", age_yr)?;
    Ok(high_energy_of(l, saturation_age_yr(star_mass_msun)?, age))
}

/// [`high_energy_luminosity_lsun`] for checked input and a known end of saturation.
pub(crate) fn high_energy_of(luminosity_lsun: f64, saturation_age_yr: f64, age_yr: f64) -> f64 {
    SATURATED_SHARE * luminosity_lsun * (age_yr / saturation_age_yr).max(1.0).powf(-DECLINE)
}

/// One row of the X-ray decline by colour: bluest and reddest B − V, log of the saturated share, log of the age it
/// ends, yr, and the steepness afterwards.
type ColourRow = [f64; 5];

#[expect(clippy::approx_constant, reason = "a measured share that happens to look like π")]
const BY_COLOUR: [ColourRow; 7] = [
    [0.290, 0.450, -4.28, 7.87, 1.22],
    [0.450, 0.565, -4.24, 8.35, 1.24],
    [0.565, 0.675, -3.67, 7.84, 1.13],
    [0.675, 0.790, -3.71, 8.03, 1.28],
    [0.790, 0.935, -3.36, 7.90, 1.40],
    [0.935, 1.275, -3.35, 8.28, 1.09],
    [1.275, 1.410, -3.14, 8.21, 1.18],
];

/// The decimal logarithm of the X-ray luminosity over the total, for a main-sequence star by its colour.
///
/// # Source
/// Jackson, Davis & Wheatley 2012, MNRAS 422, 2024, table 2.
/// # Valid for
/// B − V from 0.290 to 1.410: no red dwarfs.
/// # Accuracy
/// 0.3 dex and more; it makes the Sun about 0.5 dex too bright.
/// # Errors
/// [`OutOfRange`] for a colour outside the table or an age that is not positive.
pub fn x_ray_share_dex(b_minus_v_mag: f64, age_yr: f64) -> Result<f64, OutOfRange> {
    let colour = within("b_minus_v_mag", b_minus_v_mag, 0.290, 1.410, "0.290 to 1.410 mag")?;
    let log_age = positive("age_yr", age_yr)?.log10();
    let at = BY_COLOUR.iter().position(|row| colour < row[1]).unwrap_or(BY_COLOUR.len() - 1);
    let [_, _, saturated, log_end, steepness] = BY_COLOUR[at];
    Ok(saturated - steepness * (log_age - log_end).max(0.0))
}

/// The extreme-ultraviolet luminosity that goes with an X-ray luminosity, W: `log L_EUV = 4.8 + 0.86 log L_X` in erg/s.
///
/// # Source
/// Sanz-Forcada et al. 2011, A&A 532, A6, equation 3.
/// # Errors
/// [`OutOfRange`] for a luminosity that is not positive.
pub fn extreme_ultraviolet_w(x_ray_w: f64) -> Result<f64, OutOfRange> {
    let log_erg_s = positive("x_ray_w", x_ray_w)?.log10() + 7.0;
    Ok(10.0_f64.powf(4.8 + 0.86 * log_erg_s - 7.0))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn saturation_has_no_jumps_and_shortens_with_mass() {
        let mut previous = saturation_age_yr(0.05).expect("in range");
        for step in 1..2000 {
            let age = saturation_age_yr(0.05 + f64::from(step) * 1e-3).expect("in range");
            assert!(age <= previous && age > 0.8 * previous, "step {step}");
            previous = age;
        }
    }

    #[test]
    fn the_decline_starts_where_saturation_ends() {
        let of = |age_yr| high_energy_luminosity_lsun(1.0, 1.0, age_yr).expect("in range");
        assert!((of(0.0) - 1e-3).abs() < 1e-15 && (of(4.5e7) - 1e-3).abs() < 1e-15);
        assert!((of(4.5e8) / 1e-3 - 10.0_f64.powf(-1.23)).abs() < 1e-9);
    }
}
