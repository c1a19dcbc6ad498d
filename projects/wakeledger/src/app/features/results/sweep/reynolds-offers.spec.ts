import type { RankingInput, ResultInput } from '#shared/core/ranking/ranking-input';
import { reductionContextOf } from '#shared/core/reduction/reduction-context';
import { aRanking, aResult } from '#shared/core/testing/ranking-builders';
import { reynoldsOffers } from './reynolds-offers';

/** A 40 % model from 60 to 240 km/h: Re 2 to 8 million on 4.5 m. */
const sweep = (id: string, variantId: string, changes: Partial<ResultInput> = {}) =>
  aResult(id, variantId, {
    scale: 0.4,
    points: [60, 120, 180, 240].map((speedKmh, i) => ({ value: 0.284 - i * 0.001, speedKmh })),
    ...changes,
  });

function offersOf(resultId: string, results: readonly ResultInput[]) {
  const inputs: RankingInput = aRanking({ results });
  return reynoldsOffers(resultId, inputs, reductionContextOf({ ...inputs, results: [] }));
}

describe('what a result can be brought to the reference Reynolds number by', () => {
  const slow = aResult('slow', 'a', { scale: 0.4, speedKmh: 100 });

  it('is the friction line alone where there is no sweep', () => {
    expect(offersOf('slow', [slow]).map(({ choice }) => choice)).toEqual([{ kind: 'friction-line' }]);
  });

  it('is a sweep of the same variant, with what it would give', () => {
    const offers = offersOf('slow', [slow, sweep('swept', 'a'), sweep('other', 'b')]);
    expect(offers.map(({ choice }) => choice)).toEqual([
      { kind: 'friction-line' },
      { kind: 'sweep-of', resultId: 'swept' },
    ]);
    const moved = offers[1]?.outcome;
    if (moved?.kind !== 'reduced') throw new Error('The sweep reaches the reference.');
    // The sweep falls with the Reynolds number, so that the figure at the reference is the lower one.
    const [before, after] = moved.reduction.output.steps;
    expect(after).toMatchObject({ step: 'reynolds' });
    expect(after?.dragAreaM2 ?? NaN).toBeLessThan(before?.dragAreaM2 ?? NaN);
  });

  it('is a result’s own points where they were taken at several speeds', () => {
    const offers = offersOf('swept', [sweep('swept', 'a')]);
    expect(offers.map(({ choice }) => choice.kind)).toEqual(['friction-line', 'own-sweep']);
    expect(offers[1]).toMatchObject({ sweep: { kind: 'fitted' }, outcome: { kind: 'reduced' } });
    // The friction line knows no sweep: zero-yaw points at several speeds are refused there.
    expect(offers[0]?.outcome).toMatchObject({ kind: 'refused', why: { code: 'zero-yaw-mixed-speeds' } });
  });

  it('says why a sweep of two points cannot be used', () => {
    const short = sweep('short', 'a', {
      points: [
        { value: 0.28, speedKmh: 100 },
        { value: 0.279, speedKmh: 200 },
      ],
    });
    const offers = offersOf('slow', [slow, short]);
    expect(offers[1]).toMatchObject({
      sweep: { kind: 'refused', why: { code: 'sweep-too-few-points' } },
      outcome: { kind: 'refused', why: { code: 'sweep-too-few-points' } },
    });
  });
});
