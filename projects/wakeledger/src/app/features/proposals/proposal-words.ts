import type { Proposal, ProposalGround, ProposalSummary } from '#shared/contracts/proposals';
import type { ChangeSubjects } from '../../ui/words/change-words';

export const STATE_WORDS: Readonly<Record<ProposalSummary['state'], string>> = {
  open: $localize`open`,
  accepted: $localize`accepted`,
  dropped: $localize`dropped`,
};

const GONE = $localize`something that has left the programme`;

type Ground<Kind extends ProposalGround['kind']> = Extract<ProposalGround, { kind: Kind }>;

/** What a proposal's changes are about, as it was when they were proposed. */
export function proposedSubjects({ outcome }: Pick<Proposal, 'outcome'>): ChangeSubjects {
  const { ground, resultNames } = outcome;
  const of = <Kind extends ProposalGround['kind']>(kind: Kind): readonly Ground<Kind>[] =>
    ground.filter((each): each is Ground<Kind> => each.kind === kind);
  const results = new Map([
    ...of('result').map(({ resultId, name }) => [resultId, name] as const),
    ...resultNames.map(({ resultId, name }) => [resultId, name] as const),
  ]);
  const variants = new Map(of('evidence').map(({ variantId, name }) => [variantId, name]));
  const facilities = new Map(of('facility').map((facility) => [facility.facilityId, facility]));
  return {
    result: (id) => results.get(id) ?? GONE,
    variant: (id) => variants.get(id) ?? GONE,
    facility: (id) => facilities.get(id)?.name ?? GONE,
    corrections: (id) => facilities.get(id),
    limit: (limit) => of('policies')[0]?.values[limit],
  };
}
