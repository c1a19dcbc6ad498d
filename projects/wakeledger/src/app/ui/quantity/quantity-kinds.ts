import { KM_PER_MILE } from '#shared/core/constants';
import type { EnergyDisplay, SpeedDisplay } from '../../core/preferences/preferences';

/** What a figure is a figure of. Each kind has one unit in which the product holds it (the API's) and a usual precision. */
export const QUANTITY_KINDS = {
  'drag-area': { unit: 'm²', digits: 3 },
  coefficient: { unit: '', digits: 3 },
  counts: { unit: 'counts', digits: 1 },
  area: { unit: 'm²', digits: 3 },
  speed: { unit: 'km/h', digits: 1 },
  'energy-per-distance': { unit: 'Wh/km', digits: 1 },
  'co2-per-distance': { unit: 'g/km', digits: 1 },
  distance: { unit: 'km', digits: 2 },
  range: { unit: 'km', digits: 0 },
  mass: { unit: 'kg', digits: 0 },
  length: { unit: 'mm', digits: 0 },
  force: { unit: 'N', digits: 1 },
  pressure: { unit: 'Pa', digits: 1 },
  temperature: { unit: '°C', digits: 1 },
  density: { unit: 'kg/m³', digits: 4 },
  duration: { unit: 's', digits: 0 },
  acceleration: { unit: 'm/s²', digits: 2 },
  angle: { unit: '°', digits: 1 },
  percent: { unit: '%', digits: 0 },
  number: { unit: '', digits: 3 },
} as const satisfies Record<string, { readonly unit: string; readonly digits: number }>;

export type QuantityKind = keyof typeof QUANTITY_KINDS;

/** How a kind is shown to one person: multiply the held value by the factor. */
export interface Display {
  readonly unit: string;
  readonly digits: number;
  readonly factor: number;
}

export interface PersonsUnits {
  readonly speed: SpeedDisplay;
  readonly energy: EnergyDisplay;
}

/** The only place where a person's own units are applied. */
export function displayOf(kind: QuantityKind, units: PersonsUnits): Display {
  if (kind === 'speed' && units.speed === 'mph') return { unit: 'mph', digits: 1, factor: 1 / KM_PER_MILE };
  if (kind === 'energy-per-distance' && units.energy === 'kWh/100 km') {
    return { unit: 'kWh/100\u00a0km', digits: 2, factor: 0.1 };
  }
  if (kind === 'energy-per-distance' && units.energy === 'Wh/mi') {
    return { unit: 'Wh/mi', digits: 1, factor: KM_PER_MILE };
  }
  return { ...QUANTITY_KINDS[kind], factor: 1 };
}
