import type { StatementFigures } from './statement-figures';

export interface SentenceWords {
  figure(value: number, expandedU?: number): string;
}

/** The row's picture in words, for those who listen. */
export function statementSentence(figures: StatementFigures, words: SentenceWords): string {
  const { opening, postings, carried, expected, target, simulated } = figures;
  const parts: string[] = [];
  if (opening !== undefined) parts.push($localize`opens at ${words.figure(opening)}:FIGURE:`);
  if (postings?.length === 1) parts.push($localize`one posting`);
  else if (postings?.length) parts.push($localize`${postings.length}:COUNT: postings`);
  if (carried) {
    const figure = words.figure(carried.value, carried.expandedU);
    parts.push(
      simulated
        ? $localize`carried ${figure}:FIGURE:, simulated and not measured`
        : $localize`carried ${figure}:FIGURE:`,
    );
  }
  if (expected !== undefined) parts.push($localize`expected ${words.figure(expected)}:FIGURE:`);
  if (target !== undefined) {
    parts.push($localize`target ${words.figure(target)}:FIGURE:`);
    if (carried && carried.value > target) parts.push($localize`over target`);
    else if (carried) parts.push($localize`inside target`);
  }
  return parts.length ? $localize`Drag area: ${parts.join('; ')}:PARTS:.` : $localize`No drag area yet.`;
}
