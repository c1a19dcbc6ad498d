import type { ApiProblem, ApiProblemCode } from '../api/api-problem';

/** What a person reads when something was refused or failed. */
export interface ProblemWords {
  readonly title: string;
  readonly detail?: string;
  /** To be named when asking for help; only where the fault is ours. */
  readonly requestId?: string;
}

const TITLES: Readonly<Record<ApiProblemCode, () => string>> = {
  'malformed-input': () => $localize`Something in it is not of the expected form.`,
  'not-signed-in': () => $localize`You are no longer signed in.`,
  'sign-in-refused': () => $localize`Organisation, e-mail address or password is not right.`,
  forbidden: () => $localize`Your role does not include this.`,
  'origin-refused': () => $localize`The request came from another site and was not carried out.`,
  'not-found': () => $localize`There is nothing here, or it is not yours to see.`,
  conflict: () => $localize`It was changed by someone else since you opened it.`,
  'already-exists': () => $localize`There is one of this name already.`,
  'still-in-use': () => $localize`Something else depends on it.`,
  'idempotency-key-reused': () => $localize`The same command was sent with another content.`,
  'command-in-progress': () => $localize`The same command is still being carried out.`,
  'wrong-state': () => $localize`It is not in a state in which this can be done.`,
  'precondition-missing': () => $localize`The version that you edited is not stated. Reload the page.`,
  'idempotency-key-missing': () => $localize`The command carries no key. Reload the page.`,
  'too-large': () => $localize`The file is larger than what can be taken.`,
  'unsupported-file': () => $localize`This kind of file cannot be read here.`,
  'unusable-input': () => $localize`It cannot be used as it is.`,
  'method-refused': () => $localize`The method cannot be applied to this.`,
  'too-many-attempts': () => $localize`Too many attempts.`,
  'internal-error': () => $localize`Something went wrong on our side.`,
  'not-ready': () => $localize`The service is not ready yet. Try again in a moment.`,
  'no-connection': () => $localize`The server cannot be reached.`,
  'unreadable-answer': () =>
    $localize`The server’s answer could not be read. Reload the page to get its newest version.`,
};

export function problemWords(found: ApiProblem): ProblemWords {
  const title = TITLES[found.code]();
  const { detail, retryAfterS, requestId } = found.problem ?? {};
  if (found.code === 'too-many-attempts') return { title, detail: waitWords(retryAfterS) };
  if (found.code === 'no-connection') {
    return { title, detail: $localize`What you typed is kept. Try again when you are connected.` };
  }
  if (found.code === 'internal-error') return { title, requestId };
  return { title, detail: detail === title ? undefined : detail };
}

function waitWords(seconds: number | undefined): string {
  if (seconds === undefined) return $localize`Wait a moment, then try again.`;
  if (seconds < 90) return $localize`Try again in ${Math.max(1, Math.ceil(seconds))}:SECONDS: seconds.`;
  return $localize`Try again in ${Math.ceil(seconds / 60)}:MINUTES: minutes.`;
}
