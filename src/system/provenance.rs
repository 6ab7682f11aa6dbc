//! Where every figure comes from: method, paper, range and accuracy, in one table.

/// How a figure is made, and how far it can be trusted.
#[derive(Debug)]
pub struct Method {
    /// Stable machine name.
    pub key: &'static str,
    /// Name for people.
    pub name: &'static str,
    /// The relation, in one or two sentences with its formula.
    pub relation: &'static str,
    /// Authors, year, journal; `Own choice` where it is ours.
    pub source: &'static str,
    /// Where it holds.
    pub valid_for: &'static str,
    /// How good it is, and how that is known.
    pub accuracy: &'static str,
}

/// Every method in use.
pub const METHODS: &[Method] = &[
    Method {
        key: "star_life",
        name: "Life of the star",
        relation: "Luminosity, radius and core mass follow published fits to a grid of evolution models, stage by stage from the zero-age main sequence to the loss of the envelope or the collapse of the core. The metallicity that stands for [Fe/H] = 0 is set so that 1 M☉ has 1.000 L☉ at 4.57 Gyr.",
        source: "Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257 (zero-age main sequence); Hurley, Pols & Tout 2000, MNRAS 315, 543 (later stages); calibration to the Sun: own choice",
        valid_for: "0.5 to 50 M☉ and Z from 0.0001 to 0.03; 0.35 to 0.5 M☉ and 50 to 100 M☉ are smooth extrapolations of the fits",
        accuracy: "within 5 % of the fitted models in luminosity, radius and lifetime; no rotation, no companion, no contraction before the main sequence",
    },
    Method {
        key: "effective_temperature",
        name: "Effective temperature",
        relation: "T = 5772 K (L/R²)^¼ with L and R in solar units.",
        source: "Stefan–Boltzmann law with the nominal solar values of IAU 2015 Resolution B3",
        valid_for: "any luminosity and radius",
        accuracy: "exact by definition; carries the spread of luminosity and radius",
    },
    Method {
        key: "star_winds",
        name: "Mass loss",
        relation: "Winds by stage: hot and luminous stars, red giants (η = 0.5), the superwind of the asymptotic giant branch, helium stars and stars near the limit of stability.",
        source: "Nieuwenhuijzen & de Jager 1990, A&A 231, 134; Kudritzki & Reimers 1978, A&A 70, 227; Vassiliadis & Wood 1993, ApJ 413, 641; Hamann, Koesterke & Wessolowski 1995, A&A 299, 151; Humphreys & Davidson 1994, PASP 106, 1025",
        valid_for: "the stages each was measured in",
        accuracy: "a factor of about 2; final masses of 1 to 8 M☉ agree with the measured initial-final mass relation within about 10 % (Cummings et al. 2018, ApJ 866, 21)",
    },
    Method {
        key: "white_dwarf",
        name: "Cooling of white dwarfs",
        relation: "Effective temperature and age are read from published cooling sequences for carbon-oxygen cores with hydrogen skins; beyond their end the temperature falls exponentially, as for a crystal whose heat capacity vanishes, down to that of the sky.",
        source: "Bédard, Bergeron, Brassard & Fontaine 2020, ApJ 901, 93 (sequences); continuation: own choice",
        valid_for: "0.2 to 1.2 M☉ down to about 1500 K; colder and heavier ones are extrapolated",
        accuracy: "about 10 % in age while published sequences last; the continuation is speculative",
    },
    Method {
        key: "remnant",
        name: "Neutron stars and black holes",
        relation: "The mass of the remnant follows from the carbon-oxygen core and the total mass at collapse, with delayed explosions. Its light is not modelled.",
        source: "Fryer et al. 2012, ApJ 749, 91",
        valid_for: "stars whose core collapses, about 8 to 100 M☉ at birth",
        accuracy: "the border between neutron stars and black holes is uncertain by several solar masses at birth",
    },
    Method {
        key: "core_hydrogen",
        name: "Hydrogen left in the core",
        relation: "From 0.4 M☉ up the fits carry no composition: the share of hydrogen is taken to fall evenly with time, from its value at birth to zero when the core is spent. Red dwarfs have it from the structure calculation.",
        source: "Own choice, held to the present Sun (0.35 at its centre); red dwarfs as the life of the star",
        valid_for: "the main sequence",
        accuracy: "about 0.05 in the share of hydrogen at mid-life",
    },
    Method {
        key: "blackbody",
        name: "Light and colour",
        relation: "The star shines like a blackbody at its effective temperature; its colour is what the standard observer sees, shown unadapted on a display with a daylight white. Below 798 K there is no visible glow.",
        source: "Planck's law; CIE 1931 2° observer (ISO/CIE 11664-1); sRGB (IEC 61966-2-1); peak by Wien's law; Draper 1847 (798 K)",
        valid_for: "any temperature; cool dwarfs and giants have molecular bands that a blackbody lacks",
        accuracy: "chromaticity within 0.00001 of finer tables for the blackbody itself",
    },
    Method {
        key: "spectrum",
        name: "Spectrum and its shares",
        relation: "Spectral radiance by Planck's law; its peak per unit wavelength at 2.898 mm K / T, per unit frequency at 58.79 GHz/K · T; shares of ultraviolet (below 380 nm), visible and infrared (above 780 nm) by the integral of Planck's law as a series; all radiation of a square metre σ T⁴.",
        source: "Planck 1901, Annalen der Physik 309, 553; Wien's and the Stefan–Boltzmann law with the SI constants of 2019; series: Wiebelt 1966, Engineering Radiation Heat Transfer; cuts as CIE 15",
        valid_for: "any temperature from 1 K to 10⁹ K; lines, molecular bands and flares of real stars are left out",
        accuracy: "exact for the blackbody; real red dwarfs give up to twice the blackbody's infrared near 1000 nm and little blue",
    },
    Method {
        key: "photometry",
        name: "Brightness to the eye",
        relation: "Planck's law weighted with the eye's response V(λ), 683 lm/W at its peak: lumens in a watt (efficacy), luminance of the star's surface, light of the whole star, and illuminance above a planet's air, mean over its orbit.",
        source: "CIE 1924 V(λ) (ISO/CIE 11664-1); photometric units: SI 2019",
        valid_for: "light that no air or dust has filtered; luminance belongs to each patch of the surface, so that a red giant is dim per area however luminous it is",
        accuracy: "exact for the blackbody within 0.0001; the real Sun gives 133 100 lx at 1 au (ASTM G173 spectrum), 6 % more than its blackbody's 125 300 lx",
    },
    Method {
        key: "colour_numbers",
        name: "Colour for screens and projectors",
        relation: "The same colour in CIE 1976 u', v'; linear Rec. 709, P3-D65 and Rec. 2020 with the largest channel 1 and negative channels kept; encoded sRGB and Display P3, where a colour outside the screen is brought in at constant hue; the temperature of the nearest blackbody, and the distance from it (Duv, positive towards green).",
        source: "ITU-R BT.709-6, SMPTE EG 432-1, ITU-R BT.2020-2; IEC 61966-2-1; gamut mapping: W3C CSS Color Module 4, section 13; correlated temperature: CIE 15:2018",
        valid_for: "screens whose white is D65, with no adaptation to the star; correlated temperatures from 500 K to 10⁶ K, ill-conditioned above 50 000 K",
        accuracy: "one step of 255 in encoded colours; 0.1 K in correlated temperatures up to 10 000 K",
    },
    Method {
        key: "measured_dwarfs",
        name: "Colour of measured dwarfs",
        relation: "Chromaticity of measured spectra of main-sequence dwarfs, between types in proportion to the logarithm of temperature, beside the blackbody's; their difference as CIEDE2000 at equal luminance, of which 1 is just noticeable.",
        source: "Spectra: Pickles 1998, PASP 110, 863; temperatures of the types: Pecaut & Mamajek 2013, ApJS 208, 9 (version 2019.3.22); difference: CIE 142-2001",
        valid_for: "main-sequence stars of 2850 to 41 500 K (M6 to O5) and solar composition; nothing is shown outside",
        accuracy: "single spectra of one type scatter by about 0.01 in x; A and F dwarfs are bluer than their blackbody, middle and late M dwarfs more yellow",
    },
    Method {
        key: "magnitudes",
        name: "Magnitudes in V and B − V",
        relation: "M = −2.5 log₁₀(L / 3.0128 × 10²⁸ W), V = M − BC + 5 log₁₀(d / 10 pc), without dust on the way. B − V and BC from a table for dwarfs, from polynomials for giants (log g below 3.5), from a blackbody through the passbands for white dwarfs and the hottest stars.",
        source: "IAU 2015 Resolution B2; dwarfs: Pecaut & Mamajek 2013, ApJS 208, 9 (B − V v2019.3.22, BC v2022.04.16); giants: Flower 1996, ApJ 469, 355, as corrected by Torres 2010, AJ 140, 1158; passbands: Bessell 1990, PASP 102, 1181",
        valid_for: "solar composition; dwarfs 2500 to 41 500 K, giants 2900 to 33 000 K; no V below",
        accuracy: "0.05 mag for dwarfs of 4000 to 10 000 K, 0.1 to 0.5 mag outside; the Sun from 1 au −26.75, observed −26.76 ± 0.03 (Torres 2010)",
    },
    Method {
        key: "insolation",
        name: "Insolation",
        relation: "S = L / (a² √(1 − e²)) in solar luminosities and au: the mean over one orbit, 1 for the Earth.",
        source: "Inverse-square law; the Earth's 1361.17 W m⁻² from IAU 2015 nominal values",
        valid_for: "any closed orbit outside the star",
        accuracy: "exact for given luminosity and orbit",
    },
    Method {
        key: "equilibrium_temperature",
        name: "Equilibrium temperature",
        relation: "T = [f (1 − A) S / (ε σ)]^¼ with Bond albedo A, redistribution f and emissivity ε.",
        source: "Energy balance with the Stefan–Boltzmann law",
        valid_for: "any insolation; albedo and emissivity are held fixed by the user",
        accuracy: "exact for a uniformly radiating surface; reproduces published planetary fact sheets within 0.2 K",
    },
    Method {
        key: "surface_temperature",
        name: "Surface temperature",
        relation: "The equilibrium temperature with the chosen greenhouse effect (none, a fixed increment, or T⁴ = T_eq⁴ (1 + ¾τ) for a grey atmosphere); inner heat like the Earth's and the cosmic background keep it from falling to zero.",
        source: "Grey atmosphere in the Eddington approximation; Fixsen 2009, ApJ 707, 916 (background); Planck Collaboration 2020, A&A 641, A6 (expansion); decline of inner heat: own choice",
        valid_for: "planets whose air does not change; no ice, no runaway, no lost oceans",
        accuracy: "as good as the greenhouse value the user holds fixed",
    },
    Method {
        key: "habitable_zone",
        name: "Habitable zone",
        relation: "Distances at which starlight equals the runaway and the maximum greenhouse limit, d = √(L/S).",
        source: "Kopparapu et al. 2014, ApJL 787, L29",
        valid_for: "stars of 2600 to 7200 K; outside, the end value is used and marked as extrapolated",
        accuracy: "one-dimensional cloudless models; about 10 % in flux against three-dimensional ones",
    },
    Method {
        key: "orbit",
        name: "Orbit through the star's life",
        relation: "The orbit widens as the star loses mass, a M = constant; mass lost at once in a supernova stretches or unbinds it. A planet is swallowed when the star's radius passes its periastron.",
        source: "Adiabatic invariance (Jeans 1924; Veras et al. 2011, MNRAS 417, 2104); sudden loss: Blaauw 1961, BAN 15, 265",
        valid_for: "winds slower than an orbit; no pull between planets, no kick to the remnant, no tides",
        accuracy: "exact for slow winds; tides would pull planets within about 1.5 giant radii inward",
    },
    Method {
        key: "period",
        name: "Orbital period",
        relation: "P² = a³ / M in years, au and solar masses.",
        source: "Kepler's third law with IAU 2015 nominal masses",
        valid_for: "any closed orbit",
        accuracy: "exact for two bodies",
    },
    Method {
        key: "angular_diameter",
        name: "Star in the planet's sky",
        relation: "δ = 2 arcsin(R/d) at the semi-major axis.",
        source: "Geometry",
        valid_for: "planets outside the star",
        accuracy: "exact for given radius and distance",
    },
    Method {
        key: "photons",
        name: "Photons and ultraviolet",
        relation: "Photons between 400 and 700 nm, which photosynthesis as on Earth can use, and the ultraviolet bands A (315 to 400 nm), B (280 to 315 nm) and C (100 to 280 nm), above the planet's air, as Planck's law shares them out.",
        source: "McCree 1972, Agricultural Meteorology 9, 191; ISO 21348:2007; Planck's law",
        valid_for: "the photosphere's light above the air; cool stars add flares and far ultraviolet of their chromosphere, hot stars lack what their lines absorb",
        accuracy: "photons within a few per cent for Sun-like stars; ultraviolet B and C of cool stars can be wrong by orders of magnitude",
    },
    Method {
        key: "clear_sky",
        name: "Clear sky",
        relation: "Light scattered by clean air that absorbs nothing, averaged over the dome: two-stream solution with Rayleigh scattering, one over the air mass for the sine of the altitude, ground of albedo 0.2. The disc is dimmed by e^(−τX) through X air masses. Figures hold for the star 30° above the horizon unless another altitude is chosen.",
        source: "Eddington 1916, MNRAS 77, 16, in the form of Shettle & Weinman 1970, J. Atmos. Sci. 27, 1048; scattering by air: Bucholtz 1995, Applied Optics 34, 2765; by CO₂: Sneep & Ubachs 2005, JQSRT 92, 293; air mass: Kasten & Young 1989, Applied Optics 28, 4735; curved air: Dahlback & Stamnes 1991, Planet. Space Sci. 39, 671",
        valid_for: "deep, clean sky without dust, cloud, ozone or twilight; below 10° of altitude the path is that of the Earth's air; thick air is an average of the dome only",
        accuracy: "0.002 in x, y against scattering of all orders for the Earth's air; illuminance about 2 %; real skies are paler for dust and haze",
    },
    Method {
        key: "adapted_eye",
        name: "As emitted, and as an adapted eye sees it",
        relation: "As emitted: the colour as a camera balanced for daylight (D65) takes it. Adapted eye: cone responses scaled so that the star itself is white, which is what an eye does that has lived under it. The same sky can be beige in one and blue in the other.",
        source: "CAT16: Li et al. 2017, Color Research & Application 42, 703, with full adaptation",
        valid_for: "eyes like ours in daylight; below 5 cd/m² the eye loses colour (CIE 191:2010)",
        accuracy: "adaptation transforms differ from each other by 0.003 in x, y",
    },
];

/// The method of this key.
#[must_use]
pub fn method(key: &str) -> Option<&'static Method> {
    METHODS.iter().find(|method| method.key == key)
}
