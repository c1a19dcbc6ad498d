import { KM_PER_MILE } from '#shared/core/constants';
import type { CycleTrace } from '#shared/core/cycles/cycle';
import { HWFET } from './hwfet';
import { NEDC_OPERATIONS, traceOfOperations } from './nedc';
import { readTenths } from './tenths';
import { UDDS } from './udds';
import { US06 } from './us06';
import { WLTC_HIGH_3A, WLTC_MEDIUM_3A } from './wltc-class-3a';
import { WLTC_HIGH_3B, WLTC_MEDIUM_3B } from './wltc-class-3b';
import { WLTC_EXTRA_HIGH_3, WLTC_LOW_3 } from './wltc-low-and-extra-high';

/** A part of a cycle with a name of its own, from one time to another [s]. */
export interface CyclePhase {
  readonly title: string;
  readonly fromS: number;
  readonly toS: number;
}

/** A cycle of a regulation, with 1 Hz rows from t = 0. */
export interface BuiltInCycle {
  readonly name: BuiltInCycleName;
  readonly title: string;
  /** Where the figures are printed. */
  readonly source: string;
  /** Parts that the regulation reports apart, without gaps from first to last second. */
  readonly phases: readonly CyclePhase[];
}

export const BUILT_IN_CYCLE_NAMES = [
  'wltc-class-3b',
  'wltc-class-3a',
  'nedc',
  'udds',
  'hwfet',
  'us06',
] as const;
export type BuiltInCycleName = (typeof BUILT_IN_CYCLE_NAMES)[number];

/** Phases that follow each other: title and second at which each ends. */
function phases(...ends: readonly (readonly [title: string, toS: number])[]): readonly CyclePhase[] {
  return ends.map(([title, toS], i) => ({ title, fromS: ends[i - 1]?.[1] ?? 0, toS }));
}

const WLTC_PHASES = phases(['Low', 589], ['Medium', 1022], ['High', 1477], ['Extra high', 1800]);

/** The built-in cycles, in the order in which they are offered. */
export const BUILT_IN_CYCLES: readonly BuiltInCycle[] = [
  {
    name: 'wltc-class-3b',
    title: 'WLTC class 3b',
    source: 'UN GTR No. 15, Annex 1: Low 3, Medium 3-2, High 3-2, Extra high 3',
    phases: WLTC_PHASES,
  },
  {
    name: 'wltc-class-3a',
    title: 'WLTC class 3a',
    source: 'UN GTR No. 15, Annex 1: Low 3, Medium 3-1, High 3-1, Extra high 3',
    phases: WLTC_PHASES,
  },
  {
    name: 'nedc',
    title: 'NEDC',
    source: 'UN Regulation No. 83, Annex 4a: tables of operations of Part One (four times) and Part Two',
    phases: phases(
      ['Urban 1', 195],
      ['Urban 2', 390],
      ['Urban 3', 585],
      ['Urban 4', 780],
      ['Extra-urban', 1180],
    ),
  },
  {
    name: 'udds',
    title: 'UDDS (city)',
    source: '40 CFR Part 86, Appendix I(a)',
    phases: phases(['Transient', 505], ['Stabilised', 1369]),
  },
  {
    name: 'hwfet',
    title: 'HWFET (highway)',
    source: '40 CFR Part 600, Appendix I',
    phases: phases(['Highway', 765]),
  },
  {
    name: 'us06',
    title: 'US06',
    source: '40 CFR Part 86, Appendix I(g)',
    phases: phases(['Whole schedule', 600]),
  },
];

/** Rows at 1 Hz from t = 0; the speeds are tenths of a unit of so many km/h. */
function traceOfTenths(tenths: readonly number[], unitKmh: number): CycleTrace {
  return {
    timeS: tenths.map((_, second) => second),
    speedKmh: tenths.map((tenth) => (tenth / 10) * unitKmh),
  };
}

const wltc = (...tables: readonly string[]): CycleTrace => traceOfTenths(tables.flatMap(readTenths), 1);
/** The schedules of 40 CFR are printed in tenths of mph; they are converted without rounding. */
const inMph = (table: string): CycleTrace => traceOfTenths(readTenths(table), KM_PER_MILE);

const TRACES: Readonly<Record<BuiltInCycleName, () => CycleTrace>> = {
  'wltc-class-3b': () => wltc(WLTC_LOW_3, WLTC_MEDIUM_3B, WLTC_HIGH_3B, WLTC_EXTRA_HIGH_3),
  'wltc-class-3a': () => wltc(WLTC_LOW_3, WLTC_MEDIUM_3A, WLTC_HIGH_3A, WLTC_EXTRA_HIGH_3),
  nedc: () => traceOfOperations(NEDC_OPERATIONS),
  udds: () => inMph(UDDS),
  hwfet: () => inMph(HWFET),
  us06: () => inMph(US06),
};

const isBuiltIn = (name: string): name is BuiltInCycleName => Object.hasOwn(TRACES, name);
const read = new Map<BuiltInCycleName, CycleTrace>();

/** Rows of a built-in cycle (time in s, speed in km/h), or undefined where the name is not one of them. */
export function builtInCycle(name: BuiltInCycleName): CycleTrace;
export function builtInCycle(name: string): CycleTrace | undefined;
export function builtInCycle(name: string): CycleTrace | undefined {
  if (!isBuiltIn(name)) return undefined;
  const trace = read.get(name) ?? TRACES[name]();
  read.set(name, trace);
  return trace;
}
