import type { Facility } from '#shared/contracts/facilities';
import type { CheckSurroundings } from '#shared/core/checks/checks-of';

/** A variant as rows are checked against it: one of the programme, or one that the import creates. */
export interface KnownVariant {
  /** The id; for one that is still to be created a placeholder of the import's own. */
  readonly key: string;
  readonly name: string;
  readonly frontalAreaM2: number;
  readonly bodyShape: string;
}

/** What rows are checked against. Everything comes in, so that the same rows always get the same verdicts. */
export interface CheckContext {
  readonly latestPastDay: string;
  readonly variantOf: (text: string) => KnownVariant | 'skip' | undefined;
  readonly facilityOf: (text: string) => Facility | undefined;
  /** A result of this name that counts is in the programme already. */
  readonly isNameTaken: (name: string) => boolean;
  /** The programme's reference and the limits in force; without a usable reference no check is made. */
  readonly checks: CheckSurroundings | undefined;
}

/** How names are compared: capital letters and the number of spaces make no difference. */
export function nameKey(text: string): string {
  return text.trim().replace(/\s+/g, ' ').toLowerCase();
}
