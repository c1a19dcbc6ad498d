import { attachmentUpload } from '#shared/contracts/attachments';
import { programmeCreate } from '#shared/contracts/programmes';
import {
  variantCreate,
  variantList,
  variantRead,
  variantRetire,
  variantUpdate,
} from '#shared/contracts/variants';
import { programmeFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const UNKNOWN = '00000000-0000-4000-8000-000000000000';
const PNG = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 0]);

describe('variants over HTTP', () => {
  let api: ApiHarness;
  let manager: ApiMember;
  let programmeId: string;

  beforeAll(async () => {
    api = await startApi();
    manager = await api.asMember('programme-manager');
    programmeId = (await manager.ok(programmeCreate, { body: programmeFields() })).id;
  });
  afterAll(() => api.close());

  const create = (change: Parameters<typeof variantFields>[0]) =>
    manager.ok(variantCreate, { params: { programmeId }, body: variantFields(change) });
  const place = (variantId: string) => ({ programmeId, variantId });

  it('come back as they were entered, frontal areas newest first, configurations in their order', async () => {
    const fields = variantFields({
      name: 'Whole',
      description: 'five-door hatch',
      aliases: ['D5H', 'Fünftürer'],
      frontalAreas: [
        { areaM2: 2.2, uM2: 0.03, method: 'cad', date: '2024-11-05' },
        { areaM2: 2.17, uM2: 0.006, method: 'laser', date: '2026-02-11', remark: 'second clay' },
      ],
      configurations: [
        {
          name: 'Electric',
          massKg: 1680,
          rollingResistance: 0.0085,
          salesShare: 0.7,
          electric: {
            driveEfficiency: 0.9,
            regenerationEfficiency: 0.6,
            regenerationPowerLimitW: 60_000,
            auxiliaryPowerW: 350,
            chargingEfficiency: 0.88,
            usableEnergyKWh: 58,
          },
        },
        {
          name: 'Petrol',
          massKg: 1430,
          salesShare: 0.3,
          roadLoadReference: {
            f0N: 130.5,
            f1NPerKmh: 0.31,
            f2NPerKmh2: 0.0291,
            massKg: 1410,
            dragAreaM2: 0.601,
            airDensityKgM3: 1.189,
          },
        },
      ],
    });
    const created = await manager.ok(variantCreate, { params: { programmeId }, body: fields });
    expect(created).toMatchObject({ ...fields, frontalAreas: [...fields.frontalAreas].reverse() });
    expect(created.frontalAreas[0]).toEqual(fields.frontalAreas[1]);
    expect(await manager.ok(variantRead, { params: place(created.id) })).toEqual(created);
  });

  it('may begin with an area alone, without dimensions', async () => {
    const created = await create({
      name: 'Sketch',
      lengthMm: undefined,
      widthMm: undefined,
      heightMm: undefined,
      wheelbaseMm: undefined,
    });
    expect(created).not.toHaveProperty('lengthMm');
  });

  it('keep the ids of configurations through a change, and lose those that are left out', async () => {
    const created = await create({
      name: 'Sold',
      configurations: [
        { name: 'A', massKg: 1500, rollingResistance: 0.009, salesShare: 0.5 },
        { name: 'B', massKg: 1600, rollingResistance: 0.009, salesShare: 0.5 },
      ],
    });
    const [a, b] = created.configurations;
    const changed = await manager.ok(variantUpdate, {
      params: place(created.id),
      ifMatch: 1,
      body: variantFields({
        name: 'Sold',
        configurations: [
          { id: b?.id, name: 'B long range', massKg: 1700, rollingResistance: 0.008, salesShare: 0.4 },
          { name: 'C', massKg: 1550, rollingResistance: 0.009, salesShare: 0.6 },
        ],
      }),
    });
    expect(changed.configurations.map((configuration) => configuration.name)).toEqual(['B long range', 'C']);
    expect(changed.configurations[0]?.id).toBe(b?.id);
    expect(changed.configurations.map((configuration) => configuration.id)).not.toContain(a?.id);
  });

  it('cannot take over a configuration of another variant', async () => {
    const [one, other] = [await create({ name: 'One' }), await create({ name: 'Other' })];
    const problem = await manager.refused(variantUpdate, {
      params: place(one.id),
      ifMatch: 1,
      body: variantFields({ name: 'One', configurations: other.configurations }),
    });
    expect(problem).toMatchObject({ code: 'unusable-input', where: 'configurations.0.id' });
  });

  it('detect a colleague’s change', async () => {
    const { id } = await create({ name: 'Contested' });
    const body = variantFields({ name: 'Contested', heightMm: 1440 });
    await manager.ok(variantUpdate, { params: place(id), ifMatch: 1, body });
    expect(await manager.refused(variantUpdate, { params: place(id), ifMatch: 1, body })).toMatchObject({
      code: 'conflict',
      currentVersion: 2,
    });
  });

  it('have names and aliases that mean one variant of the programme', async () => {
    await create({ name: 'Original', aliases: ['ORG'] });
    const add = (change: Parameters<typeof variantFields>[0]) =>
      manager.refused(variantCreate, { params: { programmeId }, body: variantFields(change) });
    expect((await add({ name: 'original' })).code).toBe('already-exists');
    expect(await add({ name: 'Copy', aliases: ['org'] })).toMatchObject({
      code: 'unusable-input',
      where: 'aliases.0',
    });
  });

  it('show a picture that was brought in as one, and no other file', async () => {
    const upload = (purpose: string) =>
      manager.ok(attachmentUpload, { query: { purpose }, file: { name: 'side.png', content: PNG } });
    const [picture, evidence] = [await upload('picture'), await upload('evidence')];
    expect(await create({ name: 'Pictured', pictureAttachmentId: picture.id })).toMatchObject({
      pictureAttachmentId: picture.id,
    });
    for (const pictureAttachmentId of [evidence.id, UNKNOWN]) {
      expect(
        await manager.refused(variantCreate, {
          params: { programmeId },
          body: variantFields({ name: 'Wrongly pictured', pictureAttachmentId }),
        }),
      ).toMatchObject({ code: 'unusable-input', where: 'pictureAttachmentId' });
    }
  });

  it('are listed with retired ones last, and brought back', async () => {
    const { id } = await create({ name: 'AAA retired' });
    await manager.ok(variantRetire, { params: place(id), ifMatch: 1, body: { retired: true } });
    const { variants } = await manager.ok(variantList, { params: { programmeId } });
    expect(variants.at(-1)).toMatchObject({ name: 'AAA retired', retiredAt: expect.any(String) });
    expect(
      await manager.ok(variantRetire, { params: place(id), ifMatch: 2, body: { retired: false } }),
    ).not.toHaveProperty('retiredAt');
  });

  it('belong to one programme and one organisation', async () => {
    const { id } = await create({ name: 'Here' });
    const elsewhere = await manager.ok(programmeCreate, { body: programmeFields({ name: 'Elsewhere' }) });
    const params = { programmeId: elsewhere.id, variantId: id };
    expect((await manager.refused(variantRead, { params })).code).toBe('not-found');
    const stranger = await api.asMember('programme-manager', api.second);
    expect((await stranger.refused(variantRead, { params: place(id) })).code).toBe('not-found');
    expect(
      (await stranger.refused(variantCreate, { params: { programmeId }, body: variantFields() })).code,
    ).toBe('not-found');
    expect((await stranger.refused(variantList, { params: { programmeId } })).code).toBe('not-found');
  });
});
