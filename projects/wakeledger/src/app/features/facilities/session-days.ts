import { formatDate } from '@angular/common';
import type { TestSession } from '#shared/contracts/test-sessions';

/** `3 Mar 2026`, `3 Mar 2026 to 6 Mar 2026`, `from 3 Mar 2026`; undefined where no day is known. */
export function sessionDays(
  { startDate, endDate }: Pick<TestSession, 'startDate' | 'endDate'>,
  locale: string,
): string | undefined {
  if (startDate === undefined) return undefined;
  const first = formatDate(startDate, 'd MMM y', locale);
  if (endDate === undefined) return $localize`from ${first}:FIRST:`;
  return endDate === startDate
    ? first
    : $localize`${first}:FIRST: to ${formatDate(endDate, 'd MMM y', locale)}:LAST:`;
}
