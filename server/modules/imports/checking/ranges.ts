import type { ImportField } from '#shared/contracts/import-fields';

interface Range {
  readonly within: (value: number) => boolean;
  readonly words: string;
}

const ABOVE_ZERO: Range = { within: (value) => value > 0, words: 'A value above 0 is accepted.' };
const FROM_ZERO: Range = { within: (value) => value >= 0, words: 'A value of 0 or more is accepted.' };

/** What the contract of a result accepts, in its own units; fields that are not listed take any number. */
export const RANGES: Partial<Record<ImportField, Range>> = {
  quotedArea: ABOVE_ZERO,
  quotedAreaU: FROM_ZERO,
  speed: ABOVE_ZERO,
  dynamicPressure: ABOVE_ZERO,
  yaw: { within: (value) => Math.abs(value) <= 90, words: 'From −90 to 90° is accepted.' },
  s: FROM_ZERO,
  expandedU: FROM_ZERO,
  k: ABOVE_ZERO,
  degreesOfFreedom: ABOVE_ZERO,
  payload: FROM_ZERO,
  beltSpeedRatio: {
    within: (value) => value >= 0 && value <= 2,
    words: 'From 0 to 2 (belt over air speed) is accepted.',
  },
};
