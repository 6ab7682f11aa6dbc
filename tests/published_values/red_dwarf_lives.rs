//! Lives that several tests look at, each computed once.

use longember::physics::star::convective::{
    ConvectiveInput, Life, Node, Options, Resolution, SurfaceOpacity, compute_with,
};
use std::ops::ControlFlow;
use std::sync::LazyLock;

fn life(mass_msun: f64, metallicity_dex: f64, resolution: Resolution, surface: SurfaceOpacity) -> Life {
    let options = Options { resolution, surface };
    let input = ConvectiveInput { mass_msun, metallicity_dex };
    compute_with(input, options, &mut |_| ControlFlow::Continue(())).expect("a mass and metallicity in range")
}

macro_rules! lives {
    ($($name:ident: $mass:expr, $metallicity:expr, $resolution:ident, $surface:ident;)*) => {
        $(pub(crate) static $name: LazyLock<Life> = LazyLock::new(|| life($mass, $metallicity, Resolution::$resolution, SurfaceOpacity::$surface));)*
    };
}

lives! {
    M008: 0.08, 0.0, Standard, Modern;
    M010: 0.10, 0.0, Standard, Modern;
    M015: 0.15, 0.0, Coarse, Modern;
    M020: 0.20, 0.0, Coarse, Modern;
    M030: 0.30, 0.0, Standard, Modern;
    M040: 0.40, 0.0, Coarse, Modern;
    // log₁₀(0.02/0.0153): the metals of the 1997 calculations.
    M010_OF_1997: 0.10, 0.1163, Coarse, Of1997;
}

/// The star this many years after its birth.
pub(crate) fn since_birth(life: &Life, years: f64) -> Node {
    life.at_age(years - life.contraction_yr).expect("an age within the life")
}

/// The brightest moment after arrival on the main sequence.
pub(crate) fn brightest(life: &Life) -> &Node {
    let grown = life.nodes.iter().filter(|node| node.age_yr >= 0.0);
    grown.max_by(|a, b| a.luminosity_lsun.total_cmp(&b.luminosity_lsun)).expect("nodes")
}

/// The hottest surface after arrival on the main sequence, K.
pub(crate) fn hottest_k(life: &Life) -> f64 {
    life.nodes.iter().filter(|node| node.age_yr >= 0.0).map(|node| node.effective_temperature_k).fold(0.0, f64::max)
}
