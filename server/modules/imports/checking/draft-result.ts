import { importFieldRule, type ImportField } from '#shared/contracts/import-fields';
import type { AirState, Condition } from '#shared/contracts/condition';
import type { Facility } from '#shared/contracts/facilities';
import type { ResultFields, ResultPoint } from '#shared/contracts/results';
import type { CompiledMapping } from './compiled-mapping';
import type { KnownVariant } from './check-context';
import type { CellValue } from './read-cell';
import type { RowValues } from './read-row';

type Values = ReadonlyMap<ImportField, CellValue>;

const QUANTITY_OF: Partial<Record<ImportField, ResultFields['quantity']>> = {
  dragCoefficient: 'coefficient',
  dragForce: 'force',
  dragArea: 'drag-area',
  coastdownF2: 'coastdown-f2',
};

/** A property that is left out where there is nothing, so that a gap stays a gap. */
function given<K extends string, T>(key: K, value: T | undefined): { [P in K]?: T } {
  return value === undefined ? {} : ({ [key]: value } as { [P in K]?: T });
}

// `readCell` gives each field the type of its kind, so these narrow what is known already.
const numberIn = (values: Values, field: ImportField): number | undefined => {
  const value = values.get(field);
  return typeof value === 'number' ? value : undefined;
};
const textIn = (values: Values, field: ImportField): string | undefined => {
  const value = values.get(field);
  return typeof value === 'string' ? value : undefined;
};
const flagIn = (values: Values, field: ImportField): boolean | undefined => {
  const value = values.get(field);
  return typeof value === 'boolean' ? value : undefined;
};

/**
 * The result that the rows of one name make up. What every row agrees in stands on the result, what differs on its
 * points. What the file does not say about the condition is taken over from the facility's usual one.
 */
export function draftResult(
  rows: readonly RowValues[],
  level: Values,
  valueField: ImportField,
  variant: KnownVariant,
  facility: Facility,
  mapping: CompiledMapping,
): ResultFields {
  const valueFactor = factorOf(valueField, mapping);
  const shared = (field: ImportField): number | undefined => agreed(rows, field);
  const speedKmh = shared('speed');
  const dynamicPressurePa = shared('dynamicPressure');
  const tareN = shared('tare');
  const air = airOf(level);
  return {
    variantId: variant.key,
    facilityId: facility.id,
    name: textIn(level, 'name') ?? '',
    testDate: textIn(level, 'testDate') ?? '',
    quantity: QUANTITY_OF[valueField] ?? 'coefficient',
    scale: numberIn(level, 'scale') ?? 1,
    ...given('quotedAreaM2', numberIn(level, 'quotedArea')),
    ...given('quotedAreaUM2', numberIn(level, 'quotedAreaU')),
    ...given('quotedAreaScale', textIn(level, 'quotedAreaScale') as 'model' | 'full' | undefined),
    ...given('speedKmh', speedKmh),
    ...given('dynamicPressurePa', dynamicPressurePa),
    ...given('air', air),
    ...given('tareAlreadySubtracted', flagIn(level, 'tareAlreadySubtracted')),
    ...given('tareN', tareN),
    condition: { ...facility.usualCondition, ...conditionOf(level) },
    ...given('blockageAlreadyCorrectedBy', textIn(level, 'blockageAlreadyCorrectedBy')),
    ...given('turbulenceGenerationOrTrips', flagIn(level, 'turbulenceGenerationOrTrips')),
    ...given('stated', statedOf(level, valueFactor)),
    ...given('session', textIn(level, 'session')),
    ...given('installation', textIn(level, 'installation')),
    ...given('model', textIn(level, 'model')),
    ...given('source', textIn(level, 'source')),
    ...given('remark', textIn(level, 'remark')),
    points: rows.map((row) => pointOf(row, valueField, valueFactor, { speedKmh, dynamicPressurePa, tareN })),
  };
}

/** The factor of the value's own unit: deviations, lift and stated uncertainty come in the same unit. */
function factorOf(field: ImportField, mapping: CompiledMapping): number {
  const unit = mapping.sources.get(field)?.unit;
  const units = importFieldRule(field).units ?? [];
  return (units.find((known) => known.unit === unit) ?? units[0])?.factor ?? 1;
}

/** The one value that every row that states any agrees in; undefined where they differ or none does. */
function agreed(rows: readonly RowValues[], field: ImportField): number | undefined {
  const stated = rows.flatMap((row) => numberIn(row.values, field) ?? []);
  return stated.length > 0 && stated.every((value) => value === stated[0]) ? stated[0] : undefined;
}

function pointOf(
  row: RowValues,
  valueField: ImportField,
  factor: number,
  onResult: Pick<ResultPoint, 'speedKmh' | 'dynamicPressurePa' | 'tareN'>,
): ResultPoint {
  const own = (field: ImportField, resultHolds: number | undefined): number | undefined =>
    resultHolds === undefined ? numberIn(row.values, field) : undefined;
  const asValue = (field: ImportField): number | undefined => {
    const value = numberIn(row.values, field);
    return value === undefined ? undefined : value * factor;
  };
  return {
    yawDeg: numberIn(row.values, 'yaw') ?? 0,
    value: numberIn(row.values, valueField) ?? Number.NaN,
    ...given('s', asValue('s')),
    ...given('n', numberIn(row.values, 'n')),
    ...given('speedKmh', own('speed', onResult.speedKmh)),
    ...given('dynamicPressurePa', own('dynamicPressure', onResult.dynamicPressurePa)),
    ...given('tareN', own('tare', onResult.tareN)),
    ...given('frontLift', asValue('frontLift')),
    ...given('rearLift', asValue('rearLift')),
    ...given('sideForce', asValue('sideForce')),
  };
}

function airOf(level: Values): AirState | undefined {
  const air: AirState = {
    ...given('state', textIn(level, 'airState') as AirState['state']),
    ...given('temperatureC', numberIn(level, 'temperature')),
    ...given('pressurePa', numberIn(level, 'pressure')),
    ...given('relativeHumidity', numberIn(level, 'humidity')),
  };
  return Object.keys(air).length === 0 ? undefined : air;
}

function conditionOf(level: Values): Condition {
  return {
    ...given('ground', textIn(level, 'ground') as Condition['ground']),
    ...given('wheels', textIn(level, 'wheels') as Condition['wheels']),
    ...given('cooling', textIn(level, 'cooling') as Condition['cooling']),
    ...given('mirrors', textIn(level, 'mirrors') as Condition['mirrors']),
    ...given('rideHeightFrontMm', numberIn(level, 'rideHeightFront')),
    ...given('rideHeightRearMm', numberIn(level, 'rideHeightRear')),
    ...given('payloadKg', numberIn(level, 'payload')),
    ...given('tyres', textIn(level, 'tyres')),
    ...given('beltSpeedRatio', numberIn(level, 'beltSpeedRatio')),
    ...given('wheelVentilationInForce', flagIn(level, 'wheelVentilationInForce')),
  };
}

/** U is nothing without k; where the file leaves k out, the group's check refuses it. */
function statedOf(level: Values, factor: number): ResultFields['stated'] {
  const expandedU = numberIn(level, 'expandedU');
  const k = numberIn(level, 'k');
  if (expandedU === undefined || k === undefined) return undefined;
  return {
    expandedU: expandedU * factor,
    k,
    ...given('degreesOfFreedom', numberIn(level, 'degreesOfFreedom')),
    ...given('includesFacilityBias', flagIn(level, 'includesFacilityBias')),
  };
}
