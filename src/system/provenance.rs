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
        relation: "The initial share of hydrogen falls in step with the energy radiated so far, to zero at the end of the main sequence.",
        source: "Own choice, by energy conservation: the fits carry no composition",
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
];

/// The method of this key.
#[must_use]
pub fn method(key: &str) -> Option<&'static Method> {
    METHODS.iter().find(|method| method.key == key)
}
