import { importFieldRule, type ImportField } from '#shared/contracts/import-fields';
import { readDate, type DateOrder } from '../reading/dates';
import { readNumber, type Decimal, type Reading } from '../reading/numbers';
import { RANGES } from './ranges';
import { readAirState, readWord, readYesNo } from './words';

export type CellValue = string | number | boolean;

export interface Writing {
  readonly decimal: Decimal;
  readonly dateOrder: DateOrder;
  /** The decimal sign was asked, because the file leaves it open: `1.234` then means what was answered. */
  readonly asked: boolean;
}

const TEXT_LIMITS: Partial<Record<ImportField, number>> = { source: 400, remark: 4000 };
const TEXT_LIMIT = 120;

/** What a sheet shows where a formula has no value (ISO/IEC 29500-1, 18.18.11), and our own word for one that never had any. */
const SHEET_ERROR =
  /^#(?:DIV\/0!|N\/A|NAME\?|NULL!|NUM!|REF!|VALUE!|SPILL!|CALC!|GETTING_DATA|FIELD!|BLOCKED!|NOT CALCULATED)$/;

/** Reads a cell that is not empty as its field asks, in the unit of the contract. */
export function readCell(
  field: ImportField,
  text: string,
  unit: string | undefined,
  writing: Writing,
): Reading<CellValue> {
  if (SHEET_ERROR.test(text))
    return {
      problem: `“${text}” is what a sheet shows where a formula has no value. Mend the formula in the file, or write the value here.`,
    };
  const rule = importFieldRule(field);
  switch (rule.kind) {
    case 'text':
      return readText(text, TEXT_LIMITS[field] ?? TEXT_LIMIT);
    case 'word':
      return readWord(text, rule.words ?? []);
    case 'air-state':
      return readAirState(text);
    case 'yes-no':
      return readYesNo(text);
    case 'date':
      return readDate(text, writing.dateOrder);
    case 'integer':
      return readInteger(text, writing);
    case 'scale':
      return readScale(text, unit, writing);
    case 'number':
      return readQuantity(field, text, unit, writing);
  }
}

function readText(text: string, limit: number): Reading<string> {
  return text.length > limit
    ? {
        problem: `This text has ${String(text.length)} characters; up to ${String(limit)} are kept. Shorten it.`,
      }
    : { value: text };
}

function readInteger(text: string, writing: Writing): Reading<number> {
  const number = readNumber(text, writing.decimal, writing.asked);
  if ('problem' in number) return number;
  return Number.isInteger(number.value) && number.value >= 1
    ? number
    : { problem: `“${text}” is not a whole number from 1 upwards.` };
}

/** `0.25`, `25 %`, `1:4` and `1/4` are all the quarter scale. */
function readScale(text: string, unit: string | undefined, writing: Writing): Reading<number> {
  const ratio = /^(\d+(?:[.,]\d+)?)\s*[:/]\s*(\d+(?:[.,]\d+)?)$/.exec(text.trim());
  if (ratio !== null) {
    const part = readNumber(ratio[1] ?? '', writing.decimal, writing.asked);
    const whole = readNumber(ratio[2] ?? '', writing.decimal, writing.asked);
    if ('problem' in part) return part;
    if ('problem' in whole) return whole;
    return withinScale(part.value / whole.value, text);
  }
  const number = readQuantity('scale', text, unit, writing);
  return 'problem' in number ? number : withinScale(number.value, text);
}

function withinScale(scale: number, text: string): Reading<number> {
  return scale > 0 && scale <= 1
    ? { value: scale }
    : {
        problem: `“${text}” is not a scale. Model over full length is above 0 and at most 1: write 0.25, 25 % or 1:4.`,
      };
}

function readQuantity(
  field: ImportField,
  text: string,
  unit: string | undefined,
  writing: Writing,
): Reading<number> {
  const units = importFieldRule(field).units ?? [];
  const percent = /%\s*$/.test(text) && units.some((known) => known.unit === '%');
  const wanted = percent ? '%' : unit;
  const written = percent ? text.replace(/%\s*$/, '') : text;
  const number = readNumber(written, writing.decimal, writing.asked);
  if ('problem' in number) return number;
  const chosen = units.find((known) => known.unit === wanted) ?? units[0];
  if (chosen === undefined) return number;
  const value = converted(number.value, chosen);
  const range = RANGES[field];
  return range === undefined || range.within(value)
    ? { value }
    : { problem: `“${text}” is out of range. ${range.words}` };
}

/** Dividing by 1/factor where that is whole keeps 45 % at 0.45 and 2 cm² at 0.0002 to the last digit. */
function converted(value: number, unit: { readonly factor: number; readonly offset?: number }): number {
  const shifted = value + (unit.offset ?? 0);
  const inverse = Math.round(1 / unit.factor);
  return unit.factor < 1 && Math.abs(inverse * unit.factor - 1) < 1e-15
    ? shifted / inverse
    : shifted * unit.factor;
}
