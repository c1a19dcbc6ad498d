import { COOLINGS, GROUNDS, MIRRORS, WHEELS } from './condition';

/**
 * What a column of an imported file can hold. Both halves read this list: the client offers it, the server checks by
 * it. Factors turn a unit into the unit of the result's contract (named beside each field).
 */
export type ImportFieldKind =
  'text' | 'number' | 'integer' | 'date' | 'word' | 'yes-no' | 'air-state' | 'scale';

export interface ImportUnit {
  readonly unit: string;
  /** Contract unit = (value + offset) · factor. */
  readonly factor: number;
  readonly offset?: number;
}

export interface ImportFieldRule {
  readonly kind: ImportFieldKind;
  readonly units?: readonly ImportUnit[];
  /** The words that are accepted, of the contract; synonyms are the server's. */
  readonly words?: readonly string[];
  /** Differs from point to point of a yaw sweep; everything else must agree within one result. */
  readonly perPoint?: true;
  /** The four that decide the quantity: exactly one of them is filled in a row. */
  readonly value?: true;
}

const ONE: readonly ImportUnit[] = [{ unit: '1', factor: 1 }];
const FRACTION: readonly ImportUnit[] = [
  { unit: '1', factor: 1 },
  { unit: '%', factor: 0.01 },
];
/** Square foot, pound-force, pound and mile: the international definitions of 1959, exact. */
const AREA: readonly ImportUnit[] = [
  { unit: 'm²', factor: 1 },
  { unit: 'cm²', factor: 1e-4 },
  { unit: 'mm²', factor: 1e-6 },
  { unit: 'ft²', factor: 0.09290304 },
];
const FORCE: readonly ImportUnit[] = [
  { unit: 'N', factor: 1 },
  { unit: 'kN', factor: 1000 },
  { unit: 'lbf', factor: 4.4482216152605 },
];
const PRESSURE: readonly ImportUnit[] = [
  { unit: 'Pa', factor: 1 },
  { unit: 'hPa', factor: 100 },
  { unit: 'kPa', factor: 1000 },
  { unit: 'mbar', factor: 100 },
];
const SPEED: readonly ImportUnit[] = [
  { unit: 'km/h', factor: 1 },
  { unit: 'm/s', factor: 3.6 },
  { unit: 'mph', factor: 1.609344 },
];
const LENGTH: readonly ImportUnit[] = [
  { unit: 'mm', factor: 1 },
  { unit: 'cm', factor: 10 },
  { unit: 'm', factor: 1000 },
  { unit: 'in', factor: 25.4 },
];
/** Of whatever unit the value's own column has. */
const AS_VALUE: readonly ImportUnit[] = [{ unit: 'as the value', factor: 1 }];

export const IMPORT_FIELDS = {
  name: { kind: 'text' },
  variant: { kind: 'text' },
  facility: { kind: 'text' },
  session: { kind: 'text' },
  installation: { kind: 'text' },
  testDate: { kind: 'date' },
  dragCoefficient: { kind: 'number', units: ONE, perPoint: true, value: true },
  dragForce: { kind: 'number', units: FORCE, perPoint: true, value: true },
  dragArea: { kind: 'number', units: AREA, perPoint: true, value: true },
  coastdownF2: {
    kind: 'number',
    units: [
      { unit: 'N/(km/h)²', factor: 1 },
      { unit: 'N/(m/s)²', factor: 1 / 12.96 },
      { unit: 'lbf/mph²', factor: 4.4482216152605 / 1.609344 ** 2 },
    ],
    perPoint: true,
    value: true,
  },
  quotedArea: { kind: 'number', units: AREA },
  quotedAreaU: { kind: 'number', units: AREA },
  quotedAreaScale: { kind: 'word', words: ['model', 'full'] },
  scale: { kind: 'scale', units: FRACTION },
  speed: { kind: 'number', units: SPEED, perPoint: true },
  dynamicPressure: { kind: 'number', units: PRESSURE, perPoint: true },
  airState: { kind: 'air-state' },
  temperature: {
    kind: 'number',
    units: [
      { unit: '°C', factor: 1 },
      { unit: 'K', factor: 1, offset: -273.15 },
      { unit: '°F', factor: 5 / 9, offset: -32 },
    ],
  },
  pressure: { kind: 'number', units: PRESSURE },
  humidity: { kind: 'number', units: FRACTION },
  yaw: {
    kind: 'number',
    units: [
      { unit: '°', factor: 1 },
      { unit: 'rad', factor: 180 / Math.PI },
    ],
    perPoint: true,
  },
  s: { kind: 'number', units: AS_VALUE, perPoint: true },
  n: { kind: 'integer', perPoint: true },
  tare: { kind: 'number', units: FORCE, perPoint: true },
  tareAlreadySubtracted: { kind: 'yes-no' },
  frontLift: { kind: 'number', units: AS_VALUE, perPoint: true },
  rearLift: { kind: 'number', units: AS_VALUE, perPoint: true },
  sideForce: { kind: 'number', units: AS_VALUE, perPoint: true },
  expandedU: { kind: 'number', units: AS_VALUE },
  k: { kind: 'number', units: ONE },
  degreesOfFreedom: { kind: 'number', units: ONE },
  includesFacilityBias: { kind: 'yes-no' },
  ground: { kind: 'word', words: GROUNDS },
  wheels: { kind: 'word', words: WHEELS },
  cooling: { kind: 'word', words: COOLINGS },
  mirrors: { kind: 'word', words: MIRRORS },
  rideHeightFront: { kind: 'number', units: LENGTH },
  rideHeightRear: { kind: 'number', units: LENGTH },
  payload: {
    kind: 'number',
    units: [
      { unit: 'kg', factor: 1 },
      { unit: 'lb', factor: 0.45359237 },
    ],
  },
  tyres: { kind: 'text' },
  beltSpeedRatio: { kind: 'number', units: FRACTION },
  wheelVentilationInForce: { kind: 'yes-no' },
  turbulenceGenerationOrTrips: { kind: 'yes-no' },
  blockageAlreadyCorrectedBy: { kind: 'text' },
  model: { kind: 'text' },
  source: { kind: 'text' },
  remark: { kind: 'text' },
} as const satisfies Record<string, ImportFieldRule>;

export type ImportField = keyof typeof IMPORT_FIELDS;

export const IMPORT_FIELD_NAMES = Object.keys(IMPORT_FIELDS) as [ImportField, ...ImportField[]];

export function importFieldRule(field: ImportField): ImportFieldRule {
  return IMPORT_FIELDS[field];
}

/** Without a column or a value for all rows for each of these, no row can be read. */
export const NEEDED_IMPORT_FIELDS: readonly ImportField[] = [
  'name',
  'variant',
  'facility',
  'testDate',
  'scale',
];
export const VALUE_IMPORT_FIELDS: readonly ImportField[] = IMPORT_FIELD_NAMES.filter(
  (field) => importFieldRule(field).value === true,
);
