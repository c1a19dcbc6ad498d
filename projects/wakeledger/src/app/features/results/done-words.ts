import type { EvidenceDone } from '../../data/results/evidence-decision';

/** What has just been done, said once when it is. `name` is the result's where it is one; of many, their number is said. */
export function doneWords(done: EvidenceDone, name: string): string {
  const many = (count: number): string => (count === 1 ? name : $localize`${String(count)}:COUNT: results`);
  switch (done.kind) {
    case 'checked':
      return done.state === 'checked'
        ? $localize`${many(done.results.length)}:WHAT: checked.`
        : $localize`The check of ${many(done.results.length)}:WHAT: is taken back.`;
    case 'judged':
      return $localize`${many(done.judgements.length)}:WHAT: judged.`;
    case 'adopted':
      return done.adoptions.every(({ resultIds }) => resultIds.length === 0)
        ? $localize`The adoption is released; the newest result counts again.`
        : $localize`${many(done.adoptions.flatMap(({ resultIds }) => resultIds).length)}:WHAT: adopted.`;
    case 'withdrawn':
      return $localize`${many(done.results.length)}:WHAT: withdrawn.`;
  }
}
