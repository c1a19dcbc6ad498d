import type { RankingSources } from '../../../data/rankings/rankings-api';
import type { ChangeSubjects } from '../../../ui/words/change-words';

type Named = { readonly id: string; readonly name?: string | null | undefined };

const namer = (list: readonly Named[]): ((id: string) => string) => {
  const names = new Map(list.map(({ id, name }) => [id, name ?? id]));
  return (id) => names.get(id) ?? $localize`something that has left the programme`;
};

/** What changes are about, as it is stored: the names, and what holds without them. */
export function storedSubjects({ inputs }: RankingSources): ChangeSubjects {
  return {
    result: namer(inputs.results),
    variant: namer(inputs.variants),
    facility: namer(inputs.facilities),
    corrections: (facilityId) => inputs.facilities.find(({ id }) => id === facilityId),
    limit: (limit) => inputs.programme.policies?.[limit],
  };
}
