/**
 * The notation of the speed tables in this folder: one whole number a second, the printed speed in tenths, separated by
 * blanks; `120x3` stands for three seconds at 120. Up to 20 seconds a line, so that a line is easily found again in the
 * regulation's table. Figures stay whole numbers up to the last moment: their sums are compared with the published
 * checksums exactly.
 *
 * @throws {SyntaxError} where a word is no whole number
 */
export function readTenths(table: string): readonly number[] {
  return table
    .trim()
    .split(/\s+/)
    .flatMap((word) => {
      const [, tenths, times = '1'] = /^(\d+)(?:x(\d+))?$/.exec(word) ?? [];
      if (tenths === undefined) throw new SyntaxError(`“${word}” is no speed in tenths`);
      return Array<number>(Number(times)).fill(Number(tenths));
    });
}
