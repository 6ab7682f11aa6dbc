//! Physical and astronomical constants, each with its standard.
//!
//! SI values. Names carry the unit; a name ending in `_cgs` would be an error here.

/// Nominal solar luminosity, W. Exact by convention: IAU 2015 Resolution B3.
pub const SOLAR_LUMINOSITY_W: f64 = 3.828e26;
/// Nominal solar radius, m. Exact by convention: IAU 2015 Resolution B3.
pub const SOLAR_RADIUS_M: f64 = 6.957e8;
/// Nominal solar mass parameter GM, m³ s⁻². Exact by convention: IAU 2015 Resolution B3.
pub const SOLAR_GM_M3_S2: f64 = 1.327_124_4e20;
/// Nominal solar effective temperature, K. IAU 2015 Resolution B3 (rounded from L and R).
pub const SOLAR_TEMPERATURE_K: f64 = 5772.0;
/// Nominal equatorial radius of the Earth, m. Exact by convention: IAU 2015 Resolution B3. This is the unit R⊕.
pub const EARTH_RADIUS_M: f64 = 6.3781e6;
/// Nominal mass parameter of the Earth GM, m³ s⁻². Exact by convention: IAU 2015 Resolution B3.
pub const EARTH_GM_M3_S2: f64 = 3.986_004e14;
/// Nominal equatorial radius of Jupiter, m. Exact by convention: IAU 2015 Resolution B3.
pub const JUPITER_RADIUS_M: f64 = 7.1492e7;
/// Nominal mass parameter of Jupiter GM, m³ s⁻². Exact by convention: IAU 2015 Resolution B3.
pub const JUPITER_GM_M3_S2: f64 = 1.266_865_3e17;
/// Luminosity of absolute bolometric magnitude zero, W. Exact by convention: IAU 2015 Resolution B2.
pub const BOLOMETRIC_ZERO_W: f64 = 3.0128e28;
/// Astronomical unit, m. Exact: IAU 2012 Resolution B2.
pub const AU_M: f64 = 149_597_870_700.0;
/// Parsec, m: 648 000/π au. Exact: IAU 2015 Resolution B2.
pub const PARSEC_M: f64 = 3.085_677_581_491_367e16;
/// Light-year, m: speed of light times one Julian year. Exact.
pub const LIGHT_YEAR_M: f64 = 9.460_730_472_580_8e15;
/// Julian year, s: 365.25 days. Exact: IAU recommendation (1989 style manual).
pub const YEAR_S: f64 = 31_557_600.0;
/// Speed of light in vacuum, m s⁻¹. Exact: SI 2019.
pub const LIGHT_SPEED_M_S: f64 = 299_792_458.0;
/// Planck constant, J s. Exact: SI 2019.
pub const PLANCK_J_S: f64 = 6.626_070_15e-34;
/// Boltzmann constant, J K⁻¹. Exact: SI 2019.
pub const BOLTZMANN_J_K: f64 = 1.380_649e-23;
/// Avogadro constant, mol⁻¹. Exact: SI 2019.
pub const AVOGADRO_PER_MOL: f64 = 6.022_140_76e23;
/// Elementary charge, C. Exact: SI 2019.
pub const ELEMENTARY_CHARGE_C: f64 = 1.602_176_634e-19;
/// Stefan–Boltzmann constant, W m⁻² K⁻⁴. Exact combination of SI constants, to f64: CODATA 2022.
pub const STEFAN_BOLTZMANN_W_M2_K4: f64 = 5.670_374_419_184_431e-8;
/// Wien displacement constant (wavelength), m K. Exact combination, to f64: CODATA 2022.
pub const WIEN_M_K: f64 = 2.897_771_955_185_172_7e-3;
/// Wien displacement constant (frequency), Hz K⁻¹. Exact combination, to f64: CODATA 2022.
pub const WIEN_HZ_K: f64 = 5.878_925_757_646_825e10;
/// Newtonian constant of gravitation, m³ kg⁻¹ s⁻². CODATA 2022, standard uncertainty 1.5e-15.
pub const GRAVITATION_M3_KG_S2: f64 = 6.674_30e-11;
/// Proton mass, kg. CODATA 2022, standard uncertainty 5.2e-37.
pub const PROTON_MASS_KG: f64 = 1.672_621_925_95e-27;
/// Atomic mass constant, kg. CODATA 2022, standard uncertainty 5.2e-37.
pub const ATOMIC_MASS_KG: f64 = 1.660_539_068_92e-27;
/// Electron mass, kg. CODATA 2022, standard uncertainty 2.8e-40.
pub const ELECTRON_MASS_KG: f64 = 9.109_383_713_9e-31;

/// Solar mass, kg: the nominal GM over G, so it inherits the uncertainty of G (2.2e-5).
pub const SOLAR_MASS_KG: f64 = SOLAR_GM_M3_S2 / GRAVITATION_M3_KG_S2;
/// Earth mass, kg: the nominal GM over G.
pub const EARTH_MASS_KG: f64 = EARTH_GM_M3_S2 / GRAVITATION_M3_KG_S2;
/// Jupiter mass, kg: the nominal GM over G.
pub const JUPITER_MASS_KG: f64 = JUPITER_GM_M3_S2 / GRAVITATION_M3_KG_S2;
/// Flux of one solar luminosity at one au, W m⁻²: 1361.17, derived from the constants above.
pub const SOLAR_CONSTANT_W_M2: f64 = SOLAR_LUMINOSITY_W / (4.0 * std::f64::consts::PI * AU_M * AU_M);
/// Earth masses in one solar mass (ratio of the nominal GM, free of G).
pub const EARTH_MASSES_PER_SOLAR_MASS: f64 = SOLAR_GM_M3_S2 / EARTH_GM_M3_S2;
/// Solar radius in au.
pub const SOLAR_RADIUS_AU: f64 = SOLAR_RADIUS_M / AU_M;
/// Earth radius in au.
pub const EARTH_RADIUS_AU: f64 = EARTH_RADIUS_M / AU_M;
