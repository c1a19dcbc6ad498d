import { AMOUNT_FLOOR_M2 } from '../constants';
import {
  sessionReadings,
  sessionScatter,
  type BodyMeasurement,
  type SessionReadings,
  type SessionScatter,
} from './session-scatter';

/** A session with what was measured of the check body in it. */
export interface ChartSession {
  readonly id: string;
  /** Day of the (first) measurement, `YYYY-MM-DD`: sessions are read in this order. */
  readonly date: string;
  readonly measurements: readonly BodyMeasurement[];
}

/** Half-widths of the limits in standard deviations of a session mean (ISO 7870-2, memory). */
export const WARNING_LIMIT = 2;
export const ACTION_LIMIT = 3;

/** Fewer sessions than this set no limits: from two alone any difference is as good as any other. */
export const FEWEST_SESSIONS = 3;

/** Sessions in a row on one side, or rising or falling, that are no chance any more (ISO 7870-2, memory). */
export const RUN_LENGTH = 7;

/** Why a session warns of drift. */
export type DriftSign =
  | 'beyond-action-limit'
  | 'two-of-three-beyond-warning-limit'
  | 'seven-on-one-side'
  | 'seven-rising'
  | 'seven-falling';

export interface ChartPoint {
  readonly sessionId: string;
  readonly date: string;
  readonly meanM2: number;
  readonly readings: number;
  /** Among the sessions from which the limits come. */
  readonly setsLimits: boolean;
  /** Absent where there are too few sessions for limits. */
  readonly limits?: {
    /** Standard deviation of this session's mean [m²]: from session to session and within, over its readings. */
    readonly deviationM2: number;
    /** Distance from the centre line in such deviations, with its sign. */
    readonly distance: number;
    readonly place: 'within' | 'beyond-warning' | 'beyond-action';
    readonly signs: readonly DriftSign[];
  };
}

export interface ControlChart {
  /** By date, of one day by id. */
  readonly points: readonly ChartPoint[];
  /** Sessions that set the centre line and the limits. */
  readonly settingSessions: number;
  /** Absent where fewer than three sessions set the limits. */
  readonly scatter?: SessionScatter;
}

/**
 * The control chart of a check body: session means about a centre line, with warning and action limits, and the signs of
 * drift. The standard deviation of a session mean is √(s_between² + s_within²/n), so a session of many readings is held
 * closer. A session that helps to set the limits widens them: of k sessions none can lie further out than (k − 1)/√k
 * deviations of their means, which `withinReach` says.
 *
 * @param settingIds sessions that set the limits; absent: all. Sessions without a measurement are left out.
 */
export function controlChart(
  sessions: readonly ChartSession[],
  settingIds?: ReadonlySet<string>,
): ControlChart {
  const rows = sessions
    .filter(({ measurements }) => measurements.length > 0)
    .map((session) => ({
      session,
      readings: sessionReadings(session.measurements),
      sets: settingIds?.has(session.id) ?? true,
    }))
    .sort((a, b) => compareTexts(a.session.date, b.session.date) || compareTexts(a.session.id, b.session.id));
  const setting = rows.filter(({ sets }) => sets).map(({ readings }) => readings);
  const scatter = setting.length < FEWEST_SESSIONS ? undefined : sessionScatter(setting);
  const plain = rows.map(({ session, readings, sets }) => ({
    sessionId: session.id,
    date: session.date,
    meanM2: readings.meanM2,
    readings: readings.count,
    setsLimits: sets,
  }));
  if (scatter === undefined) return { points: plain, settingSessions: setting.length };
  const deviations = rows.map(({ readings }) => meanDeviation(scatter, readings));
  const distances = plain.map(({ meanM2 }, i) => distanceOf(meanM2 - scatter.centreM2, deviations[i] ?? 0));
  return {
    points: plain.map((point, i) => ({
      ...point,
      limits: {
        deviationM2: deviations[i] ?? 0,
        distance: distances[i] ?? 0,
        place: placeOf(distances[i] ?? 0),
        signs: signsAt(distances, plain, i),
      },
    })),
    settingSessions: setting.length,
    scatter,
  };
}

/** Whether one of `k` sessions that set the limits themselves can lie beyond the action limit at all. */
export function withinReach(k: number): boolean {
  return (k - 1) / Math.sqrt(k) > ACTION_LIMIT;
}

function compareTexts(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function meanDeviation(scatter: SessionScatter, { count }: SessionReadings): number {
  return Math.hypot(scatter.betweenM2, (scatter.withinM2 ?? 0) / Math.sqrt(count));
}

/** Where nothing scatters, every difference at all is beyond any limit. */
function distanceOf(difference: number, deviation: number): number {
  if (Math.abs(difference) < AMOUNT_FLOOR_M2) return 0;
  return difference / deviation;
}

function placeOf(distance: number): 'within' | 'beyond-warning' | 'beyond-action' {
  const size = Math.abs(distance);
  return size > ACTION_LIMIT ? 'beyond-action' : size > WARNING_LIMIT ? 'beyond-warning' : 'within';
}

/** The rules that session i completes, looking back. */
function signsAt(
  distances: readonly number[],
  points: readonly { readonly meanM2: number }[],
  i: number,
): readonly DriftSign[] {
  const here = distances[i] ?? 0;
  const side = Math.sign(here);
  const beyondWarning = (z: number): boolean => z * side > WARNING_LIMIT;
  const lastSeven = i + 1 >= RUN_LENGTH ? distances.slice(i + 1 - RUN_LENGTH, i + 1) : undefined;
  const steps = points
    .slice(Math.max(0, i + 2 - RUN_LENGTH), i + 1)
    .map(({ meanM2 }, j, later) => meanM2 - (points[i - later.length + j]?.meanM2 ?? NaN));
  const signs: DriftSign[] = [];
  if (Math.abs(here) > ACTION_LIMIT) signs.push('beyond-action-limit');
  if (beyondWarning(here) && distances.slice(Math.max(0, i - 2), i).some(beyondWarning)) {
    signs.push('two-of-three-beyond-warning-limit');
  }
  if (side !== 0 && lastSeven?.every((z) => Math.sign(z) === side)) signs.push('seven-on-one-side');
  if (lastSeven && steps.every((step) => step > 0)) signs.push('seven-rising');
  if (lastSeven && steps.every((step) => step < 0)) signs.push('seven-falling');
  return signs;
}
