import type { askInDialog } from '../../../ui/confirm-dialog/confirm-dialog';

type Question = Parameters<typeof askInDialog>[0];

const cancel = $localize`Cancel`;
const reasonLabel = $localize`Why (at least three characters)`;

/** The questions that a judgement asks before it is made: each demands its reason in writing. */
export const includeQuestion = (name: string): Question => ({
  title: $localize`Include ${name}:RESULT: although it is not comparable?`,
  detail: $localize`It then counts like any other result. The reason is shown wherever its figure is.`,
  confirm: $localize`Include`,
  cancel,
  reasonLabel,
});

export const setAsideQuestion = (name: string): Question => ({
  title: $localize`Set ${name}:RESULT: aside?`,
  detail: $localize`It stays readable and counts for nothing until somebody brings it back. The reason is listed where the ranking says what stayed out.`,
  confirm: $localize`Set aside`,
  cancel,
  reasonLabel,
});

export const checkQuestion = (name: string): Question => ({
  title: $localize`Have you checked ${name}:RESULT:?`,
  detail: $localize`Checked means: somebody looked its values, condition and checks through and stands behind them.`,
  confirm: $localize`Checked`,
  cancel,
  reasonLabel: $localize`What you looked at (at least three characters)`,
});

export const uncheckQuestion = (name: string): Question => ({
  title: $localize`Take the check of ${name}:RESULT: back?`,
  detail: $localize`It is then entered only, for everybody.`,
  confirm: $localize`Take back`,
  cancel,
  reasonLabel,
});

export const releaseQuestion = (name: string, variant: string): Question => ({
  title: $localize`Release the adoption of ${name}:RESULT:?`,
  detail: $localize`Until another result is adopted, the newest usable one counts for ${variant}:VARIANT:.`,
  confirm: $localize`Release`,
  cancel,
  reasonLabel: $localize`Why it is released (at least three characters)`,
});

export const withdrawQuestion = (name: string, adopted: boolean, variant: string): Question => ({
  title: $localize`Withdraw ${name}:RESULT:?`,
  detail: adopted
    ? $localize`${variant}:VARIANT: rests on it: withdrawing it takes it out of the adoption too. It stays readable and counts for nothing. This cannot be undone; a withdrawn result is entered anew.`
    : $localize`It stays readable and counts for nothing. This cannot be undone; a withdrawn result is entered anew.`,
  confirm: $localize`Withdraw`,
  cancel: $localize`Keep it`,
  severe: true,
  reasonLabel: $localize`Why it is withdrawn (at least three characters)`,
});

const results = (count: number): string =>
  count === 1 ? $localize`one result` : $localize`${String(count)}:COUNT: results`;

export const checkManyQuestion = (count: number): Question => ({
  ...checkQuestion(results(count)),
  title: $localize`Have you checked ${results(count)}:RESULTS:?`,
});

export const setManyAsideQuestion = (count: number): Question => ({
  ...setAsideQuestion(results(count)),
  detail: $localize`They stay readable and count for nothing until somebody brings them back. The reason is listed where the ranking says what stayed out.`,
});

export const withdrawManyQuestion = (names: readonly string[]): Question => ({
  ...withdrawQuestion(results(names.length), false, ''),
  detail: $localize`${names.join(', ')}:NAMES:. They stay readable and count for nothing; where a variant rests on one, it is taken out of the adoption. This cannot be undone.`,
});
