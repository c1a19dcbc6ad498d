import { randomUUID } from 'node:crypto';
import { adoptionList, evidenceAdopt } from '#shared/contracts/adoptions';
import { facilityCreate } from '#shared/contracts/facilities';
import { judgementList, resultsJudge, type JudgementOrder } from '#shared/contracts/judgements';
import { programmeCreate } from '#shared/contracts/programmes';
import { rankingContextRead, rankingInputsRead, rankingViewRead } from '#shared/contracts/rankings';
import {
  resultEnter,
  resultHistory,
  resultRead,
  resultWithdraw,
  type ResultFields,
} from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';
const FRICTION_LINE = { kind: 'friction-line' } as const;

/** A sweep of the coefficient over speeds: it falls a little with the Reynolds number. */
const sweepPoints = (...speeds: readonly number[]): ResultFields['points'] =>
  speeds.map((speedKmh, index) => ({
    yawDeg: 0,
    value: 0.274 - 0.00003 * speedKmh + 0.0002 * (index % 2),
    speedKmh,
  }));

describe('judging results over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let programmeId: string;
  let facilityId: string;
  let variantId: string;
  let otherVariantId: string;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    programmeId = (await aerodynamicist.ok(programmeCreate, { body: programmeFields() })).id;
    facilityId = (await aerodynamicist.ok(facilityCreate, { body: facilityFields() })).id;
    const add = async (name: string) =>
      (await aerodynamicist.ok(variantCreate, { params: { programmeId }, body: variantFields({ name }) })).id;
    variantId = await add('Hatch');
    otherVariantId = await add('Sport');
  });
  afterAll(() => api.close());

  const enter = async (name: string, change: Partial<ResultFields> = {}) =>
    (
      await aerodynamicist.ok(resultEnter, {
        params: { programmeId },
        body: resultFields({ variantId, facilityId }, { name, ...change }),
      })
    ).id;
  const call = (...judgements: JudgementOrder[]) => ({
    params: { programmeId },
    body: { judgements, comment: 'Looked at the raw traces' },
  });
  const judge = async (order: JudgementOrder) => {
    const { judgements } = await aerodynamicist.ok(resultsJudge, call(order));
    return judgements[0];
  };
  const refused = (...judgements: JudgementOrder[]) =>
    aerodynamicist.refused(resultsJudge, call(...judgements));
  const inputOf = async (id: string) => {
    const inputs = await aerodynamicist.ok(rankingInputsRead, {
      params: { programmeId },
      query: { evidence: 'all' },
    });
    return { inputs, result: inputs.results.find((result) => result.id === id) };
  };

  it('hold what a person holds of them, whole, with the history of it', async () => {
    const id = await enter('J1');
    const sweep = await enter('J1 sweep', { points: sweepPoints(80, 100, 130, 160) });
    const first = await judge({ resultId: id, reynolds: { kind: 'sweep-of', resultId: sweep } });
    const second = await judge({
      resultId: id,
      reynolds: FRICTION_LINE,
      setAsideReason: 'The belt drifted',
      expectedJudgementId: first?.id,
    });
    expect(second).toMatchObject({
      resultId: id,
      reynolds: FRICTION_LINE,
      setAsideReason: 'The belt drifted',
      by: 'aerodynamicist of First Motors',
    });
    const params = { programmeId, resultId: id };
    const { judgements } = await aerodynamicist.ok(judgementList, { params });
    expect(judgements.map((judgement) => judgement.id)).toEqual([second?.id, first?.id]);
    expect((await aerodynamicist.ok(resultRead, { params })).judgement).toEqual(judgements[0]);
    const { events } = await aerodynamicist.ok(resultHistory, { params });
    expect(events.map(({ kind }) => kind)).toEqual(['judged', 'judged', 'entered']);
  });

  it('bring a result to the reference by the sweep of another one, which the ranking inputs carry', async () => {
    const id = await enter('J2');
    const sweep = await enter('J2 sweep', { points: sweepPoints(80, 100, 130, 160) });
    expect((await inputOf(sweep)).result?.reynoldsMethod).toBe('own-sweep');
    expect((await inputOf(id)).result?.reynoldsMethod).toBe('friction-line');
    await judge({ resultId: id, reynolds: { kind: 'sweep-of', resultId: sweep } });
    const { inputs, result } = await inputOf(id);
    expect(result?.reynoldsMethod).toBe(`sweep:${sweep}`);
    const carried = inputs.sweeps?.find((each) => each.id === sweep);
    expect(carried).toMatchObject({ name: 'J2 sweep' });
    expect(carried?.points).toHaveLength(4);
    const { points = [] } = carried ?? {};
    expect((points[3]?.reynolds ?? 0) / (points[0]?.reynolds ?? 1)).toBeCloseTo(2, 12);
  });

  it('are refused a sweep that is none: too few readings, another variant’s, its own, an unknown one', async () => {
    const plain = await enter('J3');
    const elsewhere = await enter('J3 elsewhere', {
      variantId: otherVariantId,
      points: sweepPoints(80, 100, 130, 160),
    });
    expect(await refused({ resultId: plain, reynolds: { kind: 'own-sweep' } })).toMatchObject({
      code: 'unusable-input',
      where: 'judgements.0.reynolds',
      reason: 'sweep-too-few-points',
    });
    const sweepOf = (resultId: string) =>
      refused({ resultId: plain, reynolds: { kind: 'sweep-of', resultId } });
    expect((await sweepOf(elsewhere)).detail).toContain('another variant');
    expect((await sweepOf(plain)).detail).toContain('own sweep');
    expect((await sweepOf(UNKNOWN)).detail).toContain('no such result');
  });

  it('are refused the friction line where readings at several speeds can be a sweep only', async () => {
    const sweep = await enter('J4', { points: sweepPoints(80, 100, 130, 160) });
    expect(await refused({ resultId: sweep, reynolds: FRICTION_LINE })).toMatchObject({
      code: 'unusable-input',
      reason: 'zero-yaw-mixed-speeds',
    });
  });

  it('include what is not comparable with a reason that stands wherever the figure does, and nothing else', async () => {
    const comparable = await enter('J5 comparable');
    expect(
      await refused({ resultId: comparable, reynolds: FRICTION_LINE, includedReason: 'Looks right' }),
    ).toMatchObject({ code: 'unusable-input', reason: 'comparable' });
    const id = await enter('J5', {
      variantId: otherVariantId,
      testDate: '2026-11-20',
      condition: { ground: 'fixed-floor', wheels: 'stationary' },
    });
    await judge({ resultId: id, reynolds: FRICTION_LINE, includedReason: 'Only the floor differs' });
    expect((await inputOf(id)).result?.includedWithReason).toBe('Only the floor differs');
    const stylist = await api.asMember('stylist');
    const { rows } = await stylist.ok(rankingViewRead, { params: { programmeId } });
    const evidence = rows.find((row) => row.variantId === otherVariantId)?.evidence[0];
    expect(evidence).toMatchObject({ resultId: id, includedReason: 'Only the floor differs' });
    const context = await aerodynamicist.ok(rankingContextRead, { params: { programmeId } });
    expect(context.included).toContainEqual(
      expect.objectContaining({ resultId: id, reason: 'Only the floor differs' }),
    );
  });

  it('keep a result out that is set aside, say so, and take it out of the adoption that holds it', async () => {
    const [kept, aside] = [await enter('J6'), await enter('J6 drifted')];
    const { adoptions } = await aerodynamicist.ok(evidenceAdopt, {
      params: { programmeId },
      body: {
        adoptions: [{ variantId, resultIds: [kept, aside], rule: 'newest' }],
        comment: 'Both repeats of the session',
      },
    });
    await judge({ resultId: aside, reynolds: FRICTION_LINE, setAsideReason: 'The balance drifted' });
    const all = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    expect(all.adoptions[0]).toMatchObject({
      resultIds: [kept],
      comment: 'J6 drifted was set aside: The balance drifted',
    });
    const { results } = await aerodynamicist.ok(rankingInputsRead, {
      params: { programmeId },
      query: { evidence: 'newest' },
    });
    expect(results.map(({ id }) => id)).not.toContain(aside);
    const view = await aerodynamicist.ok(rankingViewRead, { params: { programmeId } });
    expect(view.stayedOut.find(({ resultId }) => resultId === aside)?.rules).toEqual([
      expect.objectContaining({ rule: 'set-aside', remedy: 'bring-back', detail: 'The balance drifted' }),
    ]);
    expect(
      await aerodynamicist.refused(evidenceAdopt, {
        params: { programmeId },
        body: {
          adoptions: [
            {
              variantId,
              resultIds: [aside],
              rule: 'newest',
              expectedAdoptionId: all.adoptions[0]?.id,
            },
          ],
          comment: 'Once more',
        },
      }),
    ).toMatchObject({ code: 'wrong-state', detail: expect.stringContaining('The balance drifted') });
    expect(adoptions[0]?.resultIds).toEqual([kept, aside]);
  });

  it('conflict where a colleague judged meanwhile, and are made once however often they are sent', async () => {
    const id = await enter('J7');
    const order = { resultId: id, reynolds: FRICTION_LINE, setAsideReason: 'Wrong tyres' };
    const once = { ...call(order), key: randomUUID() };
    const answer = await aerodynamicist.ok(resultsJudge, once);
    expect(await aerodynamicist.ok(resultsJudge, once)).toEqual(answer);
    const colleague = await api.asMember('aerodynamicist');
    expect(
      await colleague.refused(resultsJudge, call({ resultId: id, reynolds: FRICTION_LINE })),
    ).toMatchObject({ code: 'conflict', where: 'judgements.0.expectedJudgementId' });
    expect(await refused({ ...order, expectedJudgementId: answer.judgements[0]?.id })).toMatchObject({
      code: 'wrong-state',
      detail: expect.stringContaining('already'),
    });
  });

  it('are judged all together or not at all, and each refusal is named', async () => {
    const [good, gone] = [await enter('J8'), await enter('J8 gone')];
    await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: gone },
      body: { reason: 'Typed twice' },
    });
    const aside = (resultId: string) => ({ resultId, reynolds: FRICTION_LINE, setAsideReason: 'Rain' });
    const problem = await refused(aside(good), aside(gone));
    expect(problem).toMatchObject({ code: 'wrong-state', where: 'judgements.1.resultId' });
    const params = { programmeId, resultId: good };
    expect((await aerodynamicist.ok(resultRead, { params })).judgement).toBeUndefined();
    expect((await refused(aside(good), aside(UNKNOWN))).code).toBe('not-found');
    const { judgements } = await aerodynamicist.ok(resultsJudge, call(aside(good)));
    expect(judgements).toHaveLength(1);
  });

  it('may be judged by aerodynamicists only', async () => {
    const id = await enter('J9');
    const order = call({ resultId: id, reynolds: FRICTION_LINE, setAsideReason: 'Rain' });
    for (const role of ['programme-manager', 'stylist', 'viewer', 'administrator'] as const) {
      const member = await api.asMember(role);
      expect((await member.refused(resultsJudge, order)).code).toBe('forbidden');
    }
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(resultsJudge, order)).code).toBe('not-found');
  });
});
