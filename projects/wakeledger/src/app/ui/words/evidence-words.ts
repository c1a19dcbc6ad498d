import { type BLOCKAGE_METHODS, type FACILITY_KINDS } from '#shared/contracts/facilities';
import { type QUANTITIES } from '#shared/contracts/results';
import { type AIR_STATES } from '#shared/contracts/condition';

type Word<Keys extends readonly string[]> = Readonly<Record<Keys[number], string>>;

export type QuantityName = (typeof QUANTITIES)[number];
export type FacilityKindName = (typeof FACILITY_KINDS)[number];
export type BlockageMethodName = (typeof BLOCKAGE_METHODS)[number];

/** What was measured, in the words of the trade. */
export const QUANTITY_WORDS: Word<typeof QUANTITIES> = {
  force: $localize`Drag force`,
  coefficient: $localize`Drag coefficient`,
  'drag-area': $localize`Drag area`,
  'coastdown-f2': $localize`Coastdown f2`,
};

/** The unit in which a result keeps the value; a coefficient has none. */
export const QUANTITY_UNITS: Word<typeof QUANTITIES> = {
  force: 'N',
  coefficient: '',
  'drag-area': 'm²',
  'coastdown-f2': 'N/(km/h)²',
};

export const FACILITY_KIND_WORDS: Word<typeof FACILITY_KINDS> = {
  closed: $localize`Tunnel, closed test section`,
  'open-jet': $localize`Tunnel, open jet`,
  slotted: $localize`Tunnel, slotted walls`,
  road: $localize`Proving ground`,
  simulation: $localize`Simulation set-up`,
};

export const BLOCKAGE_METHOD_WORDS: Word<typeof BLOCKAGE_METHODS> = {
  none: $localize`No correction`,
  'area-ratio': $localize`Area ratio (Barlow, Rae and Pope)`,
  maskell: $localize`Maskell`,
  factor: $localize`The facility’s own factor`,
};

export const AIR_STATE_WORDS: Word<typeof AIR_STATES> = {
  'iso-2533-sea-level': $localize`ISO 2533, sea level (15 °C, 1013.25 hPa)`,
  'un-gtr-15': $localize`UN GTR No. 15 (20 °C, 1000 hPa)`,
  'sae-j2263': $localize`SAE J2263 (20 °C, 982.1 hPa)`,
  'cfr-1066-as-printed': $localize`40 CFR 1066 as printed (20 °C, 982.1 hPa)`,
};
