//! Turning points of red dwarfs against a second calculation.
//!
//! Nobody has published these turning points with modern surfaces in print. The check values come from a program of its
//! own that solves the same equations with other means (equation of state with numerical slopes, full published opacity
//! tables instead of the compact fit, a fixed mesh of 260 shells); its own numerical error is 1 %. They tell errors of the
//! numbers, not of the physics: that is what the comparisons with Baraffe et al. 2015 and Laughlin, Bodenheimer & Adams
//! 1997 are for.

use crate::red_dwarf_lives::{M008, M010, M015, M020, M030, brightest, hottest_k};
use longember::physics::star::convective::{Life, Node};

/// What is compared, ages counted from birth.
struct Row {
    mass_msun: f64,
    life: &'static Life,
    /// Core at rest, hydrogen at the centre below 1 %, trillions of years.
    core_tyr: [f64; 2],
    /// Greatest luminosity and its age, hottest surface, years above half of that luminosity; of stars that become no
    /// giants.
    peak: Option<[f64; 4]>,
    /// Radius of the white dwarf at 3000 K, and billions of years from the peak to there.
    dwarf: Option<[f64; 2]>,
}

fn rows() -> [Row; 5] {
    let row = |mass_msun, life, core_tyr, peak, dwarf| Row { mass_msun, life, core_tyr, peak, dwarf };
    [
        row(0.08, &*M008, [5.64, 5.862], Some([0.00203, 6.062, 4451.0, 2980.0]), Some([0.0364, 307.0])),
        row(0.10, &*M010, [3.56, 3.795], Some([0.00941, 3.943, 6165.0, 114.0]), Some([0.0310, 157.0])),
        row(0.15, &*M015, [1.80, 2.030], Some([0.2756, 2.109, 11074.0, 5.23]), Some([0.0249, 54.0])),
        row(0.20, &*M020, [1.04, 1.264], Some([4.371, 1.322, 18437.0, 0.375]), Some([0.0218, 35.0])),
        row(0.30, &*M030, [0.29, 0.507], None, None),
    ]
}

fn adult(life: &'static Life) -> impl Iterator<Item = &'static Node> {
    life.nodes.iter().filter(|node| node.age_yr >= 0.0)
}

/// Age of the first such moment since birth, trillions of years.
fn first_tyr(life: &'static Life, is: impl Fn(&Node) -> bool) -> f64 {
    let node = adult(life).find(|node| is(node)).expect("it comes");
    (node.age_yr + life.contraction_yr) / 1e12
}

fn within(what: &str, mass: f64, ours: f64, other: f64) {
    assert!((ours / other - 1.0).abs() < 0.05, "{what} of {mass}: {ours} against {other}");
}

#[test]
fn the_core_comes_to_rest_and_is_spent_when_a_second_calculation_says() {
    for Row { mass_msun, life, core_tyr, .. } in rows() {
        within("rest", mass_msun, first_tyr(life, |node| node.still_core_mass_fraction > 0.0), core_tyr[0]);
        within("spent core", mass_msun, first_tyr(life, |node| node.core_hydrogen_fraction < 0.01), core_tyr[1]);
    }
}

#[test]
fn the_last_blaze_is_as_bright_hot_and_long_as_a_second_calculation_says() {
    for Row { mass_msun, life, peak, .. } in rows() {
        let Some([luminosity, age_tyr, hottest, years]) = peak else { continue };
        let top = brightest(life);
        within("peak", mass_msun, top.luminosity_lsun, luminosity);
        within("age of the peak", mass_msun, (top.age_yr + life.contraction_yr) / 1e12, age_tyr);
        within("hottest surface", mass_msun, hottest_k(life), hottest);
        let half = 0.5 * top.luminosity_lsun;
        let nodes: Vec<&Node> = adult(life).collect();
        let bright_yr: f64 = nodes.windows(2).map(|pair| bright_years(pair[0], pair[1], half)).sum();
        within("years above half of the peak", mass_msun, bright_yr / 1e9, years);
    }
}

/// Years between two moments in which the star is brighter than a luminosity, on a straight line between them.
fn bright_years(before: &Node, after: &Node, luminosity: f64) -> f64 {
    let (a, b) = (before.luminosity_lsun - luminosity, after.luminosity_lsun - luminosity);
    let share = match (a > 0.0, b > 0.0) {
        (true, true) => 1.0,
        (false, false) => 0.0,
        (true, false) => a / (a - b),
        (false, true) => b / (b - a),
    };
    share * (after.age_yr - before.age_yr)
}

#[test]
fn the_white_dwarf_shrinks_and_cools_as_a_second_calculation_says() {
    for Row { mass_msun, life, dwarf, .. } in rows() {
        let Some([radius, years]) = dwarf else { continue };
        let top = brightest(life);
        let nodes: Vec<&Node> = adult(life).skip_while(|node| node.age_yr < top.age_yr).collect();
        let warm = |node: &Node| node.effective_temperature_k > 3000.0;
        // The faintest of these stars leave their peak colder than others shine.
        let cold = nodes.iter().rposition(|node| warm(node)).expect("it was warm") + 1;
        let [before, after] = [nodes[cold - 1], nodes[cold]];
        let share = (before.effective_temperature_k / 3000.0).ln()
            / (before.effective_temperature_k / after.effective_temperature_k).ln();
        let at = |value: fn(&Node) -> f64| value(before) + share * (value(after) - value(before));
        within("radius at 3000 K", mass_msun, at(|node| node.radius_rsun), radius);
        within("cooling to 3000 K", mass_msun, (at(|node| node.age_yr) - top.age_yr) / 1e9, years);
    }
}
