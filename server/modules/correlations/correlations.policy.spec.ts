import type { CorrelationPair } from '#shared/contracts/correlations';
import { versionIssues, type PairSurroundings } from './correlations.policy';

const AROUND: PairSurroundings = {
  facilityId: 'model tunnel',
  referenceFacilityId: 'big tunnel',
  results: new Map(
    [
      { id: 'small hatch', variantId: 'hatch', facilityId: 'model tunnel' },
      { id: 'big hatch', variantId: 'hatch', facilityId: 'big tunnel' },
      { id: 'big estate', variantId: 'estate', facilityId: 'big tunnel' },
    ].map((result) => [result.id, result]),
  ),
};

const pair = (change: Partial<CorrelationPair> = {}): CorrelationPair => ({
  geometry: 'Hatch',
  dragAreaM2: 0.6,
  uM2: 0.004,
  referenceDragAreaM2: 0.61,
  referenceUM2: 0.003,
  ...change,
});
const OTHER = pair({ geometry: 'Estate', dragAreaM2: 0.65, referenceDragAreaM2: 0.66 });
const said = (pairs: readonly CorrelationPair[], around = AROUND) =>
  versionIssues(pairs, around).map(({ where, reason }) =>
    reason === undefined ? where : `${where} ${reason}`,
  );

describe('the pairs of a correlation', () => {
  it('pass as two geometries, of results or typed by hand', () => {
    expect(said([pair({ resultId: 'small hatch', referenceResultId: 'big hatch' }), OTHER])).toEqual([]);
  });

  it('are refused where a result is unknown, from another facility or of another variant', () => {
    expect(said([pair({ resultId: 'nothing' }), OTHER])).toEqual(['pairs.0.resultId']);
    expect(said([OTHER, pair({ resultId: 'big hatch' })])).toEqual(['pairs.1.resultId']);
    expect(said([pair({ resultId: 'small hatch', referenceResultId: 'big estate' }), OTHER])).toEqual([
      'pairs.0.referenceResultId',
    ]);
  });

  it('are refused with an uncertainty of zero, unless the pair is left out with a reason', () => {
    expect(said([pair({ uM2: 0 }), OTHER])).toEqual(['pairs.0.uM2 uncertainty-zero']);
    expect(said([pair({ referenceUM2: 0 }), OTHER])).toEqual(['pairs.0.referenceUM2 uncertainty-zero']);
    const leftOut = pair({ uM2: 0, leftOutReason: 'Nobody repeated it' });
    expect(said([leftOut, pair(), OTHER])).toEqual([]);
  });

  it('are refused where fewer than two remain, or all have one drag area', () => {
    expect(said([pair()])).toEqual(['pairs correlation-too-few-pairs']);
    expect(said([pair(), { ...OTHER, leftOutReason: 'Another mirror' }])).toEqual([
      'pairs correlation-too-few-pairs',
    ]);
    expect(said([pair(), pair({ referenceDragAreaM2: 0.63 })])).toEqual(['pairs correlation-no-spread']);
  });

  it('are refused between a facility and itself', () => {
    const same = { ...AROUND, referenceFacilityId: AROUND.facilityId };
    expect(said([pair(), OTHER], same)).toEqual(['referenceFacilityId']);
  });
});
