/** What one row of the picture shows, all in C_D·A [m²] and all optional. */
export interface StatementFigures {
  readonly opening?: number;
  /** Where the account stands after each posting, in order. */
  readonly postings?: readonly { readonly after: number; readonly label?: string }[];
  readonly carried?: { readonly value: number; readonly expandedU?: number };
  readonly expected?: number;
  readonly target?: number;
  /** The carried figure rests on simulation only. */
  readonly simulated?: boolean;
}

/** Every value that the axis must hold. */
export function* valuesOf(figures: StatementFigures): Generator<number> {
  const { opening, postings, carried, expected, target } = figures;
  if (opening !== undefined) yield opening;
  for (const posting of postings ?? []) yield posting.after;
  if (carried) {
    yield carried.value - (carried.expandedU ?? 0);
    yield carried.value + (carried.expandedU ?? 0);
  }
  if (expected !== undefined) yield expected;
  if (target !== undefined) yield target;
}
