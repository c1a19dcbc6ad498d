/** The same twice: as a person reads it, and plain and machine-readable for what is copied. */
export interface Worded {
  readonly shown: string;
  readonly plain: string;
}

/** One step of a derivation, in the order in which it is carried out. */
export interface DerivationStep {
  readonly title: string;
  /** The step's result with its unit: `0.2747` or `899.3 Pa`. */
  readonly result: Worded;
  /** The formula in symbols: MathML and the same as plain text. */
  readonly formulaMathml: string;
  readonly formulaText: string;
  /** The formula with its values; symbols as `C_D`. Empty where they may not be shown. */
  readonly values: Worded;
  readonly source: string;
  /** Method and version that carried it out, `id@version`. */
  readonly method: string;
  readonly changed?: string;
  readonly assumed: readonly string[];
  readonly cautions: readonly string[];
}

/** One contribution to the uncertainty; the shares of a budget sum to 1. */
export interface BudgetShare {
  readonly label: string;
  /** Share of the variance, 0 to 1. */
  readonly share: number;
  /** Standard uncertainty with its unit. */
  readonly u?: Worded;
  /** Degrees of freedom ν behind it; `∞` where nothing is known against it. */
  readonly freedom?: string;
}

/** Everything the sheet shows of one figure. */
export interface Derivation {
  /** The figure as it reads: value, U and unit apart, so that U is set smaller. */
  readonly figure: {
    readonly value: string;
    readonly expandedU?: string;
    readonly unit: string;
    /** All of it with every digit, for what is copied. */
    readonly plain: string;
  };
  /** What the figure is: variant, kind, basis, evidence, coverage factor. */
  readonly summary: string;
  readonly steps: readonly DerivationStep[];
  readonly budget: readonly BudgetShare[];
  readonly budgetNote?: string;
}
