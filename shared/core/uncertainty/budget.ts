import { AMOUNT_FLOOR_M2, COVERAGE_PROBABILITY } from '../constants';
import { byCodeUnits } from '../text-order';
import type { Contribution, Figure, FigureInput } from './figure';
import { studentCdf, studentQuantile } from './student';

/** One amount of uncertainty: signed, with what it belongs to. */
export interface Amount {
  readonly key: string;
  /** Signed standard uncertainty [m²]. */
  readonly amountM2: number;
  /** Infinity where nothing is known against it. */
  readonly degreesOfFreedom: number;
  /** Amounts of one estimate are pooled in Welch–Satterthwaite. */
  readonly varianceEstimate: string;
}

/** One amount a key, sorted by key, none below 1e-15 m². */
export type Budget = readonly Amount[];

/** A drag area [m²] with its budget: what calculations hand on. */
export interface KeyedFigure {
  readonly dragAreaM2: number;
  readonly budget: Budget;
}

export function amount(
  key: string,
  amountM2: number,
  degreesOfFreedom: number | null | undefined = Infinity,
  varianceEstimate: string | null | undefined = key,
): Amount {
  return {
    key,
    amountM2,
    degreesOfFreedom: degreesOfFreedom ?? Infinity,
    varianceEstimate: varianceEstimate ?? key,
  };
}

/** Amounts of one key add with their signs; the smallest ν and the first variance estimate hold (method section 9). */
function together(a: Amount, b: Amount): Amount {
  return {
    key: a.key,
    amountM2: a.amountM2 + b.amountM2,
    degreesOfFreedom: Math.min(a.degreesOfFreedom, b.degreesOfFreedom),
    varianceEstimate: a.varianceEstimate,
  };
}

const isListed = ({ amountM2 }: Amount): boolean => Math.abs(amountM2) >= AMOUNT_FLOOR_M2;

/** Up to here inserting in order is quicker than a table by key: a result has about ten amounts, and there are thousands. */
const FEW_AMOUNTS = 24;

function manyByKey(amounts: readonly Amount[]): Amount[] {
  const byKey = new Map<string, Amount>();
  for (const entry of amounts) {
    const before = byKey.get(entry.key);
    byKey.set(entry.key, before === undefined ? entry : together(before, entry));
  }
  return [...byKey.values()].sort((a, b) => byCodeUnits(a.key, b.key));
}

function fewByKey(amounts: readonly Amount[]): Amount[] {
  const entries: Amount[] = [];
  for (const entry of amounts) {
    let at = entries.length;
    while (at > 0 && (entries[at - 1] as Amount).key > entry.key) at--;
    const before = entries[at - 1];
    if (before !== undefined && before.key === entry.key) {
      entries[at - 1] = together(before, entry);
      continue;
    }
    entries.push(entry);
    for (let i = entries.length - 1; i > at; i--) entries[i] = entries[i - 1] as Amount;
    entries[at] = entry;
  }
  return entries;
}

export function budgetOf(amounts: Iterable<Amount>): Budget {
  const list = Array.isArray(amounts) ? (amounts as readonly Amount[]) : [...amounts];
  const entries = list.length <= FEW_AMOUNTS ? fewByKey(list) : manyByKey(list);
  return entries.every(isListed) ? entries : entries.filter(isListed);
}

/** An amount times a factor. Its fields are written out: a spread is many times slower, and there are ten a result. */
export function timesOf(entry: Amount, factor: number): Amount {
  const { key, amountM2, degreesOfFreedom, varianceEstimate } = entry;
  return { key, amountM2: amountM2 * factor, degreesOfFreedom, varianceEstimate };
}

/** Every amount times one factor, as a later step does that multiplies the figure. */
export function scaled(amounts: Iterable<Amount>, factor: number): Amount[] {
  const times: Amount[] = [];
  for (const entry of amounts) times.push(timesOf(entry, factor));
  return times;
}

export function keyedFigureOf(input: FigureInput): KeyedFigure {
  const amounts = (input.contributions ?? []).map((entry) =>
    amount(entry.key, entry.amountM2, entry.degreesOfFreedom, entry.varianceEstimate),
  );
  return { dragAreaM2: input.dragAreaM2, budget: budgetOf(amounts) };
}

function variance(amounts: Iterable<Amount>): number {
  let sum = 0;
  for (const { amountM2 } of amounts) sum += amountM2 * amountM2;
  return sum;
}

/** u [m²]: the root of the sum of squares over keys (JCGM 100:2008, 5.1.2); below 1e-15 m² it counts as 0. */
export function standardUncertainty(budget: Budget): number {
  const u = Math.sqrt(variance(budget));
  return u < AMOUNT_FLOOR_M2 ? 0 : u;
}

/**
 * ν_eff by Welch–Satterthwaite (JCGM 100:2008, G.4.1), not truncated: u⁴ over Σ (Σc²)²/ν, the inner sum over the amounts of one
 * variance estimate and ν their smallest. Infinity where every ν is, or there is no uncertainty.
 */
export function effectiveDegreesOfFreedom(amounts: Budget): number {
  let denominator = 0;
  for (const { key, amountM2, degreesOfFreedom, varianceEstimate } of amounts) {
    if (varianceEstimate !== key) return pooledDegreesOfFreedom(amounts);
    const square = amountM2 * amountM2;
    denominator += (square * square) / degreesOfFreedom;
  }
  const total = variance(amounts);
  return denominator > 0 ? (total * total) / denominator : Infinity;
}

function pooledDegreesOfFreedom(amounts: Budget): number {
  const estimates = new Map<string, { squares: number; nu: number }>();
  for (const { amountM2, degreesOfFreedom, varianceEstimate } of amounts) {
    const estimate = estimates.get(varianceEstimate);
    if (estimate === undefined) {
      estimates.set(varianceEstimate, { squares: amountM2 * amountM2, nu: degreesOfFreedom });
    } else {
      estimate.squares += amountM2 * amountM2;
      estimate.nu = Math.min(estimate.nu, degreesOfFreedom);
    }
  }
  let denominator = 0;
  for (const { squares, nu } of estimates.values()) denominator += (squares * squares) / nu;
  const total = variance(amounts);
  return denominator > 0 ? (total * total) / denominator : Infinity;
}

const orNull = (degreesOfFreedom: number): number | null =>
  degreesOfFreedom === Infinity ? null : degreesOfFreedom;

function contributionOf(entry: Amount, totalVariance: number): Contribution {
  const { key, amountM2, varianceEstimate } = entry;
  const contribution = {
    key,
    amountM2,
    degreesOfFreedom: orNull(entry.degreesOfFreedom),
    shareOfVariance: (amountM2 * amountM2) / totalVariance,
  };
  return varianceEstimate === key ? contribution : { ...contribution, varianceEstimate };
}

/** The figure with its budget: U = t·u, t the Student quantile at 0.97725 for ν_eff (method section 9). */
export function figureOf({ dragAreaM2, budget }: KeyedFigure): Figure {
  const u = standardUncertainty(budget);
  const nu = effectiveDegreesOfFreedom(budget);
  const coverageFactor = studentQuantile(COVERAGE_PROBABILITY, nu);
  const totalVariance = variance(budget);
  return {
    dragAreaM2,
    standardUncertaintyM2: u,
    effectiveDegreesOfFreedom: orNull(nu),
    coverageFactor,
    expandedUncertaintyM2: coverageFactor * u,
    contributions: budget.map((entry) => contributionOf(entry, totalVariance)),
  };
}

/** a − b by key: what both hold under one key cancels. */
export function differenceOf(a: KeyedFigure, b: KeyedFigure): KeyedFigure {
  return {
    dragAreaM2: a.dragAreaM2 - b.dragAreaM2,
    budget: budgetOf([...a.budget, ...scaled(b.budget, -1)]),
  };
}

/** T_ν(difference/u); without uncertainty 0, ½ or 1 (method section 14). */
export function probabilityAbove(difference: number, u: number, degreesOfFreedom: number): number {
  if (u < AMOUNT_FLOOR_M2) return difference > 0 ? 1 : difference < 0 ? 0 : 0.5;
  return studentCdf(difference / u, degreesOfFreedom);
}

/** P(a < b), Student's distribution of the difference by keys. */
export function probabilityLower(a: KeyedFigure, b: KeyedFigure): number {
  const difference = differenceOf(b, a);
  return probabilityAbove(
    difference.dragAreaM2,
    standardUncertainty(difference.budget),
    effectiveDegreesOfFreedom(difference.budget),
  );
}
