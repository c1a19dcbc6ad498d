import pg from 'pg';
import { evidenceAdopt } from '#shared/contracts/adoptions';
import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultEnter, type ResultFields } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import type { Evaluate } from '../../modules/evaluations';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';
import { replayEvaluations, type ReplayOutcome, type ReplaySummary } from './replay-evaluations';
import { differencesAsText, summaryAsText } from './replay-report';

const CONSTANTS = '#shared/core/constants';

/** The product's own evaluation with some constants of the method changed: everything is loaded anew upon them. */
async function evaluateWith(change: object): Promise<Evaluate> {
  let evaluate: Evaluate | undefined;
  await jest.isolateModulesAsync(async () => {
    jest.doMock(CONSTANTS, () => ({ ...jest.requireActual<object>(CONSTANTS), ...change }));
    evaluate = (await import('#shared/core/ranking/evaluation')).evaluateEvidence;
  });
  jest.dontMock(CONSTANTS);
  if (evaluate === undefined) throw new Error('The evaluation was not loaded.');
  return evaluate;
}

describe('computing stored evaluations again', () => {
  let api: ApiHarness;
  let client: pg.Client;

  beforeAll(async () => {
    api = await startApi();
    await fill(await api.asMember('aerodynamicist'), 'Dunlin');
    await fill(await api.asMember('aerodynamicist', api.second), 'Wherry');
    client = new pg.Client({ connectionString: api.database.url('maintenance') });
    await client.connect();
  });
  afterAll(async () => {
    await client.end();
    await api.close();
  });

  /** Two variants that are brought to the reference along the friction line, and one that was measured there already. */
  async function fill(member: ApiMember, name: string): Promise<void> {
    const params = {
      programmeId: (await member.ok(programmeCreate, { body: programmeFields({ name }) })).id,
    };
    const { id: facilityId } = await member.ok(facilityCreate, { body: facilityFields() });
    for (const [variant, changes] of [
      ['Hatch', [{ name: 'H-1' }]],
      ['Sport', [{ name: 'S-1' }, { name: 'S-2', points: [{ yawDeg: 0, value: 0.281, s: 0.001, n: 3 }] }]],
      ['Tourer', [{ name: 'T-1', speedKmh: 120, air: { state: 'un-gtr-15' } }]],
    ] as const satisfies readonly (readonly [string, readonly Partial<ResultFields>[]])[]) {
      const body = variantFields({ name: variant });
      const { id: variantId } = await member.ok(variantCreate, { params, body });
      const resultIds: string[] = [];
      for (const change of changes) {
        const fields = resultFields({ variantId, facilityId }, change);
        resultIds.push((await member.ok(resultEnter, { params, body: fields })).id);
      }
      await member.ok(evidenceAdopt, {
        params,
        body: {
          adoptions: [{ variantId, resultIds, rule: 'weighted-mean' }],
          comment: 'The repeats of the session',
        },
      });
    }
  }

  const replay = async (
    evaluate?: Evaluate,
  ): Promise<{ outcomes: readonly ReplayOutcome[]; summary: ReplaySummary }> => {
    const outcomes: ReplayOutcome[] = [];
    const summary = await replayEvaluations(client, (outcome) => outcomes.push(outcome), evaluate);
    return { outcomes, summary };
  };

  it('finds no difference where nothing changed, in every organisation', async () => {
    const { outcomes, summary } = await replay();
    expect(outcomes).toEqual([]);
    expect(summary).toEqual({ evaluations: 6, same: 6, moved: 0 });
    expect(summaryAsText(summary)).toContain('all come to the same');
  });

  it('finds none with the same constants loaded anew: the test below changes them and nothing else', async () => {
    expect((await replay(await evaluateWith({}))).summary.moved).toBe(0);
  });

  it('names every evaluation that a changed constant moved, and by how much', async () => {
    const { COVERAGE_PROBABILITY } = jest.requireActual<{ COVERAGE_PROBABILITY: number }>(CONSTANTS);
    const { outcomes, summary } = await replay(
      await evaluateWith({ COVERAGE_PROBABILITY: COVERAGE_PROBABILITY - 0.001 }),
    );
    expect(summary).toEqual({ evaluations: 6, same: 0, moved: 6 });
    expect(
      outcomes.map(({ programme, variant, results }) => [programme, variant, results.join(' ')]).sort(),
    ).toEqual([
      ['Dunlin', 'Hatch', 'H-1'],
      ['Dunlin', 'Sport', 'S-1 S-2'],
      ['Dunlin', 'Tourer', 'T-1'],
      ['Wherry', 'Hatch', 'H-1'],
      ['Wherry', 'Sport', 'S-1 S-2'],
      ['Wherry', 'Tourer', 'T-1'],
    ]);
    for (const { differences } of outcomes) {
      const figure = differences.find(({ field }) => field === 'zeroYaw.expandedUncertaintyM2');
      const [stored, now] = [Number(figure?.stored), Number(figure?.now)];
      // A lower probability asks for a smaller factor; no drag area depends on it.
      expect(now).toBeLessThan(stored);
      expect(figure?.difference).toBeCloseTo(now - stored, 15);
      expect(differences.some(({ field }) => field.endsWith('dragAreaM2'))).toBe(false);
    }
    const [line] = differencesAsText(outcomes[0] as ReplayOutcome);
    expect(line).toMatch(
      /^\S.*, (Hatch|Sport|Tourer) \(.*stored \d{4}-\d\d-\d\d\): \S+: stored [\d.e-]+, now [\d.e-]+, [-+]?\d/,
    );
  });

  it('names those alone that the changed constant enters', async () => {
    const { SKIN_FRICTION } = jest.requireActual<{ SKIN_FRICTION: { exponent: number } }>(CONSTANTS);
    const { outcomes, summary } = await replay(
      await evaluateWith({ SKIN_FRICTION: { ...SKIN_FRICTION, exponent: SKIN_FRICTION.exponent + 0.01 } }),
    );
    // At the reference Reynolds number itself no friction line moves anything.
    expect(summary).toEqual({ evaluations: 6, same: 2, moved: 4 });
    expect(new Set(outcomes.map(({ variant }) => variant))).toEqual(new Set(['Hatch', 'Sport']));
    const [first] = outcomes;
    const figure = first?.differences.find(({ field }) => field === 'zeroYaw.dragAreaM2');
    expect(Math.abs(figure?.difference ?? 0)).toBeGreaterThan(1e-8);
    expect(Math.abs(figure?.difference ?? 1)).toBeLessThan(1e-4);
  });

  it('says where stored inputs were touched, and where the method refuses them now', async () => {
    const [row] = (
      await client.query<{ id: string; inputs: string }>(
        'select id, inputs from evaluations order by organisation_id, id limit 1',
      )
    ).rows;
    const rewrite = (inputs: string) =>
      client.query('update evaluations set inputs = $2 where id = $1', [row?.id, inputs]);
    try {
      await rewrite(row?.inputs.replace('"scale":1', '"scale":0.5') ?? '');
      const { outcomes } = await replay();
      expect(outcomes.map(({ evaluationId }) => evaluationId)).toEqual([row?.id]);
      const fields = outcomes[0]?.differences.map(({ field }) => field);
      expect(fields).toEqual(expect.arrayContaining(['inputsHash', 'zeroYaw.dragAreaM2']));
      await rewrite(
        row?.inputs.replace(/"referenceAir":\{[^}]*\}/, '"referenceAir":{"state":"nowhere"}') ?? '',
      );
      const refused = await replay();
      expect(refused.summary.moved).toBe(1);
      expect(refused.outcomes[0]?.refusal).toBe('unknown-air-state');
      expect(differencesAsText(refused.outcomes[0] as ReplayOutcome)[0]).toContain('refused now');
    } finally {
      await rewrite(row?.inputs ?? '');
    }
    expect((await replay()).summary.moved).toBe(0);
  });
});
