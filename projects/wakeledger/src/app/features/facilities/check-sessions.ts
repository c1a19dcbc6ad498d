import type { CheckMeasurement, TestSession } from '#shared/contracts/test-sessions';
import type { ChartSession } from '#shared/core/uncertainty/control-chart';

const plain = (name: string): string => name.trim().toLocaleLowerCase();

/** The measurements that count: not struck out, and of the body that the facility names now. */
export function countingMeasurements(
  measurements: readonly CheckMeasurement[],
  checkBody: string,
): readonly CheckMeasurement[] {
  return measurements.filter(
    (measurement) => measurement.struck === undefined && plain(measurement.checkBody) === plain(checkBody),
  );
}

/** The sessions of the chart, in the order in which they were measured. */
export function chartSessions(
  sessions: readonly Pick<TestSession, 'id'>[],
  counting: readonly CheckMeasurement[],
): readonly ChartSession[] {
  return sessions
    .flatMap(({ id }) => {
      const its = counting.filter(({ testSessionId }) => testSessionId === id);
      const [date] = its.map(({ measuredOn }) => measuredOn).sort();
      return date === undefined ? [] : [{ id, date, measurements: its }];
    })
    .sort((a, b) => a.date.localeCompare(b.date) || a.id.localeCompare(b.id));
}

/** From so many sessions on the newest is judged by the others, as a person would who comes into the tunnel. */
const JUDGED_BY_OTHERS = 5;

export interface LimitsChoice {
  /** As it stands in the address. */
  readonly value: string;
  readonly ids: ReadonlySet<string>;
}

/**
 * Which sessions set the limits: `all`, or those up to and including the one that is named. Where nothing is chosen, all
 * but the newest, once there are five; before that, all.
 */
export function limitsChoice(sessions: readonly ChartSession[], asked: string | undefined): LimitsChoice {
  const ids = sessions.map(({ id }) => id);
  const upTo = (last: number, value: string): LimitsChoice => ({
    value,
    ids: new Set(ids.slice(0, last + 1)),
  });
  const named = asked === undefined ? -1 : ids.indexOf(asked);
  if (named >= 0) return upTo(named, ids[named] ?? '');
  const newest = ids.length - 1;
  if (asked === 'all' || ids.length < JUDGED_BY_OTHERS) return upTo(newest, 'all');
  return upTo(newest - 1, ids[newest - 1] ?? 'all');
}
