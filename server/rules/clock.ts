/** What day it is at this moment, as `YYYY-MM-DD` in UTC; the moment comes in, so that rules can be tested. */
export function dayOf(moment: Date): string {
  return moment.toISOString().slice(0, 10);
}

/**
 * The last date that may be stated as past. Half the earth is a day ahead of UTC for half of each day: a test that
 * was finished this morning in the east must not be called future.
 */
export function latestPastDay(moment: Date): string {
  return dayOf(new Date(moment.getTime() + 14 * 3_600_000));
}
