import { randomUUID } from 'node:crypto';
import { adoptionList, evaluationList, evidenceAdopt, type AdoptionOrder } from '#shared/contracts/adoptions';
import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { resultEnter, resultHistory, resultRead, resultWithdraw } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';

describe('adoptions over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let programmeId: string;
  let facilityId: string;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    programmeId = (await aerodynamicist.ok(programmeCreate, { body: programmeFields() })).id;
    facilityId = (await aerodynamicist.ok(facilityCreate, { body: facilityFields() })).id;
  });
  afterAll(() => api.close());

  const add = async (name: string) =>
    (await aerodynamicist.ok(variantCreate, { params: { programmeId }, body: variantFields({ name }) })).id;
  const enter = async (variantId: string, name: string) =>
    (
      await aerodynamicist.ok(resultEnter, {
        params: { programmeId },
        body: resultFields({ variantId, facilityId }, { name }),
      })
    ).id;
  const order = (
    variantId: string,
    resultIds: string[],
    expectedAdoptionId?: string,
    rule: AdoptionOrder['rule'] = 'newest',
  ): AdoptionOrder => ({ variantId, resultIds, rule, expectedAdoptionId });
  const body = (...adoptions: AdoptionOrder[]) => ({
    params: { programmeId },
    body: { adoptions, comment: 'Best repeat of the session' },
  });
  const adopt = async (...orders: AdoptionOrder[]) => {
    const { adoptions } = await aerodynamicist.ok(evidenceAdopt, body(...orders));
    return adoptions;
  };
  const stateOf = async (resultId: string) =>
    (await aerodynamicist.ok(resultRead, { params: { programmeId, resultId } })).state;

  it('let a variant rest on one result, then on another, then on its newest again', async () => {
    const variantId = await add('Adopting');
    const [a, b] = [await enter(variantId, 'A1'), await enter(variantId, 'A2')];
    const [first] = await adopt(order(variantId, [a]));
    expect(first).toMatchObject({ variantId, resultIds: [a], by: 'aerodynamicist of First Motors' });
    expect([await stateOf(a), await stateOf(b)]).toEqual(['adopted', 'entered']);
    const [second] = await adopt(order(variantId, [b], first?.id));
    expect([await stateOf(a), await stateOf(b)]).toEqual(['superseded', 'adopted']);
    const [released] = await adopt(order(variantId, [], second?.id));
    expect(released?.resultIds).toEqual([]);
    expect([await stateOf(a), await stateOf(b)]).toEqual(['checked', 'checked']);

    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    const history = adoptions.filter((adoption) => adoption.variantId === variantId);
    expect(history.map((adoption) => adoption.resultIds)).toEqual([[], [b], [a]]);
    const { events } = await aerodynamicist.ok(resultHistory, { params: { programmeId, resultId: a } });
    expect(events.map(({ kind }) => kind)).toEqual(['superseded', 'adopted', 'checked', 'entered']);
    expect(events[1]).toMatchObject({ comment: 'Best repeat of the session', adoptionId: first?.id });
  });

  it('of several variants at once are made all together, or none of them', async () => {
    const [one, two] = [await add('Together one'), await add('Together two')];
    const [a, b] = [await enter(one, 'T1'), await enter(two, 'T2')];
    const problem = await aerodynamicist.refused(
      evidenceAdopt,
      body(order(one, [a]), order(two, [a]), order(two, [b])),
    );
    expect(problem).toMatchObject({ code: 'wrong-state', where: 'adoptions.1.resultIds.0' });
    expect(problem.issues?.map(({ where }) => where)).toEqual([
      'adoptions.1.resultIds.0',
      'adoptions.2.variantId',
    ]);
    expect([await stateOf(a), await stateOf(b)]).toEqual(['entered', 'entered']);
    const made = await adopt(order(one, [a]), order(two, [b]));
    expect(made.map(({ variantId }) => variantId)).toEqual([one, two]);
    expect([await stateOf(a), await stateOf(b)]).toEqual(['adopted', 'adopted']);
  });

  it('conflict where somebody else decided meanwhile', async () => {
    const variantId = await add('Contested');
    const [a, b] = [await enter(variantId, 'C1'), await enter(variantId, 'C2')];
    await adopt(order(variantId, [a]));
    const colleague = await api.asMember('aerodynamicist');
    expect(await colleague.refused(evidenceAdopt, body(order(variantId, [b])))).toMatchObject({
      code: 'conflict',
      where: 'adoptions.0.expectedAdoptionId',
      detail: expect.stringContaining('aerodynamicist of First Motors'),
    });
    expect(await stateOf(a)).toBe('adopted');
  });

  it('of one variant at the same time: one stands, the other is told', async () => {
    const variantId = await add('Raced');
    const ids = [await enter(variantId, 'R1'), await enter(variantId, 'R2')];
    const answers = await Promise.all(
      ids.map((id) => aerodynamicist.call(evidenceAdopt, body(order(variantId, [id])))),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
  });

  it('sent twice with one key are made once', async () => {
    const variantId = await add('Doubled');
    const id = await enter(variantId, 'D1');
    const call = { ...body(order(variantId, [id])), key: randomUUID() };
    const once = await aerodynamicist.ok(evidenceAdopt, call);
    expect(await aerodynamicist.ok(evidenceAdopt, call)).toEqual(once);
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    expect(adoptions.filter((adoption) => adoption.variantId === variantId)).toHaveLength(1);
  });

  it('take only the variant’s own results that stand', async () => {
    const [one, other] = [await add('One'), await add('Other')];
    const foreign = await enter(other, 'O1');
    expect(await aerodynamicist.refused(evidenceAdopt, body(order(one, [foreign])))).toMatchObject({
      code: 'wrong-state',
      detail: expect.stringContaining('another variant'),
    });
    const withdrawn = await enter(one, 'W1');
    await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: withdrawn },
      body: { reason: 'Belt stood still' },
    });
    expect(await aerodynamicist.refused(evidenceAdopt, body(order(one, [withdrawn])))).toMatchObject({
      code: 'wrong-state',
      detail: expect.stringContaining('Belt stood still'),
    });
    for (const call of [body(order(one, [UNKNOWN])), body(order(UNKNOWN, [foreign]))]) {
      expect((await aerodynamicist.refused(evidenceAdopt, call)).code).toBe('not-found');
    }
  });

  it('go on with the results that are left when one of several is withdrawn, evaluated anew', async () => {
    const variantId = await add('Continued');
    const [a, b] = [await enter(variantId, 'G1'), await enter(variantId, 'G2')];
    await adopt(order(variantId, [a, b]));
    await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: b },
      body: { reason: 'Wrong tyres' },
    });
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    const [newest] = adoptions.filter((adoption) => adoption.variantId === variantId);
    expect(newest).toMatchObject({ resultIds: [a], comment: 'G2 was withdrawn: Wrong tyres' });
    expect([await stateOf(a), await stateOf(b)]).toEqual(['adopted', 'withdrawn']);
    const { evaluations } = await aerodynamicist.ok(evaluationList, { params: { programmeId, variantId } });
    expect(evaluations.map(({ output }) => output.usedResultIds)).toEqual([[a], [b]]);
  });

  it('are released by withdrawing the adopted result, which the audit trail says', async () => {
    const variantId = await add('Released');
    const id = await enter(variantId, 'L1');
    await adopt(order(variantId, [id]));
    const withdrawn = await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: id },
      body: { reason: 'Wrong tyres' },
    });
    expect(withdrawn).toMatchObject({
      state: 'withdrawn',
      adopted: false,
      withdrawn: { reason: 'Wrong tyres' },
    });
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    const [newest] = adoptions.filter((adoption) => adoption.variantId === variantId);
    expect(newest).toMatchObject({ resultIds: [], comment: 'L1 was withdrawn: Wrong tyres' });
    const trail = await api.database.query<{ action: string; summary: unknown[] }>(
      'maintenance',
      'select action, summary from audit_events where entity_id in ($1, $2) order by at',
      [variantId, id],
    );
    expect(trail.map((event) => event.action)).toEqual([
      'variant.added',
      'result.entered',
      'result.adopted',
      'result.withdrawn',
      'adoption.released',
    ]);
    expect(trail[4]?.summary).toContainEqual({
      field: 'comment',
      after: 'L1 was withdrawn: Wrong tyres',
    });
  });

  it('may be made by aerodynamicists only, and seen by programme managers', async () => {
    const variantId = await add('Permitted');
    const id = await enter(variantId, 'P1');
    for (const role of ['programme-manager', 'stylist', 'viewer', 'administrator'] as const) {
      const member = await api.asMember(role);
      expect((await member.refused(evidenceAdopt, body(order(variantId, [id])))).code).toBe('forbidden');
    }
    const manager = await api.asMember('programme-manager');
    expect((await manager.ok(adoptionList, { params: { programmeId } })).adoptions).toBeDefined();
    const stylist = await api.asMember('stylist');
    expect((await stylist.refused(adoptionList, { params: { programmeId } })).code).toBe('forbidden');
  });

  it('keep what they were computed from and came to, which comes to the same again', async () => {
    const variantId = await add('Evaluated');
    const id = await enter(variantId, 'E1');
    const [adoption] = await adopt(order(variantId, [id]));
    const { evaluations } = await aerodynamicist.ok(evaluationList, { params: { programmeId, variantId } });
    expect(evaluations).toHaveLength(1);
    const [evaluation] = evaluations;
    expect(evaluation).toMatchObject({
      adoptionId: adoption?.id,
      by: 'aerodynamicist of First Motors',
      inputsHash: expect.stringMatching(/^[0-9a-f]{64}$/),
      recomputed: { differences: [] },
      output: { usedResultIds: [id], windAveraged: null },
    });
    expect(evaluation?.methods).toContain('coefficient-to-drag-area@1');
    expect(evaluation?.output.zeroYaw?.dragAreaM2).toBeGreaterThan(0.4);
    expect(JSON.parse(evaluation?.inputs ?? '{}')).toMatchObject({
      results: [{ id }],
      variants: [{ id: variantId }],
    });
    expect(
      (await aerodynamicist.refused(evaluationList, { params: { programmeId, variantId: UNKNOWN } })).code,
    ).toBe('not-found');
  });
});
