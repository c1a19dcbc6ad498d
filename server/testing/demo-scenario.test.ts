import pg from 'pg';
import { adjustmentList } from '#shared/contracts/adjustments';
import { adoptionList } from '#shared/contracts/adoptions';
import { correlationList, correlationRead } from '#shared/contracts/correlations';
import { policiesRead } from '#shared/contracts/policies';
import { resultEnter, resultList } from '#shared/contracts/results';
import { facilityList } from '#shared/contracts/facilities';
import { programmeList, programmeRead } from '#shared/contracts/programmes';
import { sessionRead } from '#shared/contracts/session';
import { testPlanList } from '#shared/contracts/test-plans';
import { variantList } from '#shared/contracts/variants';
import { evaluateRank } from '#shared/core/ranking/rank';
import { seedDemo } from '../../seeds/demo/index';
import { ALDERMERE, DEMO_PEOPLE, VELTHORPE, type DemoOrganisation } from '../../seeds/demo/people/people';
import { ALDERMERE_SCENARIO } from '../../seeds/demo/scenario/aldermere';
import { VELTHORPE_SCENARIO } from '../../seeds/demo/scenario/velthorpe';
import { builtInCycle } from '../../seeds/reference/cycles/built-in-cycles';
import { rankingInputOf } from '../../seeds/demo/scenario/ranking-input';
import { facilityIssues } from '../modules/facilities';
import { resultIssues } from '../modules/results';
import { variantIssues } from '../modules/variants';
import { replayEvaluations } from '../scripts/replay/replay-evaluations';
import { evaluateAdoptions } from '../scripts/start/evaluate-adoptions';
import { startApi, type ApiHarness } from './api-harness';
import { ApiMember } from './as-member';
import type { TestOrganisation } from './test-members';

function organisationOf(organisation: DemoOrganisation): TestOrganisation {
  const places = DEMO_PEOPLE.flatMap((person) =>
    person.places
      .filter((place) => place.organisation.id === organisation.id)
      .map((place) => [place.role, person.id] as const),
  );
  return { ...organisation, userIds: new Map(places) };
}

describe('the demo scenario in a database', () => {
  let api: ApiHarness;
  let aldermere: ApiMember;

  beforeAll(async () => {
    api = await startApi();
    const client = new pg.Client({ connectionString: api.database.url('maintenance') });
    await client.connect();
    await client.query('begin');
    await seedDemo(client, { passwordHash: 'not a hash: nobody signs in with it here' });
    await client.query('commit');
    await client.end();
    await evaluateAdoptions({
      maintenance: api.database.url('maintenance'),
      tenant: api.database.url('tenant'),
      platform: api.database.url('platform'),
    });
    aldermere = await ApiMember.signIn(api.caller, organisationOf(ALDERMERE), 'aerodynamicist');
  });
  afterAll(() => api.close());

  const programmeId = async (member = aldermere) => {
    const [programme] = (await member.ok(programmeList)).programmes;
    if (programme === undefined) throw new Error('There is no programme.');
    return programme.id;
  };

  it('shows the programme with its counts', async () => {
    expect((await aldermere.ok(programmeList)).programmes).toEqual([
      expect.objectContaining({
        name: 'Dunlin',
        variantCount: 5,
        resultCount: 46,
        variantsWithoutResult: 0,
        latestResultDate: '2026-11-19',
      }),
    ]);
  });

  it('keeps every variant, facility and result as the scenario has them', async () => {
    const params = { programmeId: await programmeId() };
    const { variants } = await aldermere.ok(variantList, { params });
    const { facilities } = await aldermere.ok(facilityList);
    const { results } = await aldermere.ok(resultList, { params });
    expect(variants.map(({ name }) => name).sort()).toEqual(
      Object.values(ALDERMERE_SCENARIO.variants)
        .map(({ name }) => name)
        .sort(),
    );
    for (const fields of Object.values(ALDERMERE_SCENARIO.variants)) {
      expect(variants.find(({ name }) => name === fields.name)).toMatchObject(fields);
    }
    for (const fields of Object.values(ALDERMERE_SCENARIO.facilities)) {
      expect(facilities.find(({ name }) => name === fields.name)).toMatchObject(fields);
    }
    for (const [index, scenario] of ALDERMERE_SCENARIO.results.entries()) {
      const { variant: _variant, facility: _facility, ...fields } = scenario;
      const raw = JSON.parse(JSON.stringify(fields)) as object;
      expect(results[index]).toMatchObject({ ...raw, entrySequence: index + 1, enteredBy: 'Ingrid Falk' });
    }
    const adopted = results.filter((result) => result.adopted).map(({ name }) => name);
    expect(adopted).toEqual(['S-2608-04', 'H-2609-03', 'H-2609-06', 'H-2609-12']);
    expect((await aldermere.ok(adoptionList, { params })).adoptions).toHaveLength(5);
    expect(results.filter((result) => result.withdrawn !== undefined)).toHaveLength(1);
  });

  it('would pass every rule that a person’s own entries have to pass', () => {
    for (const scenario of [ALDERMERE_SCENARIO, VELTHORPE_SCENARIO]) {
      const latestPastDay = '2026-12-01';
      for (const facility of Object.values(scenario.facilities)) expect(facilityIssues(facility)).toEqual([]);
      for (const variant of Object.values(scenario.variants)) {
        expect(
          variantIssues(variant, {
            latestPastDay,
            takenNames: new Map(),
            configurationIds: new Set(),
            pictureFound: true,
          }),
        ).toEqual([]);
      }
      for (const { variant, facility, ...fields } of scenario.results) {
        const place = scenario.facilities[facility];
        if (place === undefined) throw new Error(`${facility} is not in the scenario`);
        expect(
          resultIssues(
            { ...fields, variantId: '', facilityId: '' },
            {
              latestPastDay,
              facility: place,
              frontalAreaM2: scenario.variants[variant]?.frontalAreas[0]?.areaM2 ?? 0,
            },
          ),
        ).toEqual([]);
      }
    }
  });

  it('shows the reference, the common area of the Liftback and the next milestone', async () => {
    const programme = await aldermere.ok(programmeRead, { params: { programmeId: await programmeId() } });
    const { variants } = await aldermere.ok(variantList, { params: { programmeId: programme.id } });
    const liftback = variants.find(({ name }) => name === 'Dunlin Liftback');
    expect(programme.commonArea).toEqual({ kind: 'variant', variantId: liftback?.id });
    expect(programme.milestones).toContainEqual(
      expect.objectContaining({ name: 'Clay freeze', date: '2027-03-14' }),
    );
  });

  it('leads everybody’s sign-in to the programme', async () => {
    for (const role of ['aerodynamicist', 'stylist', 'viewer'] as const) {
      const member = await ApiMember.signIn(api.caller, organisationOf(ALDERMERE), role);
      expect((await member.ok(sessionRead)).member?.latestProgrammeId).toBe(await programmeId());
    }
  });

  it('keeps limits, adjustments, a correlation in its second version, and plans, as the screens read them', async () => {
    const params = { programmeId: await programmeId() };
    const { versions } = await aldermere.ok(policiesRead);
    expect(versions[0]).toMatchObject({ number: 1, values: { reynoldsToleranceM2: 0.004 } });
    expect((await aldermere.ok(adjustmentList)).adjustments).toHaveLength(2);
    const [summary] = (await aldermere.ok(correlationList)).correlations;
    expect(summary).toMatchObject({ latestNumber: 2, inUse: { versionNumber: 2, since: '2026-07-01' } });
    const correlation = await aldermere.ok(correlationRead, {
      params: { correlationId: summary?.id ?? '' },
    });
    expect(correlation.versions.map(({ pairs }) => pairs.length)).toEqual([7, 4]);
    const { plans } = await aldermere.ok(testPlanList, { params });
    expect(plans.filter(({ expectedSince }) => expectedSince !== undefined)).toHaveLength(1);
    expect(plans).toHaveLength(2);
  });

  it('goes on counting entries where the scenario ends', async () => {
    const id = await programmeId();
    const { results } = await aldermere.ok(resultList, { params: { programmeId: id } });
    const [first] = results;
    if (first === undefined) throw new Error('There is no result.');
    const { variantId, facilityId, testDate, quantity, scale, condition, points, air, speedKmh } = first;
    const { quotedAreaM2, quotedAreaScale } = first;
    const entered = await aldermere.ok(resultEnter, {
      params: { programmeId: id },
      body: {
        ...{ variantId, facilityId, testDate, quantity, scale, condition, points, air, speedKmh },
        ...{ quotedAreaM2, quotedAreaScale, name: 'One more' },
      },
    });
    expect(entered.entrySequence).toBe(results.length + 1);
  });

  it('keeps an evaluation of every adoption that stands, and each comes to the same again', async () => {
    const client = new pg.Client({ connectionString: api.database.url('maintenance') });
    await client.connect();
    const { rows } = await client.query<{ standing: string }>(
      `select count(*) as standing from (select distinct on (organisation_id, variant_id) organisation_id, id from adoptions
        order by organisation_id, variant_id, adopted_at desc, id desc) a
       where exists (select from adoption_results ar
         where ar.organisation_id = a.organisation_id and ar.adoption_id = a.id)`,
    );
    const standing = Number(rows[0]?.standing);
    const moved: unknown[] = [];
    const summary = await replayEvaluations(client, (outcome) => moved.push(outcome));
    await client.end();
    expect(standing).toBeGreaterThan(0);
    expect(moved).toEqual([]);
    expect(summary).toEqual({ evaluations: standing, same: standing, moved: 0 });
  });

  it('gives the other maker its own programme, and neither sees the other’s', async () => {
    const velthorpe = await ApiMember.signIn(api.caller, organisationOf(VELTHORPE), 'aerodynamicist');
    expect((await velthorpe.ok(programmeList)).programmes.map(({ name }) => name)).toEqual(['Wherry']);
    const problem = await velthorpe.refused(programmeRead, { params: { programmeId: await programmeId() } });
    expect(problem.code).toBe('not-found');
    expect(evaluateRank(rankingInputOf(VELTHORPE_SCENARIO, 'adopted'), builtInCycle).ranking).toHaveLength(2);
  });
});
