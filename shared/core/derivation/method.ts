/** A named, versioned method: a changed formula is a new version beside the old one. */
export interface Method {
  readonly id: string;
  readonly version: number;
  readonly title: string;
  /** The formula in symbols, as MathML and as plain text. */
  readonly formulaMathml: string;
  readonly formulaText: string;
  readonly source: string;
  /** Where it holds, and what it leaves out. */
  readonly validity: string;
}

/** `id@version`, as it is stored with an evaluation. */
export function nameOf({ id, version }: Method): string {
  return `${id}@${version}`;
}
