import { plain, valuesAsText, type InValues } from './in-values';
import type { Method } from './method';

/** One step of a derivation, in the order in which it is carried out. */
export interface DerivationStep {
  readonly methodId: string;
  readonly version: number;
  readonly title: string;
  /** In symbols, as MathML and as plain text. */
  readonly formulaMathml: string;
  readonly formulaText: string;
  readonly values: InValues;
  /** The step's result, unrounded. */
  readonly value: number;
  readonly unit: string;
  readonly source: string;
  readonly assumed: readonly string[];
  readonly cautions: readonly string[];
}

/** One contribution to the uncertainty; shares sum to 1. */
export interface BudgetShare {
  readonly key: string;
  readonly label: string;
  /** Signed amount, in the derivation's unit. */
  readonly amount: number;
  /** Null: infinite. */
  readonly degreesOfFreedom: number | null;
  readonly shareOfVariance: number;
}

/** From a raw value to the figure on screen. */
export interface Derivation {
  /** Of what: kind of figure, result, basis. */
  readonly title: string;
  readonly value: number;
  readonly unit: string;
  readonly standardUncertainty: number;
  readonly expandedUncertainty: number;
  readonly coverageFactor: number;
  readonly steps: readonly DerivationStep[];
  /** Largest share first. */
  readonly budget: readonly BudgetShare[];
}

/** A step as a method carried it out. */
export function stepOf(
  method: Method,
  outcome: {
    readonly values: InValues;
    readonly value: number;
    readonly unit: string;
    readonly assumed?: readonly string[];
    readonly cautions?: readonly string[];
  },
): DerivationStep {
  return {
    methodId: method.id,
    version: method.version,
    title: method.title,
    formulaMathml: method.formulaMathml,
    formulaText: method.formulaText,
    source: method.source,
    assumed: [],
    cautions: [],
    ...outcome,
  };
}

/** The chain of methods of a derivation, `id@version` in order: what is stored with an evaluation. */
export function methodChain({ steps }: Derivation): string[] {
  return steps.map(({ methodId, version }) => `${methodId}@${version}`);
}

function stepAsText(step: DerivationStep, index: number): string[] {
  return [
    `${index + 1}. ${step.title}: ${plain(step.value)}${step.unit === '' ? '' : ` ${step.unit}`}`,
    `   ${step.formulaText}`,
    `   ${valuesAsText(step.values)}`,
    `   source: ${step.source} (${step.methodId}@${step.version})`,
    ...step.assumed.map((words) => `   assumed: ${words}`),
    ...step.cautions.map((words) => `   caution: ${words}`),
  ];
}

/** The whole derivation as text, for a report or a message. */
export function derivationAsText(derivation: Derivation): string {
  const { title, value, unit, expandedUncertainty, coverageFactor, steps, budget } = derivation;
  const lines = [
    title,
    `${plain(value)} ± ${plain(expandedUncertainty)} ${unit} (k = ${plain(coverageFactor)})`,
    '',
    ...steps.flatMap(stepAsText),
  ];
  if (budget.length > 0) lines.push('', 'Uncertainty by what it belongs to:');
  for (const { label, amount, shareOfVariance } of budget) {
    lines.push(`   ${(100 * shareOfVariance).toFixed(1).padStart(5)} %  ${label}: ${plain(amount)} ${unit}`);
  }
  return `${lines.join('\n')}\n`;
}
