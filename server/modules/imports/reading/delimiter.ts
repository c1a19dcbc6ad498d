import { parse } from 'csv-parse/sync';
import { DELIMITERS } from '#shared/contracts/imports';

export type Delimiter = (typeof DELIMITERS)[number];

/** How a file's text is cut into records, whatever its delimiter. A stray quotation mark (19" wheels) is text. */
export const RECORD_OPTIONS = {
  relax_column_count: true,
  relax_quotes: true,
  skip_empty_lines: false,
  record_delimiter: ['\r\n', '\n', '\r'],
  max_record_size: 1_000_000,
};

/**
 * The delimiter that cuts the beginning of the file into the most even table: most records of the commonest width,
 * wider tables before narrower ones. The semicolon wins a draw, because then the comma is the decimal sign.
 */
export function guessDelimiter(beginning: string): Delimiter {
  const stated = /^sep=([;,\t])\r?\n/i.exec(beginning)?.[1];
  if (stated !== undefined) return DELIMITERS.find((delimiter) => delimiter === stated) ?? ';';
  const lastBreak = Math.max(beginning.lastIndexOf('\n'), beginning.lastIndexOf('\r'));
  const whole = lastBreak > 0 ? beginning.slice(0, lastBreak) : beginning;
  let best: { readonly delimiter: Delimiter; readonly score: number } = { delimiter: ';', score: 0 };
  for (const delimiter of DELIMITERS) {
    const score = evenness(whole, delimiter);
    if (score > best.score * 1.0001) best = { delimiter, score };
  }
  return best.delimiter;
}

function evenness(text: string, delimiter: Delimiter): number {
  const widths = new Map<number, number>();
  let total = 0;
  for (const record of recordsOf(text, delimiter)) {
    if (record.every((cell) => cell.trim() === '')) continue;
    total += 1;
    widths.set(record.length, (widths.get(record.length) ?? 0) + 1);
  }
  let best = 0;
  for (const [width, count] of widths) {
    if (width < 2) continue;
    best = Math.max(best, (count / total) * (1 + Math.log2(width) / 10));
  }
  return best;
}

function recordsOf(text: string, delimiter: Delimiter): readonly string[][] {
  try {
    return parse(text, { ...RECORD_OPTIONS, delimiter, to: 200 });
  } catch {
    // A quotation mark left open at the end of the sample: the lines themselves are enough for a guess.
    return text
      .split(/\r\n|\n|\r/)
      .slice(0, 200)
      .map((line) => line.split(delimiter));
  }
}
