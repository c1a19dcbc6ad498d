import {
  adjustmentCreate,
  adjustmentList,
  adjustmentRead,
  adjustmentRetire,
  adjustmentUpdate,
} from '#shared/contracts/adjustments';
import { attachmentUpload } from '#shared/contracts/attachments';
import { adjustmentFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('adjustments over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  const add = (change: Parameters<typeof adjustmentFields>[0]) =>
    aerodynamicist.ok(adjustmentCreate, { body: adjustmentFields(change) });

  it('come back exactly as they were entered, with their evidence and who added them', async () => {
    const file = { name: 'report.pdf', content: '%PDF-1.4 sample' };
    const evidence = await aerodynamicist.ok(attachmentUpload, { query: { purpose: 'evidence' }, file });
    const fields = adjustmentFields({
      name: 'Complete',
      fromValue: 'road',
      bodyShapes: ['estate', 'van'],
      attachmentId: evidence.id,
    });
    const created = await aerodynamicist.ok(adjustmentCreate, { body: fields });
    expect(created).toEqual({
      ...fields,
      id: created.id,
      version: 1,
      addedAt: expect.any(String),
      addedBy: expect.any(String),
    });
    const params = { adjustmentId: created.id };
    expect(await aerodynamicist.ok(adjustmentRead, { params })).toEqual(created);
  });

  it('are refused with an uncertainty of zero, equal values and unknown evidence, all said at once', async () => {
    const problem = await aerodynamicist.refused(adjustmentCreate, {
      body: adjustmentFields({
        name: 'Wrong',
        toValue: 'fixed-floor',
        uM2: 0,
        attachmentId: '00000000-0000-4000-8000-000000000000',
      }),
    });
    expect(problem.code).toBe('unusable-input');
    expect(problem.issues?.map(({ where }) => where)).toEqual(['toValue', 'uM2', 'attachmentId']);
  });

  it('are refused without evidence in words', async () => {
    const body = adjustmentFields({ name: 'Unfounded', evidence: ' ' });
    expect((await aerodynamicist.refused(adjustmentCreate, { body })).code).toBe('malformed-input');
  });

  it('are changed with the version that was seen, and not by two at once', async () => {
    const { id } = await add({ name: 'Changing', item: 'cooling', fromValue: 'open', toValue: 'closed' });
    const params = { adjustmentId: id };
    const body = adjustmentFields({
      name: 'Changing',
      item: 'cooling',
      fromValue: 'open',
      toValue: 'closed',
      uM2: 0.006,
    });
    expect(await aerodynamicist.ok(adjustmentUpdate, { params, ifMatch: 1, body })).toMatchObject({
      uM2: 0.006,
      version: 2,
    });
    expect(await aerodynamicist.refused(adjustmentUpdate, { params, ifMatch: 1, body })).toMatchObject({
      code: 'conflict',
      currentVersion: 2,
    });
  });

  it('fit one difference once, even when two people add one at the same moment', async () => {
    const body = (name: string) =>
      adjustmentFields({ name, item: 'mirrors', fromValue: 'fitted', toValue: 'removed' });
    const answers = await Promise.all([
      aerodynamicist.call(adjustmentCreate, { body: body('Mirrors one') }),
      aerodynamicist.call(adjustmentCreate, { body: body('Mirrors two') }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 422]);
  });

  it('go out of use, come back only where nothing took their place, and are audited', async () => {
    const fields = { item: 'wheels', fromValue: 'stationary', toValue: 'rotating' } as const;
    const first = await add({ name: 'Wheels', ...fields });
    const params = { adjustmentId: first.id };
    await aerodynamicist.ok(adjustmentRetire, { params, ifMatch: 1, body: { retired: true } });
    const second = await add({ name: 'Wheels, newer', ...fields });
    expect(
      await aerodynamicist.refused(adjustmentRetire, { params, ifMatch: 2, body: { retired: false } }),
    ).toMatchObject({ code: 'unusable-input', reason: 'fits-already' });
    const { adjustments } = await aerodynamicist.ok(adjustmentList);
    const order = adjustments.map(({ id }) => id);
    expect(order.indexOf(second.id)).toBeLessThan(order.indexOf(first.id));
    const trail = await api.database.query<{ action: string }>(
      'maintenance',
      'select action from audit_events where entity_id = $1 order by at',
      [first.id],
    );
    expect(trail.map(({ action }) => action)).toEqual(['adjustment.added', 'adjustment.retired']);
  });

  it('are read by every role of the maker, changed by aerodynamicists, and unknown elsewhere', async () => {
    const { id } = await add({ name: 'Seen', fromValue: 'one-belt' });
    const stylist = await api.asMember('stylist');
    expect((await stylist.ok(adjustmentList)).adjustments.map(({ name }) => name)).toContain('Seen');
    expect((await stylist.refused(adjustmentCreate, { body: adjustmentFields() })).code).toBe('forbidden');
    const stranger = await api.asMember('aerodynamicist', api.second);
    expect((await stranger.refused(adjustmentRead, { params: { adjustmentId: id } })).code).toBe('not-found');
    expect((await stranger.ok(adjustmentList)).adjustments).toEqual([]);
  });
});
