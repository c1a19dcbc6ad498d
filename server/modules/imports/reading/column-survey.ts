import { dateEvidence, type DateEvidence, type DateOrder } from './dates';
import { decimalEvidence, type Decimal } from './numbers';

const SAMPLES = 5;
const SAMPLE_LENGTH = 80;
/** A column holds numbers when this share of its filled cells are some. */
const MOSTLY = 0.8;
/** Nothing else looks like a date, so half of them are enough. */
const HALF = 0.5;
/** One slip of the pen among many does not make a file ambiguous: its row is refused by name instead. */
const CLEARLY = 4;

/** What is gathered of each column while the rows pass by, in constant memory. */
export class ColumnSurvey {
  readonly samples: string[] = [];
  #filled = 0;
  #numbers = 0;
  #dates = 0;
  readonly #decimals = { point: 0, comma: 0, either: 0, none: 0 };
  readonly #orders = { 'year-month-day': 0, 'day-month-year': 0, 'month-day-year': 0, either: 0 };

  see(cell: string): void {
    if (cell === '') return;
    this.#filled += 1;
    const sample = cell.slice(0, SAMPLE_LENGTH);
    if (this.samples.length < SAMPLES && !this.samples.includes(sample)) this.samples.push(sample);
    const decimal = decimalEvidence(cell.replace(/\s*%$/, ''));
    if (decimal !== undefined) {
      this.#numbers += 1;
      this.#decimals[decimal] += 1;
    }
    const order: DateEvidence | undefined = dateEvidence(cell);
    if (order !== undefined) {
      this.#dates += 1;
      this.#orders[order] += 1;
    }
  }

  get holdsNumbers(): boolean {
    return this.#filled > 0 && this.#numbers >= MOSTLY * this.#filled;
  }

  get holdsDates(): boolean {
    return this.#filled > 0 && this.#dates >= HALF * this.#filled;
  }

  get decimals(): Readonly<Record<Decimal | 'either', number>> {
    return this.#decimals;
  }

  get orders(): Readonly<Record<DateOrder | 'either', number>> {
    return this.#orders;
  }
}

/** The file's decimal sign by its number columns; ambiguous where they contradict each other or leave it open. */
export function decimalOf(columns: readonly ColumnSurvey[]): Decimal | 'ambiguous' | undefined {
  const sums = { point: 0, comma: 0, either: 0 };
  for (const column of columns) {
    if (!column.holdsNumbers || column.holdsDates) continue;
    sums.point += column.decimals.point;
    sums.comma += column.decimals.comma;
    sums.either += column.decimals.either;
  }
  const { point, comma, either } = sums;
  if (point === 0 && comma === 0) return either > 0 ? 'ambiguous' : undefined;
  if (point > CLEARLY * comma) return 'point';
  if (comma > CLEARLY * point) return 'comma';
  return 'ambiguous';
}

/** The order of day and month by the date columns. */
export function dateOrderOf(columns: readonly ColumnSurvey[]): DateOrder | 'ambiguous' | undefined {
  const sums = { 'year-month-day': 0, 'day-month-year': 0, 'month-day-year': 0, either: 0 };
  for (const column of columns) {
    if (!column.holdsDates) continue;
    for (const order of ['year-month-day', 'day-month-year', 'month-day-year', 'either'] as const)
      sums[order] += column.orders[order];
  }
  const dayFirst = sums['day-month-year'];
  const monthFirst = sums['month-day-year'];
  if (dayFirst === 0 && monthFirst === 0) {
    if (sums.either > 0) return 'ambiguous';
    return sums['year-month-day'] > 0 ? 'year-month-day' : undefined;
  }
  if (dayFirst > CLEARLY * monthFirst) return 'day-month-year';
  if (monthFirst > CLEARLY * dayFirst) return 'month-day-year';
  return 'ambiguous';
}
