/** A field that can differ between two people's edits, with how its value reads. */
export interface ComparedField<T> {
  readonly label: string;
  readonly read: (value: T) => string;
}

export interface ConflictRow {
  readonly label: string;
  /** As it stood when the person began. */
  readonly before: string;
  readonly mine: string;
  readonly theirs: string;
  /** Both changed it, to different values. */
  readonly clash: boolean;
}

/** The fields in which my edit, a colleague's, or both depart from what I opened, in the order of the form. */
export function conflictRows<T>(
  fields: readonly ComparedField<T>[],
  versions: { readonly before: T; readonly mine: T; readonly theirs: T },
): readonly ConflictRow[] {
  return fields
    .map(({ label, read }) => {
      const before = read(versions.before);
      const mine = read(versions.mine);
      const theirs = read(versions.theirs);
      return { label, before, mine, theirs, clash: mine !== before && theirs !== before && mine !== theirs };
    })
    .filter(({ before, mine, theirs }) => mine !== before || theirs !== before);
}
