import type { ImportField } from '#shared/contracts/import-fields';
import type { CompiledMapping } from './compiled-mapping';

const BY_PATH: Readonly<Record<string, ImportField>> = {
  testDate: 'testDate',
  quotedAreaM2: 'quotedArea',
  quotedAreaUM2: 'quotedAreaU',
  quotedAreaScale: 'quotedAreaScale',
  tareN: 'tare',
  tareAlreadySubtracted: 'tareAlreadySubtracted',
  'air.temperatureC': 'temperature',
  'air.pressurePa': 'pressure',
  'air.relativeHumidity': 'humidity',
  facilityId: 'facility',
  scale: 'scale',
  'condition.ground': 'ground',
  'condition.beltSpeedRatio': 'beltSpeedRatio',
  points: 'yaw',
};

/** Columns of which one may be meant, the first that the mapping has. */
const CHOICES: Readonly<Record<string, readonly ImportField[]>> = {
  air: ['airState', 'temperature', 'pressure', 'humidity'],
  speedKmh: ['speed', 'dynamicPressure'],
};

/** Turns the path that a rule of results names into the field, and so the cell, of the file; and the point's place. */
export function fieldOfIssue(
  where: string,
  valueField: ImportField,
  mapping: CompiledMapping,
): { readonly field: ImportField | undefined; readonly point: number | undefined } {
  const inPoint = /^points\.(\d+)(?:\.(.+))?$/.exec(where);
  const path = inPoint === null ? where : (inPoint[2] ?? 'frontLift');
  const point = inPoint === null ? undefined : Number(inPoint[1]);
  if (path === 'value') return { field: valueField, point };
  if (path === 'n') return { field: 'n', point };
  if (path === 'frontLift') return { field: 'frontLift', point };
  const choices = CHOICES[path];
  if (choices !== undefined)
    return { field: choices.find((field) => mapping.sources.has(field)) ?? choices[0], point };
  return { field: BY_PATH[path], point };
}
