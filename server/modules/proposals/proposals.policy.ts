import type { Permission } from '#shared/access/permissions';
import type { Programme } from '#shared/contracts/programmes';
import type { JudgementChange, ProposalGround, ProposalOrder } from '#shared/contracts/proposals';
import { subjectOf } from '#shared/core/ranking/judgement-changes';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { repeated, type Issue } from '../../rules/issue';
import type { Ground } from './ground';

/** A programme that says nothing moves its results by the friction line. */
export const frictionLineOf = ({ frictionLine }: Programme): 'on' | 'off' => frictionLine ?? 'on';

/** What a person needs who lets a change hold: what doing it by hand needs. */
export const NEEDED_FOR: Readonly<Record<JudgementChange['kind'], Permission>> = {
  'set-aside': 'results.judge',
  'bring-back': 'results.judge',
  'include-not-comparable': 'results.judge',
  evidence: 'results.adopt',
  facility: 'facilities.edit',
  policies: 'policies.edit',
  'friction-line': 'programmes.edit',
};

const isEmpty = (change: JudgementChange): boolean => {
  if (change.kind === 'policies') return Object.keys(change.values).length === 0;
  if (change.kind !== 'facility') return false;
  return [change.blockage, change.biasURelative, change.sessionURelative].every((part) => part === undefined);
};

/** Changes that cannot hold together, or say nothing. */
export function changeIssues(
  changes: readonly JudgementChange[],
  { setAside }: Pick<RankingContext, 'setAside'>,
): readonly Issue[] {
  const aside = new Set(setAside.map(({ resultId }) => resultId));
  const again = new Set(repeated(changes.map(subjectOf)));
  const goes = new Set(changes.flatMap((change) => (change.kind === 'set-aside' ? [change.resultId] : [])));
  const comes = new Set(changes.flatMap((change) => (change.kind === 'bring-back' ? [change.resultId] : [])));
  return changes.flatMap((change, position): readonly Issue[] => {
    const issue = (detail: string): readonly Issue[] => [{ where: `changes.${position}`, detail }];
    if (again.has(position))
      return issue('An earlier change of the list is about the same. Keep one of them.');
    if (isEmpty(change)) return issue('This change says nothing. State at least one value.');
    if (change.kind === 'bring-back' && !aside.has(change.resultId)) {
      return issue('This result is not set aside, so there is nothing to bring back.');
    }
    if (change.kind === 'include-not-comparable' && goes.has(change.resultId)) {
      return issue('This result is set aside by another change of the list: it cannot count as well.');
    }
    if (change.kind !== 'evidence') return [];
    const outside = change.resultIds.some((id) => goes.has(id) || (aside.has(id) && !comes.has(id)));
    return outside
      ? issue(
          'A result that is set aside cannot be what a variant rests on. Bring it back, or choose others.',
        )
      : [];
  });
}

function movedWords(then: ProposalGround, now: ProposalGround): string | undefined {
  if (then.kind === 'result' && now.kind === 'result') {
    return then.judgementId === now.judgementId
      ? undefined
      : `${now.name} was judged anew since this was proposed.`;
  }
  if (then.kind === 'evidence' && now.kind === 'evidence') {
    return then.adoptionId === now.adoptionId
      ? undefined
      : `What ${now.name} rests on was decided anew since this was proposed.`;
  }
  if (then.kind === 'facility' && now.kind === 'facility') {
    return then.number === now.number
      ? undefined
      : `Corrections or uncertainties of ${now.name} were changed since: version ${then.number} then, ${now.number} now.`;
  }
  if (then.kind === 'policies' && now.kind === 'policies') {
    return then.number === now.number
      ? undefined
      : `The limits were changed since: version ${then.number} then, ${now.number} now.`;
  }
  if (then.kind === 'friction-line' && now.kind === 'friction-line') {
    return then.frictionLine === now.frictionLine
      ? undefined
      : `The friction line was switched ${now.frictionLine} since this was proposed.`;
  }
  return 'This change does not belong to what it was proposed on.';
}

/** What is no longer as it was when the changes were proposed, change by change. */
export function movedGround(then: readonly ProposalGround[], now: readonly Ground[]): readonly Issue[] {
  return now.flatMap(({ holds, withdrawn }, position): readonly Issue[] => {
    const before = then[position];
    const where = `changes.${position}`;
    const gone = withdrawn.map((name) => ({ where, detail: `${name} was withdrawn since.` }));
    const moved = before === undefined ? undefined : movedWords(before, holds);
    return moved === undefined ? gone : [...gone, { where, detail: moved }];
  });
}

/** Two figures closer than this are the same [m²]: the browser and the server sum in the same order. */
const SAME_M2 = 1e-9;

type Seen = ProposalOrder['seen']['before'];

function isSame(seen: Seen, { rows }: Pick<RankingView, 'rows'>): boolean {
  return (
    seen.length === rows.length &&
    seen.every(({ variantId, dragAreaM2 }, index) => {
      const row = rows[index];
      return row?.variantId === variantId && Math.abs(row.figure.dragAreaM2 - dragAreaM2) < SAME_M2;
    })
  );
}

/** Whether the person looked at the ranking as it is, before and after the changes. */
export function sawTheSame(
  seen: ProposalOrder['seen'],
  before: Pick<RankingView, 'rows'>,
  after: Pick<RankingView, 'rows'>,
): boolean {
  return isSame(seen.before, before) && isSame(seen.after, after);
}
