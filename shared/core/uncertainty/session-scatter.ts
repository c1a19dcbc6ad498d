/**
 * How much the sessions of a facility scatter, from readings of one unchanging body: a one-way random model,
 * reading = truth + session + within. Sources: ISO 5725-2, clause 7 (unequal numbers); NIST/SEMATECH e-Handbook of
 * Statistical Methods, 7.4.3 and 7.4.4.
 */

/** One measurement: the mean of `n` readings (1 where absent), `s` the standard deviation of a single one. */
export interface BodyMeasurement {
  readonly dragAreaM2: number;
  readonly s?: number | undefined;
  readonly n?: number | undefined;
}

/** The readings of one session together. */
export interface SessionReadings {
  /** Readings, counted by `n`. */
  readonly count: number;
  /** Mean over the readings [m²]. */
  readonly meanM2: number;
  /** Sum of squares about that mean [m⁴], as far as the scatter of the readings is known. */
  readonly withinSquares: number;
  readonly withinDegreesOfFreedom: number;
}

export interface SessionScatter {
  /** Plain mean of the session means [m²]: a session with many readings weighs no more than another. */
  readonly centreM2: number;
  /** Standard deviation within sessions, pooled over them [m²]; null where no session holds two readings. */
  readonly withinM2: number | null;
  readonly withinDegreesOfFreedom: number;
  /**
   * Standard deviation from session to session [m²], without what the readings scatter; 0 where the sessions differ by
   * no more than that. Where the scatter within is not known it is contained here, and the value is an upper one.
   */
  readonly betweenM2: number;
  /** ν of `betweenM2` after Satterthwaite, at most the number of sessions − 1; 0 where it is 0. */
  readonly betweenDegreesOfFreedom: number;
  /** Mean squares between and within, as an analysis of variance prints them. */
  readonly meanSquareBetween: number;
  readonly meanSquareWithin: number | null;
}

/** The readings of one session; at least one measurement. */
export function sessionReadings(measurements: readonly BodyMeasurement[]): SessionReadings {
  let count = 0;
  let sum = 0;
  for (const { dragAreaM2, n = 1 } of measurements) {
    count += n;
    sum += n * dragAreaM2;
  }
  const meanM2 = sum / count;
  let withinSquares = 0;
  let withinDegreesOfFreedom = measurements.length - 1;
  for (const { dragAreaM2, s, n = 1 } of measurements) {
    withinSquares += n * (dragAreaM2 - meanM2) ** 2;
    if (s !== undefined && n > 1) {
      withinSquares += (n - 1) * s * s;
      withinDegreesOfFreedom += n - 1;
    }
  }
  return { count, meanM2, withinSquares, withinDegreesOfFreedom };
}

function sumOf<T>(items: readonly T[], valueOf: (item: T) => number): number {
  return items.reduce((sum, item) => sum + valueOf(item), 0);
}

/**
 * The scatter of at least two sessions. Satterthwaite's ν of a difference of mean squares:
 * (MS_b − MS_w)²/(MS_b²/(k − 1) + MS_w²/ν_w).
 */
export function sessionScatter(sessions: readonly SessionReadings[]): SessionScatter {
  const readings = sumOf(sessions, ({ count }) => count);
  const overall = sumOf(sessions, ({ count, meanM2 }) => count * meanM2) / readings;
  const freeSessions = sessions.length - 1;
  const between = sumOf(sessions, ({ count, meanM2 }) => count * (meanM2 - overall) ** 2) / freeSessions;
  const perSession = (readings - sumOf(sessions, ({ count }) => count * count) / readings) / freeSessions;
  const withinNu = sumOf(sessions, ({ withinDegreesOfFreedom }) => withinDegreesOfFreedom);
  const within = withinNu > 0 ? sumOf(sessions, ({ withinSquares }) => withinSquares) / withinNu : null;
  const excess = Math.max(0, between - (within ?? 0));
  return {
    centreM2: sumOf(sessions, ({ meanM2 }) => meanM2) / sessions.length,
    withinM2: within === null ? null : Math.sqrt(within),
    withinDegreesOfFreedom: withinNu,
    betweenM2: Math.sqrt(excess / perSession),
    betweenDegreesOfFreedom:
      excess === 0
        ? 0
        : (excess * excess) /
          ((between * between) / freeSessions + (within === null ? 0 : (within * within) / withinNu)),
    meanSquareBetween: between,
    meanSquareWithin: within,
  };
}
