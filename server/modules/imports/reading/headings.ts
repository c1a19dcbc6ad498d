export interface Headings {
  readonly names: readonly string[];
  /** What was changed to make them tell apart, in words. */
  readonly notes: readonly string[];
}

/**
 * Makes headings unique: a repeated one carries its number, an empty one its place. Empty cells after the last heading
 * are no columns.
 */
export function headingsOf(cells: readonly string[]): Headings {
  let width = cells.length;
  while (width > 0 && cells[width - 1]?.trim() === '') width -= 1;
  const seen = new Map<string, number>();
  const repeats = new Set<string>();
  const taken = new Set<string>();
  let unnamed = 0;
  const names = cells.slice(0, width).map((cell, index) => {
    const written = cell.trim().replace(/\s+/g, ' ').slice(0, 200);
    if (written === '') {
      unnamed += 1;
      return uniquely(`Column ${String(index + 1)}`, taken);
    }
    const times = (seen.get(written.toLowerCase()) ?? 0) + 1;
    seen.set(written.toLowerCase(), times);
    if (times > 1) repeats.add(written);
    return uniquely(times === 1 ? written : `${written} (${String(times)})`, taken);
  });
  const notes = [
    ...[...repeats].map(
      (heading) => `The heading “${heading}” stands more than once; the later ones are numbered.`,
    ),
    ...(unnamed > 0 ? [`${String(unnamed)} column(s) without a heading are named by their place.`] : []),
  ];
  return { names, notes };
}

function uniquely(name: string, taken: Set<string>): string {
  let free = name;
  for (let number = 2; taken.has(free.toLowerCase()); number += 1) free = `${name} (${String(number)})`;
  taken.add(free.toLowerCase());
  return free;
}
