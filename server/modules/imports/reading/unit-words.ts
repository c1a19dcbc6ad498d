import { importFieldRule, type ImportField } from '#shared/contracts/import-fields';

/** Spellings of units, normalised (lower case, no spaces or carets, ² as 2), beside the product's own. */
const SPELLINGS: Readonly<Record<string, readonly string[]>> = {
  'm²': ['m2', 'qm', 'sqm', 'squaremetres'],
  'cm²': ['cm2'],
  'mm²': ['mm2'],
  'ft²': ['ft2', 'sqft'],
  N: ['n', 'newton'],
  kN: ['kn'],
  lbf: ['lbf', 'lb'],
  Pa: ['pa'],
  hPa: ['hpa'],
  kPa: ['kpa'],
  mbar: ['mbar', 'mb'],
  'km/h': ['km/h', 'kmh', 'kph', 'kmph', 'kmh-1'],
  'm/s': ['m/s', 'ms', 'ms-1', 'mps'],
  mph: ['mph'],
  mm: ['mm'],
  cm: ['cm'],
  m: ['m'],
  in: ['in', 'inch', '"'],
  '°C': ['°c', 'degc', 'c', 'celsius', 'gradc'],
  K: ['k', 'kelvin'],
  '°F': ['°f', 'degf', 'f'],
  '°': ['°', 'deg', 'degree', 'degrees', 'grad'],
  rad: ['rad'],
  kg: ['kg'],
  lb: ['lb', 'lbs'],
  '%': ['%', 'percent', 'prozent', 'pct'],
  '1': ['1', '-', '–', '—', '−'],
  'N/(km/h)²': ['n/(km/h)2', 'n/kmh2', 'nperkmh2', 'n/(kmh)2', 'n/(km2/h2)'],
  'N/(m/s)²': ['n/(m/s)2', 'ns2/m2', 'n*s2/m2', 'nperms2'],
  'lbf/mph²': ['lbf/mph2', 'lb/mph2', 'lbs/mph2'],
};

function normalised(text: string): string {
  return text
    .trim()
    .toLowerCase()
    .replace(/[\s^]/g, '')
    .replaceAll('²', '2')
    .replaceAll('º', '°')
    .replaceAll('·', '*');
}

/** The unit of this field that a text in a heading means, if it is one of the field's units. */
export function unitOf(field: ImportField, text: string): string | undefined {
  const wanted = normalised(text);
  return importFieldRule(field).units?.find(({ unit }) => (SPELLINGS[unit] ?? []).includes(wanted))?.unit;
}

/** True when a text is a unit of anything at all: then it is not a part of the name. */
export function isSomeUnit(text: string): boolean {
  const wanted = normalised(text);
  return Object.values(SPELLINGS).some((spellings) => spellings.includes(wanted));
}
