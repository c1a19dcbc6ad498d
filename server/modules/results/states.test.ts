import { randomUUID } from 'node:crypto';
import { adoptionList, evidenceAdopt } from '#shared/contracts/adoptions';
import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import {
  resultEnter,
  resultHistory,
  resultRead,
  resultsCheck,
  resultsWithdraw,
} from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';

describe('where results stand, over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let programmeId: string;
  let facilityId: string;
  let variantId: string;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    programmeId = (await aerodynamicist.ok(programmeCreate, { body: programmeFields() })).id;
    facilityId = (await aerodynamicist.ok(facilityCreate, { body: facilityFields() })).id;
    const params = { programmeId };
    variantId = (await aerodynamicist.ok(variantCreate, { params, body: variantFields() })).id;
  });
  afterAll(() => api.close());

  const enter = async (name: string) =>
    (
      await aerodynamicist.ok(resultEnter, {
        params: { programmeId },
        body: resultFields({ variantId, facilityId }, { name }),
      })
    ).id;
  const check = (resultIds: string[], state: 'entered' | 'checked' = 'checked') => ({
    params: { programmeId },
    body: { resultIds, state, comment: 'Traces and tare seen' },
  });
  const withdraw = (resultIds: string[]) => ({
    params: { programmeId },
    body: { resultIds, reason: 'The wrong mirrors were on' },
  });
  const stateOf = async (resultId: string) =>
    (await aerodynamicist.ok(resultRead, { params: { programmeId, resultId } })).state;

  it('move to checked, singly and many at once, and back, with comments that stay', async () => {
    const [a, b] = [await enter('C1'), await enter('C2')];
    const { results } = await aerodynamicist.ok(resultsCheck, check([b, a]));
    expect(results.map(({ id, state }) => [id, state])).toEqual([
      [b, 'checked'],
      [a, 'checked'],
    ]);
    await aerodynamicist.ok(resultsCheck, check([a], 'entered'));
    expect([await stateOf(a), await stateOf(b)]).toEqual(['entered', 'checked']);
    const { events } = await aerodynamicist.ok(resultHistory, { params: { programmeId, resultId: a } });
    expect(events.map(({ kind, by, comment }) => [kind, by, comment])).toEqual([
      ['check-taken-back', 'aerodynamicist of First Motors', 'Traces and tare seen'],
      ['checked', 'aerodynamicist of First Motors', 'Traces and tare seen'],
      ['entered', 'aerodynamicist of First Motors', undefined],
    ]);
  });

  it('are checked all together or not at all, with each refusal by its place', async () => {
    const [a, b] = [await enter('C3'), await enter('C4')];
    await aerodynamicist.ok(resultsCheck, check([b]));
    const problem = await aerodynamicist.refused(resultsCheck, check([a, b]));
    expect(problem).toMatchObject({
      code: 'wrong-state',
      issues: [{ where: 'resultIds.1', detail: 'C4 has been checked already.' }],
    });
    expect(await stateOf(a)).toBe('entered');
    expect((await aerodynamicist.refused(resultsCheck, check([a, UNKNOWN]))).code).toBe('not-found');
    expect((await aerodynamicist.refused(resultsCheck, check([a, a]))).code).toBe('unusable-input');
  });

  it('are checked once by two people at once: the other is told', async () => {
    const id = await enter('C5');
    const colleague = await api.asMember('aerodynamicist');
    const answers = await Promise.all(
      [aerodynamicist, colleague].map((member) => member.call(resultsCheck, check([id]))),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('are withdrawn many at once, out of every adoption; the variant goes on with what is left', async () => {
    const [a, b, c] = [await enter('W1'), await enter('W2'), await enter('W3')];
    await aerodynamicist.ok(evidenceAdopt, {
      params: { programmeId },
      body: {
        adoptions: [{ variantId, resultIds: [a, b, c], rule: 'weighted-mean' }],
        comment: 'Three repeats',
      },
    });
    const key = randomUUID();
    const once = await aerodynamicist.ok(resultsWithdraw, { ...withdraw([a, c]), key });
    expect(await aerodynamicist.ok(resultsWithdraw, { ...withdraw([a, c]), key })).toEqual(once);
    expect(once.results.map(({ state }) => state)).toEqual(['withdrawn', 'withdrawn']);
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    expect(adoptions[0]).toMatchObject({
      resultIds: [b],
      rule: 'weighted-mean',
      comment: 'W1, W3 was withdrawn: The wrong mirrors were on',
    });
    const problem = await aerodynamicist.refused(resultsWithdraw, withdraw([b, a]));
    expect(problem).toMatchObject({ code: 'wrong-state', where: 'resultIds.1' });
    expect(await stateOf(b)).toBe('adopted');
  });

  it('are not unchecked while a variant rests on them', async () => {
    const id = await enter('A1');
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    await aerodynamicist.ok(evidenceAdopt, {
      params: { programmeId },
      body: {
        adoptions: [{ variantId, resultIds: [id], rule: 'newest', expectedAdoptionId: adoptions[0]?.id }],
        comment: 'The cleanest of them',
      },
    });
    const problem = await aerodynamicist.refused(resultsCheck, check([id], 'entered'));
    expect(problem.detail).toContain('is adopted');
  });

  it('are moved by aerodynamicists only, and never by another organisation', async () => {
    const id = await enter('R1');
    for (const role of ['programme-manager', 'stylist', 'viewer', 'administrator'] as const) {
      const member = await api.asMember(role);
      expect((await member.refused(resultsCheck, check([id]))).code).toBe('forbidden');
      expect((await member.refused(resultsWithdraw, withdraw([id]))).code).toBe('forbidden');
    }
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(resultsCheck, check([id]))).code).toBe('not-found');
    expect((await stranger.refused(resultHistory, { params: { programmeId, resultId: id } })).code).toBe(
      'not-found',
    );
  });
});
