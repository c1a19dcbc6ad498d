import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import {
  adoptionList,
  resultAdopt,
  resultEnter,
  resultRead,
  resultWithdraw,
} from '#shared/contracts/results';
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
  const choice = (variantId: string, resultId?: string, expectedCurrentResultId?: string) => ({
    params: { programmeId },
    body: { variantId, resultId, expectedCurrentResultId, comment: 'Best repeat of the session' },
  });
  const isAdopted = async (resultId: string) =>
    (await aerodynamicist.ok(resultRead, { params: { programmeId, resultId } })).adopted;

  it('let a variant rest on one result, then on another, then on its newest again', async () => {
    const variantId = await add('Adopting');
    const [a, b] = [await enter(variantId, 'A1'), await enter(variantId, 'A2')];
    expect(await aerodynamicist.ok(resultAdopt, choice(variantId, a))).toMatchObject({
      variantId,
      resultId: a,
      by: 'aerodynamicist of First Motors',
    });
    expect([await isAdopted(a), await isAdopted(b)]).toEqual([true, false]);
    await aerodynamicist.ok(resultAdopt, choice(variantId, b, a));
    expect([await isAdopted(a), await isAdopted(b)]).toEqual([false, true]);
    expect(await aerodynamicist.ok(resultAdopt, choice(variantId, undefined, b))).not.toHaveProperty(
      'resultId',
    );
    expect([await isAdopted(a), await isAdopted(b)]).toEqual([false, false]);

    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    const history = adoptions.filter((adoption) => adoption.variantId === variantId);
    expect(history.map((adoption) => adoption.resultId)).toEqual([undefined, b, a]);
  });

  it('conflict where somebody else decided meanwhile', async () => {
    const variantId = await add('Contested');
    const [a, b] = [await enter(variantId, 'C1'), await enter(variantId, 'C2')];
    await aerodynamicist.ok(resultAdopt, choice(variantId, a));
    expect(await aerodynamicist.refused(resultAdopt, choice(variantId, b))).toMatchObject({
      code: 'conflict',
      where: 'expectedCurrentResultId',
    });
    expect(await isAdopted(a)).toBe(true);
  });

  it('of one variant at the same time: one stands, the other is told', async () => {
    const variantId = await add('Raced');
    const ids = [await enter(variantId, 'R1'), await enter(variantId, 'R2')];
    const answers = await Promise.all(
      ids.map((id) => aerodynamicist.call(resultAdopt, choice(variantId, id))),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
  });

  it('take only the variant’s own results that stand', async () => {
    const [one, other] = [await add('One'), await add('Other')];
    const foreign = await enter(other, 'O1');
    expect(await aerodynamicist.refused(resultAdopt, choice(one, foreign))).toMatchObject({
      code: 'wrong-state',
      detail: expect.stringContaining('another variant'),
    });
    const withdrawn = await enter(one, 'W1');
    await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: withdrawn },
      body: { reason: 'Belt stood still' },
    });
    expect(await aerodynamicist.refused(resultAdopt, choice(one, withdrawn))).toMatchObject({
      code: 'wrong-state',
      detail: expect.stringContaining('Belt stood still'),
    });
    expect((await aerodynamicist.refused(resultAdopt, choice(one, UNKNOWN))).code).toBe('not-found');
    expect((await aerodynamicist.refused(resultAdopt, choice(UNKNOWN, foreign))).code).toBe('not-found');
  });

  it('are released by withdrawing the adopted result, which the audit trail says', async () => {
    const variantId = await add('Released');
    const id = await enter(variantId, 'L1');
    await aerodynamicist.ok(resultAdopt, choice(variantId, id));
    const withdrawn = await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: id },
      body: { reason: 'Wrong tyres' },
    });
    expect(withdrawn).toMatchObject({ adopted: false, withdrawn: { reason: 'Wrong tyres' } });
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    const [newest] = adoptions.filter((adoption) => adoption.variantId === variantId);
    expect(newest).toMatchObject({ comment: 'L1 was withdrawn: Wrong tyres' });
    expect(newest).not.toHaveProperty('resultId');
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
      field: 'because',
      after: 'The adopted result was withdrawn.',
    });
  });

  it('may be made by aerodynamicists only', async () => {
    const variantId = await add('Permitted');
    const id = await enter(variantId, 'P1');
    const manager = await api.asMember('programme-manager');
    expect((await manager.refused(resultAdopt, choice(variantId, id))).code).toBe('forbidden');
    expect((await manager.ok(adoptionList, { params: { programmeId } })).adoptions).toBeDefined();
  });
});
