import type { ResultState } from '#shared/contracts/results';

/** What decides where a result stands. */
export interface StateFacts {
  readonly withdrawn: boolean;
  readonly checked: boolean;
  /** Its variant rests on it now. */
  readonly adopted: boolean;
  /** Its variant rested on it at some time. */
  readonly wasAdopted: boolean;
  /** Its variant rests on other results now. */
  readonly othersAdopted: boolean;
}

/** Where a result stands. After a released adoption it is what it was before: checked. */
export function stateOf({ withdrawn, checked, adopted, wasAdopted, othersAdopted }: StateFacts): ResultState {
  if (withdrawn) return 'withdrawn';
  if (adopted) return 'adopted';
  if (wasAdopted && othersAdopted) return 'superseded';
  return checked ? 'checked' : 'entered';
}
