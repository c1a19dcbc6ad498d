import { differenceOf, figureOf, keyedFigureOf, probabilityLower } from './budget';
import type { Figure, FigureInput } from './figure';

/** Input of the operation `budget`. */
export interface BudgetInput {
  readonly figure: FigureInput;
  readonly other?: FigureInput | null | undefined;
}

export interface BudgetOutput {
  readonly figure: Figure;
  /** figure − other, by key. */
  readonly difference?: Figure;
  readonly probabilityFigureLower?: number;
}

/** The operation `budget`: a figure's budget, and with a second figure their difference by key. */
export function evaluateBudget(input: BudgetInput): BudgetOutput {
  const figure = keyedFigureOf(input.figure);
  if (input.other == null) return { figure: figureOf(figure) };
  const other = keyedFigureOf(input.other);
  return {
    figure: figureOf(figure),
    difference: figureOf(differenceOf(figure, other)),
    probabilityFigureLower: probabilityLower(figure, other),
  };
}
