import type { DATE_ORDERS } from '#shared/contracts/imports';
import type { Reading } from './numbers';

export type DateOrder = (typeof DATE_ORDERS)[number];
export type DateEvidence = DateOrder | 'either';

/** A time of day after the date is let be: a result has a day. */
const TIME = /[T ]\d{1,2}:\d{2}(?::\d{2}(?:[.,]\d+)?)?\s*(?:Z|[+-]\d{2}:?\d{2})?$/;
const YEAR_FIRST = /^(\d{4})[-./](\d{1,2})[-./](\d{1,2})$/;
const YEAR_LAST = /^(\d{1,2})([-./])(\d{1,2})\2(\d{4})$/;
const NAMED_MONTH = /^(\d{1,2})[-. ]+([A-Za-zä]+)\.?[-. ]+(\d{4})$/;
const SHORT_YEAR = /^\d{1,2}[-./]\d{1,2}[-./]\d{2}$/;

/** English and German names by their first three letters. */
const MONTHS: Readonly<Record<string, number>> = {
  jan: 1,
  feb: 2,
  mar: 3,
  mär: 3,
  mrz: 3,
  apr: 4,
  may: 5,
  mai: 5,
  jun: 6,
  jul: 7,
  aug: 8,
  sep: 9,
  oct: 10,
  okt: 10,
  nov: 11,
  dec: 12,
  dez: 12,
};

/** What one cell says about the order of day and month; undefined when it is no date. */
export function dateEvidence(text: string): DateEvidence | undefined {
  const day = text.trim().replace(TIME, '');
  if (YEAR_FIRST.test(day)) return 'year-month-day';
  if (monthByName(day) !== undefined) return 'day-month-year';
  const parts = YEAR_LAST.exec(day);
  if (parts === null) return undefined;
  const first = Number(parts[1]);
  const second = Number(parts[3]);
  if (first > 31 || second > 31 || (first > 12 && second > 12)) return undefined;
  if (parts[2] === '.' || first > 12) return 'day-month-year';
  return second > 12 ? 'month-day-year' : 'either';
}

/** Reads a date as `YYYY-MM-DD`. A year first is always understood; else the chosen order decides. */
export function readDate(text: string, order: DateOrder): Reading<string> {
  const day = text.trim().replace(TIME, '');
  const named = monthByName(day);
  if (named !== undefined) return checked(named, text);
  const yearFirst = YEAR_FIRST.exec(day);
  if (yearFirst !== null) return checked([yearFirst[1], yearFirst[2], yearFirst[3]].map(Number), text);
  const yearLast = YEAR_LAST.exec(day);
  if (yearLast !== null) {
    const [first, second, year] = [yearLast[1], yearLast[3], yearLast[4]].map(Number);
    return checked(order === 'month-day-year' ? [year, first, second] : [year, second, first], text);
  }
  if (SHORT_YEAR.test(day))
    return { problem: `“${text}” leaves the century open. Write the year with four digits.` };
  return { problem: `“${text}” is not a date. Write it as 2026-05-04 or ${sample(order)}.` };
}

const sample = (order: DateOrder): string => (order === 'month-day-year' ? '05/04/2026' : '04.05.2026');

function monthByName(day: string): readonly number[] | undefined {
  const parts = NAMED_MONTH.exec(day);
  const month = parts === null ? undefined : MONTHS[(parts[2] ?? '').slice(0, 3).toLowerCase()];
  return parts === null || month === undefined ? undefined : [Number(parts[3]), month, Number(parts[1])];
}

function checked(parts: readonly (number | undefined)[], text: string): Reading<string> {
  const [year = 0, month = 0, day = 0] = parts;
  const date = new Date(Date.UTC(year, month - 1, day));
  const exists =
    date.getUTCFullYear() === year && date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
  return exists
    ? { value: date.toISOString().slice(0, 10) }
    : {
        problem: `“${text}” is no day of the calendar as it is read here. Check day and month and their order.`,
      };
}
