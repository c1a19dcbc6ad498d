import { pickEvidence } from '../ranking/evidence';
import type { EvidenceRule, FacilityInput, RankingInput, ResultInput } from '../ranking/ranking-input';
import { reduceResults } from '../reduction/reduce';
import { figureOf, probabilityLower } from '../uncertainty/budget';
import { aRanking, aVariant } from './ranking-builders';
import { normalNumbers } from './simulation';

/**
 * Programmes with known truth: drag areas are drawn, measured with errors that are drawn too, and handed to the product as if they had been
 * measured. What it then says of its uncertainty can be held against what is true.
 */
export interface SimulatedScatter {
  /** Besides everything that a key describes, each result is off by this [m²]; the product is not told. */
  readonly unkeyedM2: number;
  readonly evidence: EvidenceRule;
}

/** What was claimed and what was true, over all programmes. */
export interface CoverageTally {
  readonly figures: number;
  /** Figures whose truth lies within ±U. */
  readonly covered: number;
  readonly pairs: number;
  /** Pairs that were called separable at 95 %. */
  readonly claimed: number;
  /** Of those, pairs whose true order is the other one. */
  readonly wrong: number;
  /** Weighted means whose Birge ratio is above 1. */
  readonly widened: number;
}

const VARIANTS = 6;
const RESULTS_OF_A_VARIANT = 3;
const SESSIONS = 2;
const READINGS = 5;
const CONFIDENCE = 0.95;

/** True spreads [m²]; the facility's session scatter is known from a check body, so only as well as its degrees of freedom allow. */
const TRUE = {
  level: 0.6,
  betweenVariants: 0.008,
  bias: 0.004,
  session: 0.002,
  sessionNu: 12,
  installation: 0.001,
  reading: 0.0015,
  methodU: 0.3,
} as const;
const FACILITIES = ['north', 'south', 'west'] as const;
const SECTION_M2 = 30;
const FRONTAL_M2 = 2.24;
/** Blockage by area ratio: what a full-size drag area is multiplied by. */
const CORRECTION = 1 / (1 + FRONTAL_M2 / SECTION_M2 / 4) ** 2;

interface TrueFacility {
  readonly input: FacilityInput;
  readonly bias: number;
  readonly sessions: readonly number[];
  /** The true correction over the one that the method makes. */
  readonly method: number;
}

function facilityOf(id: string, normal: () => number): TrueFacility {
  const checkBody = Array.from({ length: TRUE.sessionNu }, () => normal() ** 2);
  const estimate = Math.sqrt(checkBody.reduce((sum, x) => sum + x, 0) / TRUE.sessionNu);
  return {
    input: {
      id,
      kind: 'closed',
      areaM2: SECTION_M2,
      blockage: { method: 'area-ratio', uFractionOfCorrection: TRUE.methodU },
      biasUM2: TRUE.bias,
      sessionUM2: TRUE.session * estimate,
      sessionDegreesOfFreedom: TRUE.sessionNu,
      installationUM2: TRUE.installation,
    },
    bias: TRUE.bias * normal(),
    sessions: Array.from({ length: SESSIONS }, () => TRUE.session * normal()),
    method: 1 + TRUE.methodU * normal(),
  };
}

/** Mean and standard deviation of one reading, as a test sheet has them. */
function readings(trueValue: number, normal: () => number): { value: number; s: number; n: number } {
  const list = Array.from({ length: READINGS }, () => trueValue + TRUE.reading * normal());
  const value = list.reduce((sum, x) => sum + x, 0) / READINGS;
  const s = Math.sqrt(list.reduce((sum, x) => sum + (x - value) ** 2, 0) / (READINGS - 1));
  return { value, s, n: READINGS };
}

function resultOf(
  variantId: string,
  index: number,
  truth: number,
  { input: facility, bias, sessions, method }: TrueFacility,
  unkeyedM2: number,
  normal: () => number,
): ResultInput {
  const session = index % SESSIONS;
  const uncorrected = truth / (1 + (CORRECTION - 1) * method);
  const errors = bias + (sessions[session] ?? 0) + TRUE.installation * normal() + unkeyedM2 * normal();
  return {
    id: `${variantId}-${index}`,
    variantId,
    facilityId: facility.id,
    sessionId: `${facility.id}-${session}`,
    testDate: `2031-0${index + 1}-01`,
    quantity: 'drag-area',
    scale: 1,
    speedKmh: 140,
    air: { state: 'iso-2533-sea-level' },
    condition: { ground: 'five-belts', wheels: 'rotating' },
    points: [readings(uncorrected + errors / CORRECTION, normal)],
  };
}

interface SimulatedProgramme {
  readonly input: RankingInput;
  readonly truth: ReadonlyMap<string, number>;
}

function programmeOf({ unkeyedM2, evidence }: SimulatedScatter, normal: () => number): SimulatedProgramme {
  const facilities = FACILITIES.map((id) => facilityOf(id, normal));
  const ids = Array.from({ length: VARIANTS }, (_, i) => `v${i}`);
  const truth = new Map(ids.map((id) => [id, TRUE.level + TRUE.betweenVariants * normal()]));
  const results = ids.flatMap((id, v) =>
    Array.from({ length: RESULTS_OF_A_VARIANT }, (_, i) => {
      const facility = facilities[(v + i) % facilities.length] as TrueFacility;
      return resultOf(id, i, truth.get(id) ?? NaN, facility, unkeyedM2, normal);
    }),
  );
  return {
    input: aRanking({
      facilities: facilities.map(({ input }) => input),
      variants: ids.map((id) => aVariant(id, { frontalAreaM2: FRONTAL_M2, frontalAreaUM2: 0, evidence })),
      results,
    }),
    truth,
  };
}

function tallyOf({ input, truth }: SimulatedProgramme): CoverageTally {
  const { chosen } = pickEvidence(input.variants, reduceResults(input), 'zero-yaw');
  let [covered, pairs, claimed, wrong] = [0, 0, 0, 0];
  const trueOf = (id: string): number => truth.get(id) ?? NaN;
  chosen.forEach(({ variant: { id }, figure }, i) => {
    const { dragAreaM2, expandedUncertaintyM2 } = figureOf(figure);
    if (Math.abs(dragAreaM2 - trueOf(id)) <= expandedUncertaintyM2) covered++;
    for (const { variant: other, figure: its } of chosen.slice(i + 1)) {
      pairs++;
      const lower = probabilityLower(figure, its);
      if (Math.max(lower, 1 - lower) < CONFIDENCE) continue;
      claimed++;
      if (lower > 0.5 !== trueOf(id) < trueOf(other.id)) wrong++;
    }
  });
  const widened = chosen.filter(({ combination }) => (combination?.birgeRatio ?? 0) > 1).length;
  return { figures: chosen.length, covered, pairs, claimed, wrong, widened };
}

/** Measures many programmes of known truth, seeded. */
export function simulateProgrammes(count: number, scatter: SimulatedScatter, seed: number): CoverageTally {
  const normal = normalNumbers(seed);
  const total = { figures: 0, covered: 0, pairs: 0, claimed: 0, wrong: 0, widened: 0 };
  for (let i = 0; i < count; i++) {
    const tally = tallyOf(programmeOf(scatter, normal));
    for (const name of Object.keys(total) as (keyof CoverageTally)[]) total[name] += tally[name];
  }
  return total;
}
