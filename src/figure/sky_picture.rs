//! The sky over a horizon as a picture to scale: star, reference disc, air and ground in their colours.

use crate::physics::light::{
    FULL_COLOUR_FROM_CD_M2, RgbSpace, SeenLight, Sky, Tristimulus, Viewing, adapted, screen_colour, seen,
};
use crate::system::PlanetLight;
use crate::system::planet_light::{REFERENCE_DISC_DEG, USUAL_ALTITUDE_DEG};
use std::f64::consts::PI;

/// The picture is exposed so that ground of this albedo, lit by star and sky, would be as bright as the screen's white,
/// or less where the sky would be brighter than that.
const WHITE_ALBEDO: f64 = 0.5;
/// Brightest that a sky is drawn, against the screen's white.
const BRIGHTEST_SKY: f64 = 0.85;
/// Albedo of the ground that is drawn.
const GROUND_ALBEDO: f64 = 0.2;
/// The picture is not exposed for less than this, cd m⁻²: what is darker than moonlit ground is drawn dark.
const DIMMEST_WHITE_CD_M2: f64 = 0.02;
/// Luminance below which the eye sees no colour at all, cd m⁻²: lower end of the mesopic range, CIE 191:2010.
const NO_COLOUR_BELOW_CD_M2: f64 = 0.005;

/// Least contrast that the eye makes out, as a share of the background: Weber's fraction in daylight, about 2 %.
const LEAST_CONTRAST: f64 = 0.02;
/// Share of the picture's height below the horizon.
const GROUND_SHARE: f64 = 0.16;
/// Radius of a disc below which a magnified pair is drawn as well, points.
const SMALL_RADIUS: f64 = 11.0;
/// Radius of the larger disc of the magnified pair, points.
const MAGNIFIED_RADIUS: f64 = 20.0;

/// How a sky is looked at.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SkyView {
    /// Altitude of the star over the horizon, degrees.
    pub altitude_deg: f64,
    /// Whether the planet has the air it was given, or none.
    pub with_air: bool,
    /// Who looks.
    pub viewing: Viewing,
}

impl Default for SkyView {
    fn default() -> Self {
        Self { altitude_deg: USUAL_ALTITUDE_DEG, with_air: true, viewing: Viewing::default() }
    }
}

/// How much an eye makes of the light on the ground.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Vision {
    /// Full colour.
    Full,
    /// Colours greyer than they are drawn.
    Faint,
    /// Shapes at best.
    Colourless,
}

impl Vision {
    /// In words for people; nothing to say about full colour.
    #[must_use]
    pub fn words(self) -> Option<&'static str> {
        match self {
            Self::Full => None,
            Self::Faint => {
                Some("So little light falls on the ground that an eye sees its colours greyer than they are drawn.")
            }
            Self::Colourless => Some("So little light falls on the ground that an eye sees no colour by it."),
        }
    }
}

/// Everything to draw.
#[derive(Clone, Debug, PartialEq)]
pub struct SkyPicture {
    /// Altitude of the star's centre, degrees.
    pub altitude_deg: f64,
    /// Width of the star, degrees.
    pub star_diameter_deg: f64,
    /// Colour of the sky on the screen, its brightness against the ground's kept.
    pub sky_srgb: [u8; 3],
    /// Colour of the ground, grey of albedo 0.2 in this light.
    pub ground_srgb: [u8; 3],
    /// Colour of the disc with the sky before it.
    pub disc_srgb: [u8; 3],
    /// Sky, ground and disc in linear Rec. 709 against the screen's white, as bright as they are: the disc is far above 1.
    pub linear: SkyLight,
    /// How the sky looks, its brightness set aside; `None` where it is black.
    pub sky: Option<SeenLight>,
    /// How the disc looks, its brightness set aside; `None` where nothing of it comes through.
    pub disc: Option<SeenLight>,
    /// How white things on the ground look.
    pub daylight: Option<SeenLight>,
    /// Whether the disc stands out against the sky.
    pub disc_is_seen: bool,
    /// What an eye makes of it.
    pub vision: Vision,
}

/// Linear light of the parts of a sky; what lies outside Rec. 709 has a negative channel.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SkyLight {
    /// The clear sky.
    pub sky: [f64; 3],
    /// Grey ground of albedo 0.2.
    pub ground: [f64; 3],
    /// The star's disc with the sky before it.
    pub disc: [f64; 3],
}

impl SkyPicture {
    /// The picture of a planet's sky; `None` without a sky or a disc.
    #[must_use]
    pub fn new(light: &PlanetLight, view: SkyView) -> Option<Self> {
        let sky = light.sky.as_ref()?;
        let disc = light.disc?;
        let dome = sky.dome.scaled(1.0 / PI);
        let for_ground_cd_m2 = sky.total_lx() / PI * WHITE_ALBEDO;
        let white_cd_m2 = for_ground_cd_m2.max(dome.y / BRIGHTEST_SKY).max(DIMMEST_WHITE_CD_M2);
        let surface = sky.disc.scaled(1.0 / disc.solid_angle_sr).plus(dome);
        let exposed = |light| exposed(light, sky, view.viewing, white_cd_m2);
        let seen = |light| seen(light, sky.star_above_air, view.viewing);
        let (sky_srgb, disc_srgb) = (exposed(dome), exposed(surface));
        let linear =
            |light| RgbSpace::Rec709.linear(as_viewed(light, sky, view.viewing)).map(|channel| channel / white_cd_m2);
        let ground = sky.daylight().scaled(GROUND_ALBEDO / PI);
        Some(Self {
            altitude_deg: view.altitude_deg,
            star_diameter_deg: disc.diameter_deg,
            ground_srgb: exposed(ground),
            linear: SkyLight { sky: linear(dome), ground: linear(ground), disc: linear(surface) },
            sky: seen(sky.dome),
            disc: seen(sky.disc),
            daylight: seen(sky.daylight()),
            disc_is_seen: surface.y - dome.y > LEAST_CONTRAST * dome.y && surface.y > 0.0,
            vision: vision(sky.total_lx() / PI * GROUND_ALBEDO),
            sky_srgb,
            disc_srgb,
        })
    }

    /// Where everything stands in a picture of this width and height.
    #[must_use]
    pub fn layout(&self, width: f64, height: f64) -> SkyLayout {
        let (star_deg, reference_deg) = (0.5 * self.star_diameter_deg, 0.5 * REFERENCE_DISC_DEG);
        let gap_deg = (0.15 * star_deg).max(reference_deg);
        let sky_height = height * (1.0 - GROUND_SHARE);
        // As large as the star's altitude and width allow, so that a low star is seen close up.
        let top_deg = (self.altitude_deg + star_deg.max(reference_deg)) * 1.2 + 2.0;
        let across_deg = 2.0 * (star_deg + reference_deg) + gap_deg;
        let scale = (sky_height / top_deg).min(0.8 * width / across_deg);
        let y = sky_height - scale * self.altitude_deg;
        let left = 0.5 * (width - scale * across_deg);
        let star = Circle { x: left + scale * star_deg, y, radius: scale * star_deg };
        let reference = Circle { x: left + scale * (across_deg - reference_deg), y, radius: scale * reference_deg };
        SkyLayout {
            points_per_degree: scale,
            horizon_y: sky_height,
            marks: marks(sky_height / scale),
            magnified: magnified(star.radius, reference.radius),
            star,
            reference,
        }
    }
}

/// Places of a picture, in points from its upper left corner.
#[derive(Clone, Debug, PartialEq)]
pub struct SkyLayout {
    /// Points that one degree takes.
    pub points_per_degree: f64,
    /// Height of the horizon.
    pub horizon_y: f64,
    /// Round altitudes worth a mark, degrees.
    pub marks: Vec<f64>,
    /// The star.
    pub star: Circle,
    /// The disc of half a degree beside it.
    pub reference: Circle,
    /// Both once more, larger, where they are small.
    pub magnified: Option<Magnified>,
}

/// A disc in a picture.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Circle {
    /// Centre, points from the left.
    pub x: f64,
    /// Centre, points from above.
    pub y: f64,
    /// Radius, points.
    pub radius: f64,
}

/// The two discs, magnified alike.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Magnified {
    /// Radius of the star, points.
    pub star_radius: f64,
    /// Radius of the half-degree disc, points.
    pub reference_radius: f64,
    /// Times the size in the picture.
    pub factor: f64,
}

fn magnified(star_radius: f64, reference_radius: f64) -> Option<Magnified> {
    let larger = star_radius.max(reference_radius);
    let factor = MAGNIFIED_RADIUS / larger;
    (larger < SMALL_RADIUS).then_some(Magnified {
        star_radius: star_radius * factor,
        reference_radius: reference_radius * factor,
        factor,
    })
}

/// Even, round altitudes up to the top of a picture, at most five.
fn marks(top_deg: f64) -> Vec<f64> {
    let step_deg = [0.5, 1.0, 2.0, 5.0, 10.0, 15.0, 30.0].into_iter().find(|step| top_deg / step < 5.5).unwrap_or(30.0);
    (1..=5_u32)
        .map(|count| step_deg * f64::from(count))
        .take_while(|mark| *mark < 0.96 * top_deg && *mark <= 90.0)
        .collect()
}

/// The encoded colour of a luminance when `white_cd_m2` is drawn as white; what is brighter is as bright as the screen.
fn exposed(luminance: Tristimulus, sky: &Sky, viewing: Viewing, white_cd_m2: f64) -> [u8; 3] {
    let viewed = as_viewed(luminance, sky, viewing);
    let largest = RgbSpace::Rec709.linear(viewed).into_iter().fold(0.0, f64::max);
    screen_colour(viewed).map_or([0; 3], |colour| colour.dimmed(largest / white_cd_m2))
}

/// A light as a camera takes it, or as an eye sees it that is used to the star.
fn as_viewed(light: Tristimulus, sky: &Sky, viewing: Viewing) -> Tristimulus {
    match (viewing, sky.star_above_air.chromaticity()) {
        (Viewing::AdaptedEye, Some(white)) => adapted(light, white, 1.0),
        _ => light,
    }
}

fn vision(ground_cd_m2: f64) -> Vision {
    if ground_cd_m2 >= FULL_COLOUR_FROM_CD_M2 {
        Vision::Full
    } else if ground_cd_m2 >= NO_COLOUR_BELOW_CD_M2 {
        Vision::Faint
    } else {
        Vision::Colourless
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::physics::light::{Atmosphere, SkyScene, disc, photosynthetic_light, sky, ultraviolet_light};

    fn light(temperature_k: f64, irradiance_w_m2: f64, pressure_bar: f64, altitude_deg: f64) -> PlanetLight {
        let atmosphere = Atmosphere { surface_pressure_bar: pressure_bar, ..Atmosphere::EARTH };
        let scene = SkyScene { star_temperature_k: temperature_k, irradiance_w_m2, altitude_deg, atmosphere };
        PlanetLight {
            irradiance_w_m2,
            illuminance_lx: 0.0,
            photosynthetic: photosynthetic_light(irradiance_w_m2, temperature_k).expect("in range"),
            ultraviolet: ultraviolet_light(irradiance_w_m2, temperature_k).expect("in range"),
            disc: disc(1.0, 1.0).ok(),
            star_visual_mag: None,
            sky: sky(&scene).ok(),
        }
    }

    fn picture(temperature_k: f64, pressure_bar: f64, viewing: Viewing) -> SkyPicture {
        let view = SkyView { viewing, ..SkyView::default() };
        SkyPicture::new(&light(temperature_k, 1361.0, pressure_bar, view.altitude_deg), view).expect("a picture")
    }

    #[test]
    fn a_red_dwarf_s_sky_is_beige_on_a_screen_and_blue_to_an_adapted_eye() {
        let [red, _, blue] = picture(2600.0, 1.0, Viewing::Camera).sky_srgb;
        assert!(red > blue, "{red} {blue}");
        let [red, _, blue] = picture(2600.0, 1.0, Viewing::AdaptedEye).sky_srgb;
        assert!(blue > red, "{red} {blue}");
        let star = picture(2600.0, 0.0, Viewing::AdaptedEye).disc_srgb;
        assert!(star.into_iter().all(|channel| channel >= 253), "the star is white to an eye used to it: {star:?}");
    }

    #[test]
    fn less_air_makes_a_darker_sky_and_none_a_black_one() {
        let brightness = |pressure_bar| picture(5772.0, pressure_bar, Viewing::Camera).sky_srgb[2];
        assert!(brightness(1.0) > brightness(0.1) && brightness(0.1) > brightness(0.006));
        let airless = picture(5772.0, 0.0, Viewing::Camera);
        assert_eq!((airless.sky_srgb, airless.sky), ([0; 3], None));
        assert!(airless.disc_is_seen && airless.ground_srgb != [0; 3]);
    }

    #[test]
    fn air_can_be_too_thick_for_the_disc() {
        assert!(picture(5772.0, 20.0, Viewing::Camera).disc_is_seen);
        let thick = picture(5772.0, 500.0, Viewing::Camera);
        assert!(!thick.disc_is_seen && thick.sky.is_some());
    }

    #[test]
    fn what_hardly_shines_is_drawn_dark() {
        let view = SkyView::default();
        let ember = SkyPicture::new(&light(900.0, 1e-3, 1.0, view.altitude_deg), view).expect("a picture");
        assert!(ember.sky_srgb.into_iter().all(|channel| channel < 20), "{ember:?}");
        assert_eq!(ember.vision, Vision::Colourless);
        assert_eq!(picture(5772.0, 1.0, Viewing::Camera).vision, Vision::Full);
    }

    #[test]
    fn both_discs_stand_in_the_picture_to_one_scale() {
        for altitude_deg in [0.0, 0.5, 12.0, 45.0, 90.0] {
            for star_diameter_deg in [0.001, 0.5, 3.0, 60.0, 179.0] {
                let picture = SkyPicture { altitude_deg, star_diameter_deg, ..picture(5772.0, 1.0, Viewing::Camera) };
                for (width, height) in [(400.0, 150.0), (1000.0, 500.0)] {
                    let layout = picture.layout(width, height);
                    assert!((layout.star.radius * 2.0 / layout.points_per_degree - star_diameter_deg).abs() < 1e-9);
                    assert!((layout.reference.radius * 2.0 / layout.points_per_degree - 0.5).abs() < 1e-9);
                    assert!(layout.star.x - layout.star.radius >= 0.0, "{layout:?}");
                    assert!(layout.reference.x + layout.reference.radius <= width, "{layout:?}");
                    assert!(layout.star.y - layout.star.radius >= 0.0 && layout.star.y <= layout.horizon_y);
                    assert!(layout.reference.x - layout.reference.radius > layout.star.x + layout.star.radius);
                    assert!(layout.marks.windows(2).all(|pair| pair[0] < pair[1]) && layout.marks.len() <= 5);
                }
            }
        }
    }
}
