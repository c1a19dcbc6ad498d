import { fiveVariants, sweepResult, SHORT_CYCLE, type RankingScenario } from '../../testing/ranking-scenario';
import { applyChanges, withChange, type ChangeOfJudgement, type JudgedSources } from './judgement-changes';
import { DEFAULT_CHOICES } from './ranking-choices';
import { compareRankings } from './ranking-comparison';
import { buildRankingView } from './ranking-view-build';

const TRYING = { at: '2026-12-01T10:00:00.000Z', by: 'Ingrid' };
const view = ({ inputs, context }: JudgedSources) =>
  buildRankingView(inputs, context, { ...DEFAULT_CHOICES, cycle: SHORT_CYCLE.key });
const tried = (scenario: JudgedSources, ...changes: readonly ChangeOfJudgement[]) =>
  applyChanges(scenario, changes, TRYING);
const rowOf = (sources: JudgedSources, variantId: string) =>
  view(sources).rows.find((row) => row.variantId === variantId);

/** The liftback was measured twice; the newer one is a tenth higher. */
function twoOfLiftback(): RankingScenario {
  const { inputs, context } = fiveVariants();
  const shape = { id: 'liftback', name: 'Liftback', coefficient: 0.2739, areaM2: 2.19, massKg: 1650 };
  const newer = sweepResult(shape, 'r-newer', '2026-11-01', 40);
  return { inputs: { ...inputs, results: [...inputs.results, newer] }, context };
}

const fixedFloor = (scenario: RankingScenario) =>
  view(scenario).stayedOut.find(({ rules }) => rules.some(({ rule }) => rule === 'not-comparable'));

function frozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null) Object.values(value).forEach(frozen);
  return Object.freeze(value);
}

const ONE_OF_EACH: readonly ChangeOfJudgement[] = [
  { kind: 'evidence', variantId: 'liftback', resultIds: ['r-liftback'], rule: 'newest' },
  { kind: 'set-aside', resultId: 'r-hatch', reason: 'A wheel cover was missing' },
  { kind: 'facility', facilityId: 'belt', biasURelative: 0.02 },
  { kind: 'policies', values: { blockageExcluded: 0.2 } },
  { kind: 'friction-line', frictionLine: 'on' },
  { kind: 'bring-back', resultId: 'r-sport' },
  { kind: 'include-not-comparable', resultId: 'r-tourer', reason: 'The floor makes no difference here' },
];

describe('a change of judgement that is tried', () => {
  it('changes nothing where there is none', () => {
    const scenario = twoOfLiftback();
    const changed = tried(scenario);
    expect(changed).toEqual({ ...scenario, withoutSubject: [] });
    expect(compareRankings(view(scenario), view(changed)).changed).toBe(false);
  });

  it('sets a result aside, so that the next one counts, and brings it back again', () => {
    const scenario = twoOfLiftback();
    const aside = tried(scenario, { kind: 'set-aside', resultId: 'r-newer', reason: 'Tape came off' });
    expect(rowOf(scenario, 'liftback')?.evidence[0]?.resultId).toBe('r-newer');
    expect(rowOf(aside, 'liftback')?.evidence[0]?.resultId).toBe('r-liftback');
    expect(aside.context.setAside).toEqual([{ resultId: 'r-newer', reason: 'Tape came off', ...TRYING }]);
    const back = tried(aside, { kind: 'bring-back', resultId: 'r-newer' });
    expect(rowOf(back, 'liftback')).toEqual(rowOf(scenario, 'liftback'));
  });

  it('takes a result that is set aside out of the adoption that holds it, and leaves none empty', () => {
    const adopted = tried(twoOfLiftback(), {
      kind: 'evidence',
      variantId: 'liftback',
      resultIds: ['r-newer'],
      rule: 'newest',
    });
    const aside = tried(adopted, { kind: 'set-aside', resultId: 'r-newer', reason: 'Tape came off' });
    expect(adopted.context.adoptions).toHaveLength(1);
    expect(aside.context.adoptions).toEqual([]);
    const back = tried(aside, { kind: 'bring-back', resultId: 'r-newer' });
    expect(rowOf(back, 'liftback')?.evidence[0]).toMatchObject({ resultId: 'r-newer', adopted: false });
  });

  it('includes a result that is not comparable, with the reason beside the figure', () => {
    const scenario = fiveVariants();
    const left = fixedFloor(scenario)!;
    const reason = 'The difference is far below what we look for';
    const changed = tried(scenario, {
      kind: 'include-not-comparable',
      resultId: left.resultId,
      reason,
    });
    expect(fixedFloor(changed)).toBeUndefined();
    const adopted = tried(changed, {
      kind: 'evidence',
      variantId: left.variantId,
      resultIds: [left.resultId],
      rule: 'newest',
    });
    expect(rowOf(adopted, left.variantId)?.evidence[0]?.includedReason).toBe(reason);
    expect(changed.context.included).toEqual([{ resultId: left.resultId, reason, ...TRYING }]);
  });

  it('lets a variant rest on the weighted mean of chosen results, or on its newest again', () => {
    const scenario = twoOfLiftback();
    const mean = tried(scenario, {
      kind: 'evidence',
      variantId: 'liftback',
      resultIds: ['r-liftback', 'r-newer'],
      rule: 'weighted-mean',
    });
    const row = rowOf(mean, 'liftback');
    expect(row?.combination?.weights).toHaveLength(2);
    const low = 0.249 * 2.19;
    const high = 0.2739 * 2.19;
    expect(row!.figure.dragAreaM2 > low * 0.95 && row!.figure.dragAreaM2 < high).toBe(true);
    const released = tried(mean, {
      kind: 'evidence',
      variantId: 'liftback',
      resultIds: [],
      rule: 'newest',
    });
    expect(rowOf(released, 'liftback')).toEqual(rowOf(scenario, 'liftback'));
  });

  it('changes a correction and an uncertainty of a facility, under the number of the version that it would be', () => {
    const scenario = fiveVariants();
    const wider = tried(scenario, { kind: 'facility', facilityId: 'belt', biasURelative: 0.02 });
    const before = rowOf(scenario, 'hatch')!.figure;
    const after = rowOf(wider, 'hatch')!.figure;
    expect(after.dragAreaM2).toBe(before.dragAreaM2);
    expect(after.expandedUncertaintyM2).toBeGreaterThan(2 * before.expandedUncertaintyM2);
    expect(wider.context.facilityVersions).toEqual([{ facilityId: 'belt', number: 2 }]);

    const bare = tried(scenario, { kind: 'facility', facilityId: 'belt', blockage: { method: 'none' } });
    expect(rowOf(bare, 'hatch')!.figure.dragAreaM2).toBeGreaterThan(before.dragAreaM2);
    expect(bare.inputs.facilities[0]?.biasURelative).toBe(0.006);
  });

  it('changes limits and the friction line, under the number that the limits would have', () => {
    const scenario = fiveVariants();
    const strict = tried(scenario, {
      kind: 'policies',
      values: { blockageExcluded: 0.01, blockageCaution: 0.01 },
    });
    expect(view(strict).rows).toEqual([]);
    expect(strict.context.policyNumber).toBe(1);
    expect(strict.inputs.programme.policies).toMatchObject({ policyId: 'v1', frictionLine: 'off' });

    const on = tried(
      scenario,
      { kind: 'friction-line', frictionLine: 'on' },
      { kind: 'policies', values: { frictionShare: 0.12, frictionShareU: 0.06 } },
    );
    expect(rowOf(on, 'hatch')!.figure.dragAreaM2).not.toBe(rowOf(scenario, 'hatch')!.figure.dragAreaM2);
  });

  it('is the same in whatever order the changes stand', () => {
    const scenario = twoOfLiftback();
    const { inputs, context } = tried(scenario, ...ONE_OF_EACH);
    const reversed = tried(scenario, ...ONE_OF_EACH.toReversed());
    expect(view(reversed)).toEqual(view({ inputs, context }));
  });

  it('changes nothing of what it was given', () => {
    const scenario = frozen(twoOfLiftback());
    expect(() => tried(scenario, ...ONE_OF_EACH)).not.toThrow();
    expect(scenario).toEqual(twoOfLiftback());
  });

  it('names the changes whose subject is gone and does the others', () => {
    const gone: readonly ChangeOfJudgement[] = [
      { kind: 'set-aside', resultId: 'withdrawn', reason: 'Tape came off' },
      { kind: 'facility', facilityId: 'closed down', biasURelative: 0.01 },
      { kind: 'evidence', variantId: 'liftback', resultIds: ['withdrawn'], rule: 'newest' },
      { kind: 'evidence', variantId: 'retired', resultIds: [], rule: 'newest' },
    ];
    const changed = tried(fiveVariants(), ...gone, { kind: 'friction-line', frictionLine: 'on' });
    expect(changed.withoutSubject).toEqual(gone);
    expect(changed.inputs.programme.policies?.frictionLine).toBe('on');
  });
});

describe('a list of changes', () => {
  it('holds one change about each subject, the latest', () => {
    const list = [...ONE_OF_EACH].reduce(withChange, [] as readonly ChangeOfJudgement[]);
    expect(list).toEqual(ONE_OF_EACH);
    const again = withChange(list, { kind: 'bring-back', resultId: 'r-hatch' });
    expect(again.filter((change) => 'resultId' in change && change.resultId === 'r-hatch')).toEqual([
      { kind: 'bring-back', resultId: 'r-hatch' },
    ]);
  });

  it('puts changes of one facility and of the limits together', () => {
    const list = [
      { kind: 'facility', facilityId: 'belt', biasURelative: 0.01 },
      { kind: 'facility', facilityId: 'belt', sessionURelative: 0.004 },
      { kind: 'policies', values: { machCaution: 0.2 } },
      { kind: 'policies', values: { machExcluded: 0.4 } },
    ] as const;
    expect(list.reduce<readonly ChangeOfJudgement[]>(withChange, [])).toEqual([
      { kind: 'facility', facilityId: 'belt', biasURelative: 0.01, sessionURelative: 0.004 },
      { kind: 'policies', values: { machCaution: 0.2, machExcluded: 0.4 } },
    ]);
  });
});
