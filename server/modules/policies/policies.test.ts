import { policiesChange, policiesRead, type PolicyValues } from '#shared/contracts/policies';
import { programmeCreate } from '#shared/contracts/programmes';
import { rankingContextRead, rankingInputsRead } from '#shared/contracts/rankings';
import { variantCreate } from '#shared/contracts/variants';
import { DEFAULT_LIMITS } from '#shared/core/checks/limits';
import { programmeFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

describe('the limits of an organisation over HTTP', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  const current = async (): Promise<{ number: number; values: PolicyValues }> => {
    const [newest] = (await aerodynamicist.ok(policiesRead)).versions;
    return newest!;
  };

  it('are those of the product until somebody changes one, and keep every version', async () => {
    const stranger = await api.asMember('aerodynamicist', api.second);
    const first = await stranger.ok(policiesRead);
    expect(first.versions).toEqual([{ number: 0, values: DEFAULT_LIMITS }]);

    const values = { ...first.versions[0]!.values, machCaution: 0.18 };
    const written = await stranger.ok(policiesChange, {
      body: { expectedNumber: 0, values, comment: 'Our open jet is loud above Mach 0.18' },
    });
    expect(written).toMatchObject({ number: 1, values, comment: 'Our open jet is loud above Mach 0.18' });
    const { versions } = await stranger.ok(policiesRead);
    expect(versions.map(({ number, values: { machCaution } }) => [number, machCaution])).toEqual([
      [1, 0.18],
      [0, 0.2],
    ]);
    expect(versions[0]).toMatchObject({ at: expect.any(String), by: expect.any(String) });
  });

  it('stay apart between organisations', async () => {
    const stranger = await api.asMember('aerodynamicist', api.second);
    const own = await current();
    await aerodynamicist.ok(policiesChange, {
      body: {
        expectedNumber: own.number,
        values: { ...own.values, minimumReynolds: 2.5e6 },
        comment: 'Lessons of the spring entry',
      },
    });
    const [foreign] = (await stranger.ok(policiesRead)).versions;
    expect(foreign!.values.minimumReynolds).toBe(2e6);
  });

  it('refuse a change of a version that is no longer in force, of two at once all but one', async () => {
    const { number, values } = await current();
    const change = (blockageCaution: number) =>
      aerodynamicist.call(policiesChange, {
        body: { expectedNumber: number, values: { ...values, blockageCaution }, comment: 'Stricter' },
      });
    const answers = await Promise.all([change(0.04), change(0.045)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const problem = await aerodynamicist.refused(policiesChange, {
      body: { expectedNumber: number, values: { ...values, blockageCaution: 0.03 }, comment: 'Later' },
    });
    expect(problem).toMatchObject({ code: 'conflict', currentVersion: number + 1 });
  });

  it('are refused field by field where they contradict each other, and nothing is written', async () => {
    const { number, values } = await current();
    const [body] = values.plausible;
    const problem = await aerodynamicist.refused(policiesChange, {
      body: {
        expectedNumber: number,
        values: {
          ...values,
          machCaution: 0.35,
          airTemperatureC: { from: 30, to: 15 },
          plausible: [body!, body!],
        },
        comment: 'Wrong on purpose',
      },
    });
    expect(problem.code).toBe('unusable-input');
    expect(problem.issues?.map(({ where, reason }) => [where, reason])).toEqual([
      ['values.machCaution', 'caution-above-excluded'],
      ['values.airTemperatureC.to', 'from-not-below-to'],
      ['values.plausible.1.bodyShape', 'twice'],
    ]);
    expect((await current()).number).toBe(number);
  });

  it.each(['on', 'off'] as const)(
    'enter the ranking with their version, the friction line %s as the programme has it',
    async (frictionLine) => {
      const { number, values } = await current();
      const minimumReynolds = values.minimumReynolds + 1e5;
      await aerodynamicist.ok(policiesChange, {
        body: {
          expectedNumber: number,
          values: { ...values, minimumReynolds },
          comment: 'For the ranking',
        },
      });
      const { id: programmeId } = await aerodynamicist.ok(programmeCreate, {
        body: programmeFields({ name: `Line ${frictionLine}`, frictionLine }),
      });
      const params = { programmeId };
      await aerodynamicist.ok(variantCreate, { params, body: variantFields() });
      const { programme } = await aerodynamicist.ok(rankingInputsRead, { params });
      expect(programme.policies).toMatchObject({
        policyId: `v${number + 1}`,
        frictionLine,
        minimumReynolds,
        frictionShare: 0.12,
        frictionShareU: 0.06,
      });
      const context = await aerodynamicist.ok(rankingContextRead, { params });
      expect(context.policyNumber).toBe(number + 1);
    },
  );

  it('need a change and a comment', async () => {
    const { number, values } = await current();
    const body = { expectedNumber: number, values, comment: 'Nothing is different' };
    expect(await aerodynamicist.refused(policiesChange, { body })).toMatchObject({
      code: 'unusable-input',
      reason: 'nothing-changed',
    });
    expect(await aerodynamicist.refused(policiesChange, { body: { ...body, comment: ' ' } })).toMatchObject({
      code: 'malformed-input',
    });
  });

  it('are read by every role of the maker and changed by aerodynamicists alone, with a trace in the audit', async () => {
    const { number, values } = await current();
    const body = {
      expectedNumber: number,
      values: { ...values, repeatabilityCaution: 0.004 },
      comment: 'What our balance can do',
    };
    for (const role of ['programme-manager', 'stylist', 'viewer', 'administrator'] as const) {
      const member = await api.asMember(role);
      expect((await member.ok(policiesRead)).versions[0]).toMatchObject({ number });
      expect((await member.refused(policiesChange, { body })).code).toBe('forbidden');
    }
    await aerodynamicist.ok(policiesChange, { body });
    const trail = await api.database.query<{ summary: { field: string }[] }>(
      'maintenance',
      "select summary from audit_events where action = 'policies.changed' order by at desc limit 1",
      [],
    );
    expect(trail[0]!.summary.map(({ field }) => field)).toEqual(['number', 'repeatabilityCaution']);
  });
});
