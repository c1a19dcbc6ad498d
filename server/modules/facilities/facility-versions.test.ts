import {
  facilityCreate,
  facilityEvidenceList,
  facilityModelList,
  facilityRead,
  facilityUpdate,
  facilityVersionList,
  type FacilityFields,
} from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { rankingContextRead } from '#shared/contracts/rankings';
import { resultEnter, resultWithdraw } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('versions of a facility', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  const add = (change: Partial<FacilityFields>) =>
    aerodynamicist.ok(facilityCreate, { body: facilityFields(change) });
  const versionsOf = async (facilityId: string) =>
    (await aerodynamicist.ok(facilityVersionList, { params: { facilityId } })).versions;

  it('begin with the facility as it was added, and grow with every change of what reductions take from it', async () => {
    const { id } = await add({ name: 'Growing' });
    const params = { facilityId: id };
    const body = {
      ...facilityFields({ name: 'Growing', biasURelative: 0.004 }),
      comment: 'New calibration of the nozzle',
    };
    expect(await aerodynamicist.ok(facilityUpdate, { params, ifMatch: 1, body })).toMatchObject({
      version: 2,
      versionNumber: 2,
      biasURelative: 0.004,
    });
    const [second, first] = await versionsOf(id);
    expect(second).toMatchObject({
      number: 2,
      comment: 'New calibration of the nozzle',
      fields: { biasURelative: 0.004 },
      by: expect.any(String),
    });
    expect(first).toMatchObject({ number: 1, fields: { biasURelative: 0.006 }, by: expect.any(String) });
  });

  it('stay as they are where only name, remark, check body or usual condition change; no comment is asked', async () => {
    const { id } = await add({ name: 'Renamed' });
    const body = facilityFields({
      name: 'Renamed again',
      remark: 'Closed in August',
      checkBody: { name: 'Grey box' },
      usualCondition: { ground: 'one-belt' },
    });
    const changed = await aerodynamicist.ok(facilityUpdate, { params: { facilityId: id }, ifMatch: 1, body });
    expect(changed).toMatchObject({ version: 2, versionNumber: 1, checkBody: { name: 'Grey box' } });
    expect(await versionsOf(id)).toHaveLength(1);
  });

  it('need a comment', async () => {
    const { id } = await add({ name: 'Uncommented' });
    const params = { facilityId: id };
    const body = facilityFields({ name: 'Uncommented', sessionURelative: 0.002 });
    expect(await aerodynamicist.refused(facilityUpdate, { params, ifMatch: 1, body })).toMatchObject({
      code: 'unusable-input',
      where: 'comment',
    });
    expect(await aerodynamicist.ok(facilityRead, { params })).toMatchObject({ version: 1, versionNumber: 1 });
  });

  it('hold version 1 of a facility from before versions were kept, with the day it was added', async () => {
    const { id } = await add({ name: 'Older' });
    await api.database.query('maintenance', 'delete from facility_versions where facility_id = $1', [id]);
    const [only] = await versionsOf(id);
    expect(only).toMatchObject({ number: 1, fields: { name: 'Older' } });
    expect(only).not.toHaveProperty('by');
    const body = { ...facilityFields({ name: 'Older', areaM2: 23 }), comment: 'Measured anew' };
    await aerodynamicist.ok(facilityUpdate, { params: { facilityId: id }, ifMatch: 1, body });
    const [second, first] = await versionsOf(id);
    expect([second?.fields.areaM2, first?.fields.areaM2]).toEqual([23, 24]);
    expect(first?.at).toBe(only?.at);
  });

  it('cannot be changed afterwards by requests', async () => {
    await expect(
      api.database.query('tenant', 'update facility_versions set number = number + 1'),
    ).rejects.toThrow(/permission denied/);
  });

  it('are unknown elsewhere', async () => {
    const { id } = await add({ name: 'Ours' });
    const stranger = await api.asMember('aerodynamicist', api.second);
    for (const endpoint of [facilityVersionList, facilityEvidenceList, facilityModelList]) {
      expect((await stranger.refused(endpoint, { params: { facilityId: id } })).code).toBe('not-found');
    }
  });

  describe('with results', () => {
    let facilityId: string;
    let programmeId: string;
    let variantId: string;

    beforeAll(async () => {
      facilityId = (await add({ name: 'In use' })).id;
      programmeId = (await aerodynamicist.ok(programmeCreate, { body: programmeFields() })).id;
      const params = { programmeId };
      variantId = (await aerodynamicist.ok(variantCreate, { params, body: variantFields() })).id;
    });

    const enter = (name: string, scale: number) =>
      aerodynamicist.ok(resultEnter, {
        params: { programmeId },
        body: resultFields({ variantId, facilityId }, { name, scale }),
      });

    it('know the results of each programme and the largest models, without those withdrawn', async () => {
      await enter('Full', 1);
      await enter('Quarter', 0.25);
      const gone = await enter('Gone', 1);
      await aerodynamicist.ok(resultWithdraw, {
        params: { programmeId, resultId: gone.id },
        body: { reason: 'Wrong car' },
      });
      const params = { facilityId };
      const { programmes } = await aerodynamicist.ok(facilityEvidenceList, { params });
      expect(programmes).toEqual([{ programmeId, programmeName: 'Dunlin', results: 3 }]);
      const { models } = await aerodynamicist.ok(facilityModelList, { params });
      expect(models.map(({ resultName }) => resultName)).toEqual(['Full', 'Quarter']);
      expect(models[0]?.modelAreaM2).toBeCloseTo(2.17, 12);
      expect(models[1]?.modelAreaM2).toBeCloseTo(2.17 / 16, 12);
    });

    it('refuse another kind of facility', async () => {
      const body = {
        ...facilityFields({ name: 'In use', kind: 'closed' }),
        comment: 'It was a closed one all along',
      };
      expect(
        await aerodynamicist.refused(facilityUpdate, { params: { facilityId }, ifMatch: 1, body }),
      ).toMatchObject({ code: 'unusable-input', where: 'kind' });
    });

    it('stand beside the inputs of the ranking by number', async () => {
      const body = {
        ...facilityFields({ name: 'In use', sessionURelative: 0.002 }),
        comment: 'From the check body',
      };
      await aerodynamicist.ok(facilityUpdate, { params: { facilityId }, ifMatch: 1, body });
      const context = await aerodynamicist.ok(rankingContextRead, { params: { programmeId } });
      expect(context.facilityVersions).toEqual([{ facilityId, number: 2 }]);
    });
  });
});
