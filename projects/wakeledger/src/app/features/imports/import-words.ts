import type { ImportField } from '#shared/contracts/import-fields';
import type { DATE_ORDERS, DECIMALS, ImportDetail, ImportState, Verdict } from '#shared/contracts/imports';

export const FIELD_WORDS: Readonly<Record<ImportField, string>> = {
  name: $localize`Name of the result`,
  variant: $localize`Variant`,
  facility: $localize`Facility`,
  session: $localize`Session`,
  installation: $localize`Installation`,
  testDate: $localize`Test date`,
  dragCoefficient: $localize`Drag coefficient`,
  dragForce: $localize`Drag force`,
  dragArea: $localize`Drag area (full size)`,
  coastdownF2: $localize`Coastdown f2`,
  quotedArea: $localize`Quoted area`,
  quotedAreaU: $localize`u of the quoted area`,
  quotedAreaScale: $localize`Quoted area is at`,
  scale: $localize`Scale`,
  speed: $localize`Speed`,
  dynamicPressure: $localize`Dynamic pressure`,
  airState: $localize`Named air state`,
  temperature: $localize`Air temperature`,
  pressure: $localize`Static pressure`,
  humidity: $localize`Relative humidity`,
  yaw: $localize`Yaw`,
  s: $localize`s of one reading`,
  n: $localize`Number of readings`,
  tare: $localize`Tare`,
  tareAlreadySubtracted: $localize`Tare already subtracted`,
  frontLift: $localize`Front lift`,
  rearLift: $localize`Rear lift`,
  sideForce: $localize`Side force`,
  expandedU: $localize`Expanded uncertainty U`,
  k: $localize`Coverage factor k`,
  degreesOfFreedom: $localize`Degrees of freedom`,
  includesFacilityBias: $localize`U includes the facility’s bias`,
  ground: $localize`Ground`,
  wheels: $localize`Wheels`,
  cooling: $localize`Cooling`,
  mirrors: $localize`Mirrors`,
  rideHeightFront: $localize`Ride height, front`,
  rideHeightRear: $localize`Ride height, rear`,
  payload: $localize`Payload`,
  tyres: $localize`Tyres`,
  beltSpeedRatio: $localize`Belt over wind speed`,
  wheelVentilationInForce: $localize`Wheel ventilation in the force`,
  turbulenceGenerationOrTrips: $localize`Turbulence generation or trips`,
  blockageAlreadyCorrectedBy: $localize`Blockage corrected by`,
  model: $localize`Model`,
  source: $localize`Source`,
  remark: $localize`Remark`,
};

export const STATE_WORDS: Readonly<Record<ImportState, string>> = {
  mapping: $localize`columns to be assigned`,
  checking: $localize`being checked`,
  ready: $localize`checked, not stored`,
  storing: $localize`being stored`,
  stored: $localize`stored`,
  withdrawn: $localize`withdrawn`,
  cancelled: $localize`laid aside`,
  failed: $localize`broken off`,
};

export const VERDICT_WORDS: Readonly<Record<Verdict, string>> = {
  accepted: $localize`accepted`,
  cautioned: $localize`cautioned`,
  refused: $localize`refused`,
  skipped: $localize`skipped`,
};

/** A state always has a shape beside its colour. */
export const VERDICT_SHAPES: Readonly<Record<Verdict, string>> = {
  accepted: '●',
  cautioned: '◆',
  refused: '▲',
  skipped: '○',
};

export const VERDICT_INKS: Readonly<Record<Verdict, string>> = {
  accepted: 'wl-moss',
  cautioned: 'wl-ochre',
  refused: 'wl-rust',
  skipped: '',
};

export const DECIMAL_WORDS: Readonly<Record<(typeof DECIMALS)[number], string>> = {
  point: $localize`point (0.285)`,
  comma: $localize`comma (0,285)`,
};

export const DATE_ORDER_WORDS: Readonly<Record<(typeof DATE_ORDERS)[number], string>> = {
  'year-month-day': $localize`year, month, day (2026-05-04)`,
  'day-month-year': $localize`day, month, year (04.05.2026)`,
  'month-day-year': $localize`month, day, year (05/04/2026)`,
};

type Sheet = NonNullable<ImportDetail['sheets']>[number];

/** A sheet of a workbook, with what helps to choose it. */
export function sheetWords({ name, filledRows, hasTable, hidden }: Sheet): string {
  if (!hasTable) return $localize`${name}:NAME: (no table)`;
  return hidden
    ? $localize`${name}:NAME: (${filledRows}:ROWS: filled rows, hidden)`
    : $localize`${name}:NAME: (${filledRows}:ROWS: filled rows)`;
}
