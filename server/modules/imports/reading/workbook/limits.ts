import { UnreadableFile } from '../unreadable-file';

/** What reading a workbook may cost, whatever it holds. */
export interface WorkbookLimits {
  readonly parts: number;
  /** Of all parts together, as the archive declares them; a part that inflates to more than it declares is refused. */
  readonly inflatedBytes: number;
  /** Of the texts that cells share, which are held in memory. */
  readonly sharedCharacters: number;
  readonly mergedAreas: number;
  /** Less than a transaction may wait for its next statement (db/pools.ts): the refusal comes in words. */
  readonly milliseconds: number;
}

export const WORKBOOK_LIMITS: WorkbookLimits = {
  parts: 2000,
  inflatedBytes: 128 * 1024 * 1024,
  sharedCharacters: 32 * 1024 * 1024,
  mergedAreas: 20_000,
  milliseconds: 45_000,
};

/** Ends work that takes too long; asked after every piece of it. */
export class TimeAllowed {
  readonly #until: number;

  constructor(private readonly milliseconds: number) {
    this.#until = performance.now() + milliseconds;
  }

  /** @throws {UnreadableFile} when the time is over */
  check(): void {
    if (performance.now() > this.#until)
      throw new UnreadableFile(
        'too-large',
        `Reading this workbook takes longer than ${String(this.milliseconds / 1000)} s. Leave out sheets that are not needed, or save the sheet with the results as CSV and bring that in.`,
      );
  }
}

/** A workbook that contradicts itself or its format. */
export function damaged(what: string): UnreadableFile {
  return new UnreadableFile(
    'unusable-input',
    `The workbook is damaged: ${what} Open it where it was made, save it anew as .xlsx and bring that in.`,
  );
}
