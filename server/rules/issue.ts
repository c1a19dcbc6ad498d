import type { Problem } from '#shared/contracts/problem';

/** One thing that is wrong with a content: the field as a dotted path, what is wrong and what would be accepted. */
export type Issue = NonNullable<Problem['issues']>[number];

/** Collects what is wrong, so that a person is told everything at once and not one thing at a time. */
export class Issues {
  readonly #list: Issue[] = [];

  /** Adds an issue where the condition of a rule is broken. */
  when(broken: boolean, where: string, detail: string, reason?: string): this {
    if (broken) this.#list.push(reason === undefined ? { where, detail } : { where, detail, reason });
    return this;
  }

  add(issues: readonly Issue[]): this {
    this.#list.push(...issues);
    return this;
  }

  get list(): readonly Issue[] {
    return this.#list;
  }
}

/** Positions of entries whose text another entry before them has, capital letters and spaces at the ends aside. */
export function repeated(texts: readonly string[]): readonly number[] {
  const seen = new Set<string>();
  return texts.flatMap((text, position) => {
    const plain = text.trim().toLowerCase();
    const again = seen.has(plain);
    seen.add(plain);
    return again ? [position] : [];
  });
}

/** Positions of ids that are not among the known ones or stand twice; entries without an id are new and pass. */
export function strangers(
  ids: readonly (string | undefined)[],
  known: ReadonlySet<string>,
): readonly number[] {
  const met = new Set<string>();
  return ids.flatMap((id, position) => {
    if (id === undefined) return [];
    const strange = met.has(id) || !known.has(id);
    met.add(id);
    return strange ? [position] : [];
  });
}
