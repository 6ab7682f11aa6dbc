//! The words of the file form.

/// The version of the form that is written, and the newest that is read.
///
/// A change that old files can't be read under gets the next number, and a step in the reader that
/// turns the tree of the version before into its own.
pub const CURRENT_VERSION: u32 = 1;

/// The name of the outermost struct.
pub(super) const SCENARIO: &str = "Longember";
pub(super) const SCENARIO_KEYS: &[&str] = &["version", "title", "about", "star", "planets", "statements", "cues"];
pub(super) const STAR_KEYS: &[&str] = &["name", "mass_msun", "metallicity_dex", "present_age_yr", "red_dwarf_surface"];
/// In the order of `specification::RED_DWARF_SURFACES`.
pub(super) const SURFACES: &[&str] = &["Modern", "Of1997"];
pub(super) const PLANET_KEYS: &[&str] = &[
    "name",
    "semi_major_axis_au",
    "eccentricity",
    "mass_mearth",
    "radius_rearth",
    "bond_albedo",
    "redistribution",
    "emissivity",
    "greenhouse",
    "air",
    "climate",
    "tides",
    "initial_day_h",
    "marked_temperature_k",
];
pub(super) const GREENHOUSES: &[&str] = &["None", "FixedIncrement", "Grey"];
pub(super) const FIXED_INCREMENT_KEYS: &[&str] = &["increment_k"];
pub(super) const GREY_KEYS: &[&str] = &["optical_depth"];
/// In the order of `Air::KINDS`.
pub(super) const AIRS: &[&str] = &["Airless", "EarthLike", "CarbonDioxide"];
pub(super) const AIR_KEYS: &[&str] = &["surface_pressure_bar"];
pub(super) const CLIMATES: &[&str] = &["None", WATER_WORLD];
pub(super) const WATER_WORLD: &str = "WaterWorld";
pub(super) const WATER_KEYS: &[&str] =
    &["carbon_dioxide", "water_oceans", "obliquity_deg", "heat_transport_w_m2_k", "starts_frozen", "ocean_after_yr"];
/// In the order of `Carbon::KINDS`.
pub(super) const CARBONS: &[&str] = &["Regulated", "Held"];
pub(super) const REGULATED_KEYS: &[&str] = &["mean_k"];
pub(super) const HELD_KEYS: &[&str] = &["carbon_dioxide_bar"];
/// In the order of `TidesChoice::ALL`.
pub(super) const TIDES: &[&str] = &["On", "Off"];
/// In the order of `Redistribution::ALL`.
pub(super) const REDISTRIBUTIONS: &[&str] = &["WholePlanet", "DaySide", "DaySideFullPhase", "SubStellar"];
pub(super) const STATEMENT_KEYS: &[&str] = &["claim", "note"];
pub(super) const CUE_KEYS: &[&str] = &["show_time_s", "moment", "transition", "note"];
/// In the order of `Transition::ALL`.
pub(super) const TRANSITIONS: &[&str] = &["Cut", "Steady", "SteadyLog", "Paced"];
