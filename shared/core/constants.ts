/**
 * The constants of the method, each once and each with its source (method section 16).
 * Nothing here may be typed a second time elsewhere: import it.
 */

/** Standard acceleration of gravity [m/s²]: 3rd CGPM 1901, resolution 2 (exact by definition). */
export const STANDARD_GRAVITY_M_PER_S2 = 9.80665;

/** Kilometres per hour in one metre per second (exact). */
export const KMH_PER_MS = 3.6;

/** Kilometres in one international mile: international yard and pound agreement 1959 (exact). */
export const KM_PER_MILE = 1.609344;

/** Effective mass of vehicle and rotating parts over the vehicle's mass: UN GTR No. 15, Annex 7 (memory). A default, not a law. */
export const DEFAULT_ROTATING_FACTOR = 1.03;

/** Half-step of every central difference in drag area [m²]: method section 13. */
export const EXCHANGE_RATE_STEP_M2 = 0.001;

/** One count: 0.001 in the drag coefficient on a named area (road-vehicle practice, not the aeronautical 0.0001). */
export const COUNT = 0.001;
