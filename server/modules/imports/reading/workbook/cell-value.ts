import { addressOf, type Place } from './addresses';
import { damaged } from './limits';
import type { NumberKind } from './number-formats';
import { dayOfSerial, timeOfSerial } from './serial-date';

/** What every cell of a workbook is read with. */
export interface CellSurroundings {
  readonly shared: readonly string[];
  readonly kinds: readonly NumberKind[];
  readonly from1904: boolean;
}

/** A cell as the part writes it. */
export interface WrittenCell {
  readonly place: Place;
  readonly type: string;
  readonly style: number;
  readonly formula: boolean;
  readonly value: string | undefined;
  /** The text that stands in the cell itself; empty where there is none. */
  readonly inline: string;
}

export type CellKind = 'number' | 'date' | 'text' | 'yes-no' | 'error';

export interface SheetCell {
  readonly column: number;
  readonly text: string;
  readonly kind: CellKind;
  readonly formula: boolean;
}

/** Stands where a formula was written by a program that did not calculate it. */
export const NEVER_CALCULATED = '#NOT CALCULATED';

/**
 * A cell as text, the way the rest of an import reads text: numbers with a point and all their digits, percentages with
 * their sign, days as 2026-05-04. A formula counts by the value that was calculated last; it is never run.
 *
 * @returns undefined for an empty cell
 * @throws {UnreadableFile} when the cell refers to a text that is not there
 */
export function cellValue(cell: WrittenCell, surroundings: CellSurroundings): SheetCell | undefined {
  const read = textAndKind(cell, surroundings);
  if (read === undefined || read.text.trim() === '')
    return cell.formula && cell.type !== 'str' && cell.inline === '' && (cell.value ?? '').trim() === ''
      ? { column: cell.place.column, text: NEVER_CALCULATED, kind: 'error', formula: true }
      : undefined;
  return { column: cell.place.column, formula: cell.formula, text: read.text, kind: read.kind };
}

type Read = Pick<SheetCell, 'text' | 'kind'>;

function textAndKind(cell: WrittenCell, surroundings: CellSurroundings): Read | undefined {
  const { type, value, inline } = cell;
  if (type === 'inlineStr') return { text: inline, kind: 'text' };
  if (value === undefined) return undefined;
  if (type === 's') return { text: sharedText(cell, value, surroundings.shared), kind: 'text' };
  if (type === 'str') return { text: value, kind: 'text' };
  if (type === 'b') return { text: value.trim() === '1' ? 'TRUE' : 'FALSE', kind: 'yes-no' };
  if (type === 'e') return { text: value, kind: 'error' };
  if (type === 'd') return { text: value.replace(/T00:00(:00)?(\.0+)?Z?$/, ''), kind: 'date' };
  return numberText(cell, value, surroundings);
}

function sharedText(cell: WrittenCell, value: string, shared: readonly string[]): string {
  const text = shared[Number(value)];
  if (text === undefined)
    throw damaged(
      `the cell ${addressOf(cell.place)} refers to text ${value.slice(0, 12)}, and the workbook holds ${String(shared.length)} texts.`,
    );
  return text;
}

/** The shortest digits that are this very number: what is stored as 0.28499999999999998 was typed as 0.285. */
function numberText(cell: WrittenCell, value: string, surroundings: CellSurroundings): Read {
  const number = Number(value);
  if (value.trim() === '' || !Number.isFinite(number)) return { text: value, kind: 'text' };
  const kind = surroundings.kinds[cell.style] ?? 'number';
  if (kind === 'date') {
    const day = dayOfSerial(number, surroundings.from1904);
    if (day !== undefined) return { text: day, kind: 'date' };
  }
  if (kind === 'time') {
    const time = timeOfSerial(number);
    if (time !== undefined) return { text: time, kind: 'text' };
  }
  // A hundred times a binary fraction rarely is the decimal one: the digits that a sheet keeps (15) give it back.
  if (kind === 'percent')
    return { text: `${String(Number((number * 100).toPrecision(15)))} %`, kind: 'number' };
  return { text: String(number), kind: 'number' };
}
