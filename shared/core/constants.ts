/**
 * The constants of the method, each once and each with its source (method section 16).
 * Nothing here may be typed a second time elsewhere: import it.
 */

/** Standard acceleration of gravity [m/s²]: 3rd CGPM 1901, resolution 2 (exact by definition). */
export const STANDARD_GRAVITY_M_PER_S2 = 9.80665;

/** Kilometres per hour in one metre per second (exact). */
export const KMH_PER_MS = 3.6;

/** Joules in one watt-hour (exact). */
export const JOULES_PER_WATT_HOUR = 3600;

/** Metres in one kilometre, watt-hours in one kilowatt-hour: the SI prefix kilo. */
export const KILO = 1000;

/** Kilometres in one international mile: international yard and pound agreement 1959 (exact). */
export const KM_PER_MILE = 1.609344;

/** Effective mass of vehicle and rotating parts over the vehicle's mass: UN GTR No. 15, Annex 7 (memory). A default, not a law. */
export const DEFAULT_ROTATING_FACTOR = 1.03;

/** c_f = 0.455/(log10 Re)^2.58: Prandtl–Schlichting, smooth plate, turbulent (Schlichting, Boundary-Layer Theory). */
export const SKIN_FRICTION = { factor: 0.455, exponent: 2.58 } as const;

/** Reynolds numbers at or below this are mistyped, not tested: the turbulent friction line says nothing about them. */
export const SKIN_FRICTION_MIN_REYNOLDS = 1000;

/** A Reynolds sweep needs this many points and this ratio of its highest to its lowest Reynolds number: method section 6. */
export const SWEEP_MIN_POINTS = 4;
export const SWEEP_MIN_RATIO = 1.5;

/** From this many pairs on a correlation has a slope, below it an offset alone: method section 8. */
export const CORRELATION_LINE_PAIRS = 5;

/** Half-step of every central difference in drag area [m²]: method section 13. */
export const EXCHANGE_RATE_STEP_M2 = 0.001;

/** One count: 0.001 in the drag coefficient on a named area (road-vehicle practice, not the aeronautical 0.0001). */
export const COUNT = 0.001;

/** Kelvin at 0 °C: definition of the degree Celsius (exact). */
export const CELSIUS_ZERO_K = 273.15;

/** Molar gas constant [J/(mol·K)] as printed in CIPM-2007 (Picard et al., Metrologia 45 (2008) 149), not the later exact one. */
export const MOLAR_GAS_CONSTANT_CIPM_2007 = 8.314472;

/** Molar mass of dry air [kg/mol] at 400 µmol/mol CO2: CIPM-2007, table 1 and equation 2. */
export const MOLAR_MASS_DRY_AIR_KG_PER_MOL = 28.96546e-3;

/** Molar mass of water [kg/mol]: CIPM-2007. */
export const MOLAR_MASS_WATER_KG_PER_MOL = 18.01528e-3;

/** Range in which CIPM-2007 is stated to hold: about 15 to 27 °C and 600 to 1100 hPa (memory). */
export const CIPM_2007_RANGE = { minC: 15, maxC: 27, minPa: 60000, maxPa: 110000 } as const;

/** Sutherland's β_s [kg/(m·s·K^½)] and S [K] for air: U.S. Standard Atmosphere 1976, ISO 2533. */
export const SUTHERLAND_AIR = { beta: 1.458e-6, temperatureK: 110.4 } as const;

/** Sutherland's S [K] for nitrogen in a cooled tunnel: 111 K, as commonly tabulated (memory). */
export const SUTHERLAND_NITROGEN_TEMPERATURE_K = 111;

/** Nothing is promised for a cooled tunnel below this [K]: the gas is near its liquid, and Sutherland's law ends (method section 15). */
export const COLDEST_PLANNED_GAS_K = 100;

/** Specific gas constant of dry air [J/(kg·K)]: ISO 2533. */
export const SPECIFIC_GAS_CONSTANT_AIR = 287.05287;

/** Ratio of specific heats of air: ISO 2533. */
export const HEAT_CAPACITY_RATIO_AIR = 1.4;

/** Beyond these air is taken to be mistyped: method section 1. */
export const AIR_LIMITS = { minC: -40, maxC: 60, minPa: 3e4, maxPa: 1e6 } as const;

/**
 * Reference states of air, temperature [K], static pressure [Pa] and density [kg/m³]; a density of null is p/(R·T).
 * ISO 2533 sea level; UN GTR No. 15, paragraph 3.2.9; SAE J2263; 40 CFR 1066.305 with the density that 1066.310 prints.
 */
export const REFERENCE_AIR = {
  'iso-2533-sea-level': { temperatureK: 288.15, pressurePa: 101325, densityKgM3: 1.225 },
  'un-gtr-15': { temperatureK: 293, pressurePa: 100000, densityKgM3: 1.189 },
  'sae-j2263': { temperatureK: 293.15, pressurePa: 98210, densityKgM3: null },
  'cfr-1066-as-printed': { temperatureK: 293.15, pressurePa: 98210, densityKgM3: 1.17 },
} as const;

/** Wind speed of the wind average [m/s]: 7 mph, SAE J1252 (memory). */
export const DEFAULT_WIND_SPEED_MS = 3.12928;

/** Angles equal to this many degrees are one: method section 7. */
export const ANGLE_TOLERANCE_DEG = 1e-9;

/** Two speeds are one when they differ by no more than this fraction: rounding of units, never a setting of a facility. */
export const SPEED_TOLERANCE = 1e-9;

/** Amounts and uncertainties below this [m²] count as none: method section 9. */
export const AMOUNT_FLOOR_M2 = 1e-15;

/** Probability of the coverage factor, one-sided; its normal quantile is 2.00000 (JCGM 100:2008, annex G, k = 2). */
export const COVERAGE_PROBABILITY = 0.97725;

/** Confidence from which two figures count as separable, unless the programme says otherwise: method section 14. */
export const DEFAULT_CONFIDENCE = 0.95;

/** Draws for P(lowest) and the outputs of the generator that are dropped first: method section 14. */
export const LOWEST_DRAWS = 20000;
export const GENERATOR_WARM_UP = 12;

/**
 * Limits that a programme may set otherwise (policies). Mach 0.2 and 0.3: common practice; blockage of closed sections 0.05
 * (SAE J1252, memory) and 0.10 (older road-vehicle practice, memory); open jets 0.35 of the nozzle: Regulation (EU)
 * 2017/1151, Annex XXI, Sub-Annex 4; minimum Reynolds number 2e6 on the characteristic length: common practice, no source;
 * friction share 0.12 ± 0.06 (memory).
 */
export const DEFAULT_POLICIES = {
  machCaution: 0.2,
  machExcluded: 0.3,
  blockageCaution: 0.05,
  blockageExcluded: 0.1,
  openJetLimit: 0.35,
  minimumReynolds: 2e6,
  frictionLine: 'on',
  frictionShare: 0.12,
  frictionShareU: 0.06,
  reynoldsToleranceM2: 0.005,
} as const;

/**
 * Limits of the checks that an organisation may set otherwise, beyond those of the method itself. All of them are common
 * practice without a source: sweeps to 10° of yaw; 0.5 % scatter of repeated readings; a hall between 15 and 30 °C at the
 * pressures of places below 700 m; a lift coefficient up to 0.25 per axle; what road cars of a body shape usually have.
 */
export const DEFAULT_CHECK_LIMITS = {
  yawCoverageDeg: 10,
  repeatabilityCaution: 0.005,
  airTemperatureC: { from: 15, to: 30 },
  airPressurePa: { from: 93000, to: 105000 },
  frontLiftLimit: 0.25,
  rearLiftLimit: 0.25,
  plausible: [
    { bodyShape: 'hatch', dragCoefficient: { from: 0.22, to: 0.42 }, frontalAreaM2: { from: 1.8, to: 2.6 } },
    { bodyShape: 'liftback', dragCoefficient: { from: 0.2, to: 0.4 }, frontalAreaM2: { from: 1.8, to: 2.6 } },
    { bodyShape: 'saloon', dragCoefficient: { from: 0.19, to: 0.4 }, frontalAreaM2: { from: 1.8, to: 2.6 } },
    { bodyShape: 'estate', dragCoefficient: { from: 0.21, to: 0.42 }, frontalAreaM2: { from: 1.8, to: 2.7 } },
    {
      bodyShape: 'crossover',
      dragCoefficient: { from: 0.23, to: 0.48 },
      frontalAreaM2: { from: 2, to: 3.2 },
    },
    { bodyShape: 'coupe', dragCoefficient: { from: 0.19, to: 0.42 }, frontalAreaM2: { from: 1.6, to: 2.4 } },
    { bodyShape: 'van', dragCoefficient: { from: 0.25, to: 0.55 }, frontalAreaM2: { from: 2.2, to: 6 } },
    { bodyShape: 'pickup', dragCoefficient: { from: 0.28, to: 0.6 }, frontalAreaM2: { from: 2.2, to: 3.8 } },
    { bodyShape: 'other', dragCoefficient: { from: 0.1, to: 1.2 }, frontalAreaM2: { from: 0.02, to: 12 } },
  ],
} as const;

/** A quoted area outside these multiples of the variant's frontal area is another area: method section 11. */
export const QUOTED_AREA_RANGE = { from: 0.8, to: 1.25 } as const;
