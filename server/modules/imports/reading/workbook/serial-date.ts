const DAY_MS = 86_400_000;
const SECOND_MS = 1000;
/** 31 December 9999, the last day that a sheet knows. */
const LAST_SERIAL = 2_958_465;

/**
 * A day counted as sheets count it, written as `2026-05-04` or, with a time of day, `2026-05-04 14:30:00`. From 1900,
 * day 1 is 1 January 1900 and day 60 a 29 February that never was; from 1904, day 0 is 1 January 1904
 * (ISO/IEC 29500-1, 18.17.4.1).
 *
 * @returns undefined when the number is no day
 */
export function dayOfSerial(serial: number, from1904: boolean): string | undefined {
  const days = from1904 ? serial + 1462 : serial;
  if (!Number.isFinite(serial) || serial < 0 || days > LAST_SERIAL + 1) return undefined;
  if (!from1904 && serial >= 60 && serial < 61) return undefined;
  const epoch = Date.UTC(1899, 11, days < 61 && !from1904 ? 31 : 30);
  const milliseconds = Math.round((days * DAY_MS) / SECOND_MS) * SECOND_MS;
  const written = new Date(epoch + milliseconds).toISOString();
  const time = written.slice(11, 19);
  return time === '00:00:00' ? written.slice(0, 10) : `${written.slice(0, 10)} ${time}`;
}

/** A part of a day as a time, `14:30:00`. */
export function timeOfSerial(serial: number): string | undefined {
  if (!(serial >= 0 && serial < 1)) return undefined;
  const milliseconds = Math.min(Math.round(serial * 86_400), 86_399) * SECOND_MS;
  return new Date(milliseconds).toISOString().slice(11, 19);
}
