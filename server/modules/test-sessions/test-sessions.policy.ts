import type { CheckMeasurementFields, TestSession, TestSessionFields } from '#shared/contracts/test-sessions';
import { Issues, type Issue } from '../../rules/issue';

/** The first and the last day of something, `YYYY-MM-DD`. */
export interface Days {
  readonly first: string;
  readonly last: string;
}

/** A measurement this many days outside its session is a slip of the pen; a set-up day or two is not. */
const FARTHEST_DAYS = 31;
const DAY_MS = 86_400_000;

/**
 * What is wrong with a session beyond the form of its fields.
 *
 * @param measured the days on which its results and its check body were measured
 */
export function sessionIssues(
  { startDate, endDate }: TestSessionFields,
  measured: Days | undefined,
): readonly Issue[] {
  const issues = new Issues().when(
    startDate === undefined && endDate !== undefined,
    'startDate',
    'A session that ends has begun: state its first day, too, or leave out the last.',
    'missing-input',
  );
  if (startDate !== undefined && endDate !== undefined && endDate < startDate) {
    return issues.when(
      true,
      'endDate',
      `The session would end before it begins on ${startDate}. State ${startDate} or a later day.`,
    ).list;
  }
  if (measured === undefined) return issues.list;
  return issues
    .when(
      startDate !== undefined && startDate > measured.first,
      'startDate',
      `Something of this session was measured on ${measured.first}. State that day or an earlier one.`,
    )
    .when(
      endDate !== undefined && endDate < measured.last,
      'endDate',
      `Something of this session was measured on ${measured.last}. State that day or a later one.`,
    ).list;
}

/** What is wrong with a measurement of the check body beyond the form of its fields. */
export function checkMeasurementIssues(
  { measuredOn, s, n }: CheckMeasurementFields,
  session: Pick<TestSession, 'name' | 'startDate' | 'endDate'>,
  latestPastDay: string,
): readonly Issue[] {
  const away = daysOutside(measuredOn, session);
  return new Issues()
    .when(
      measuredOn > latestPastDay,
      'measuredOn',
      `${measuredOn} is still to come. State the day on which it was measured.`,
    )
    .when(
      measuredOn <= latestPastDay && away > FARTHEST_DAYS,
      'measuredOn',
      `That is ${away} days outside the session “${session.name}” (${spanWords(session)}). Correct the day, or choose the session it belongs to.`,
    )
    .when(
      s !== undefined && (n ?? 1) < 2,
      'n',
      'A standard deviation comes from at least two readings. State how many there were, or leave the scatter out.',
      'repeatability-needs-two',
    ).list;
}

function daysOutside(
  day: string,
  { startDate, endDate }: Pick<TestSession, 'startDate' | 'endDate'>,
): number {
  const before = startDate === undefined ? 0 : daysBetween(day, startDate);
  const after = startDate === undefined ? 0 : daysBetween(endDate ?? day, day);
  return Math.max(0, before, after);
}

function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(to) - Date.parse(from)) / DAY_MS);
}

function spanWords({ startDate, endDate }: Pick<TestSession, 'startDate' | 'endDate'>): string {
  return endDate === undefined || endDate === startDate ? `${startDate}` : `${startDate} to ${endDate}`;
}
