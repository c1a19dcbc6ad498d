/** One measured figure, as a sentence that names what it is compared with. */
export interface BenchLine {
  readonly what: string;
  /** The figure with its unit or its ratio. */
  readonly measured: string;
  /** The goal in words and whether it is met; absent where the figure is for information. */
  readonly goal?: { readonly words: string; readonly met: boolean };
}

/** A part of `npm run bench`: it can be run alone by its name. */
export interface BenchPart {
  readonly name: string;
  run(): Promise<readonly BenchLine[]>;
}

/** A line as it is printed. */
export function lineAsText(name: string, { what, measured, goal }: BenchLine): string {
  const verdict = goal === undefined ? '' : ` (goal ${goal.words}: ${goal.met ? 'met' : 'NOT met'})`;
  return `${name}: ${what}: ${measured}${verdict}`;
}
