import type { RESULT_EVENTS, ResultState } from '#shared/contracts/results';

/** Where a result stands; each state has a shape of its own beside the word. */
export const STATE_WORDS: Readonly<Record<ResultState, string>> = {
  entered: $localize`entered`,
  checked: $localize`checked`,
  adopted: $localize`adopted`,
  superseded: $localize`superseded`,
  withdrawn: $localize`withdrawn`,
};
export const STATE_SHAPES: Readonly<Record<ResultState, string>> = {
  entered: '○',
  checked: '◐',
  adopted: '●',
  superseded: '◌',
  withdrawn: '✕',
};

export const EVENT_WORDS: Readonly<Record<(typeof RESULT_EVENTS)[number], string>> = {
  entered: $localize`entered`,
  checked: $localize`checked`,
  'check-taken-back': $localize`check taken back`,
  judged: $localize`judged`,
  adopted: $localize`adopted`,
  superseded: $localize`superseded`,
  released: $localize`released`,
  withdrawn: $localize`withdrawn`,
};
