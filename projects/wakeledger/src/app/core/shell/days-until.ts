const DAY_MS = 86_400_000;

/** Whole calendar days from today (local) to a date (YYYY-MM-DD); negative when it has passed. */
export function daysUntil(date: string, now: Date): number {
  const today = Date.UTC(now.getFullYear(), now.getMonth(), now.getDate());
  return Math.round((Date.parse(`${date}T00:00:00Z`) - today) / DAY_MS);
}

/** The same as a person says it. */
export function daysUntilWords(days: number): string {
  if (days === 0) return $localize`today`;
  if (days === 1) return $localize`tomorrow`;
  if (days === -1) return $localize`yesterday`;
  return days > 0 ? $localize`in ${days}:DAYS: days` : $localize`${-days}:DAYS: days ago`;
}
