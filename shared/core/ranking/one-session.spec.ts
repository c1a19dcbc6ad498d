import { COUNT } from '../constants';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { evaluateRank } from './rank';
import type { RankOutput } from './ranking-output';

const AREA_M2 = 2.24;
const LOWER = 0.28;

/** Two variants three counts apart, repeatability one count, session scatter one count, in the sessions that are named. */
function ranked(sessionOfA: string, sessionOfB: string): RankOutput {
  const facility = aFacility('tunnel', {
    blockage: { method: 'none' },
    biasUM2: 0.006,
    sessionUM2: COUNT * AREA_M2,
    installationUM2: 0,
    repeatabilityURelative: COUNT / LOWER,
  });
  const resultOf = (id: string, coefficient: number, sessionId: string) =>
    aResult(id, id, { sessionId, quotedAreaM2: AREA_M2, points: [{ value: coefficient }] });
  return evaluateRank(
    aRanking({
      facilities: [facility],
      variants: [aVariant('a', { frontalAreaUM2: 0 }), aVariant('b', { frontalAreaUM2: 0 })],
      results: [resultOf('a', LOWER, sessionOfA), resultOf('b', LOWER + 3 * COUNT, sessionOfB)],
    }),
    () => {
      throw new Error('no cycle is asked for');
    },
  );
}

const normalAt = { threeOverRootTwo: 0.98305, threeOverTwo: 0.93319 } as const;

describe('Two variants three counts apart, with a repeatability of one count', () => {
  it('are separable in one session: the session’s scatter and the facility’s bias cancel', () => {
    const { inseparableGroups, probabilityLowerThanLaterOnes } = ranked('s1', 's1');
    expect(inseparableGroups).toEqual([]);
    // Φ(3/√2) = 0.98305 of any table of the normal distribution; the repeatability of b is 1 % larger, being relative.
    expect(probabilityLowerThanLaterOnes[0]?.[0]).toBeCloseTo(normalAt.threeOverRootTwo, 3);
  });

  it('are not separable across two sessions with one count of session scatter', () => {
    const { inseparableGroups, probabilityLowerThanLaterOnes } = ranked('s1', 's2');
    expect(inseparableGroups).toEqual([['a', 'b']]);
    // Φ(3/√(1 + 1 + 1 + 1)) = Φ(1.5) = 0.93319.
    expect(probabilityLowerThanLaterOnes[0]?.[0]).toBeCloseTo(normalAt.threeOverTwo, 2);
  });
});
