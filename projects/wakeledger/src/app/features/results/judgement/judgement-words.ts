import type { JudgementFields } from '#shared/contracts/judgements';

/** What is held of a result, each in words. */
export function judgementWords(
  { reynolds, includedReason, setAsideReason }: JudgementFields,
  nameOf: (resultId: string) => string,
): readonly string[] {
  return [
    reynoldsSentence(reynolds, nameOf),
    ...(includedReason === undefined
      ? []
      : [$localize`Included although it is not comparable: ${includedReason}:REASON:`]),
    ...(setAsideReason === undefined ? [] : [$localize`Set aside: ${setAsideReason}:REASON:`]),
  ];
}

function reynoldsSentence(choice: JudgementFields['reynolds'], nameOf: (resultId: string) => string): string {
  switch (choice.kind) {
    case 'friction-line':
      return $localize`Reynolds number: by the friction line.`;
    case 'own-sweep':
      return $localize`Reynolds number: by its own sweep.`;
    case 'sweep-of':
      return $localize`Reynolds number: by the sweep of ${nameOf(choice.resultId)}:RESULT:.`;
  }
}
