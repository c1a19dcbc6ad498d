import type { CandidatePair, CorrelationPair } from '#shared/contracts/correlations';
import { handDraft, lacksReason, pairDrafts, pairsOfDrafts, sharedResults } from './pair-drafts';

const candidate = (change: Partial<CandidatePair> = {}): CandidatePair => ({
  programmeId: 'p',
  programmeName: 'Dunlin',
  variantId: 'v',
  geometry: 'Hatch',
  resultId: 'small',
  resultName: 'S-1',
  testDate: '2026-05-01',
  referenceResultId: 'large',
  referenceResultName: 'L-1',
  referenceTestDate: '2026-06-01',
  dragAreaM2: 0.61,
  uM2: 0.004,
  referenceDragAreaM2: 0.6,
  referenceUM2: 0.003,
  newest: true,
  cautions: [],
  excludedBy: [],
  ...change,
});
const hand: CorrelationPair = {
  geometry: 'Grey box',
  dragAreaM2: 0.5,
  uM2: 0.004,
  referenceDragAreaM2: 0.49,
  referenceUM2: 0.003,
};
const former = (change: Partial<CorrelationPair> = {}): CorrelationPair => ({
  geometry: 'Hatch',
  resultId: 'small',
  referenceResultId: 'large',
  dragAreaM2: 0.61,
  uM2: 0.004,
  referenceDragAreaM2: 0.6,
  referenceUM2: 0.003,
  ...change,
});

describe('pairs on offer', () => {
  it('are taken in where both results are the newest usable ones, and else wait', () => {
    const drafts = pairDrafts(
      [candidate(), candidate({ resultId: 'older', newest: false, excludedBy: ['mach'] })],
      [],
      [hand],
      new Map(),
    );
    expect(drafts.map(({ included }) => included)).toEqual([true, false, true]);
    expect(drafts.map(lacksReason)).toEqual([false, false, false]);
    expect(pairsOfDrafts(drafts).map(({ geometry }) => geometry)).toEqual(['Hatch', 'Grey box']);
  });

  it('ask for a reason where one that was taken in is left out, and keep it with the version', () => {
    const [offered] = pairDrafts([candidate()], [], [], new Map());
    const out = (reason: string) =>
      pairDrafts([candidate()], [], [], new Map([[offered!.key, { included: false, reason }]]));
    expect(out(' ').map(lacksReason)).toEqual([true]);
    expect(pairsOfDrafts(out(' '))).toEqual([]);
    expect(pairsOfDrafts(out('Another mirror '))).toEqual([
      expect.objectContaining({ geometry: 'Hatch', leftOutReason: 'Another mirror' }),
    ]);
  });

  it('hold what the version before decided, with the figures of today and a word where they moved', () => {
    const [draft] = pairDrafts(
      [candidate()],
      [former({ dragAreaM2: 0.615, leftOutReason: 'Wet floor' })],
      [],
      new Map(),
    );
    expect(draft).toMatchObject({ included: false, reason: 'Wet floor', about: { formerDragAreaM2: 0.615 } });
    expect(draft?.pair.dragAreaM2).toBe(0.61);
    const [same] = pairDrafts([candidate({ newest: false })], [former()], [], new Map());
    expect(same?.included).toBe(true);
    expect(same?.about).not.toHaveProperty('formerDragAreaM2');
  });

  it('keep pairs of the version before that are no longer among the results, and those typed by hand', () => {
    const drafts = pairDrafts([], [former(), hand], [], new Map());
    expect(drafts.map(({ origin }) => origin)).toEqual(['version', 'hand']);
    expect(pairsOfDrafts(drafts)).toEqual([former(), hand]);
    expect(handDraft(hand)).toMatchObject({ included: true, expected: false });
  });

  it('name geometries whose pairs share a reading', () => {
    const drafts = pairDrafts([candidate(), candidate({ resultId: 'second' })], [], [], new Map());
    expect(sharedResults(drafts)).toEqual(['Hatch']);
    expect(sharedResults(pairDrafts([candidate()], [], [hand], new Map()))).toEqual([]);
  });
});
