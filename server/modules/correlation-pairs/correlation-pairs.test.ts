import {
  candidatePairList,
  correlationAdopt,
  correlationCreate,
  type CorrelationPair,
} from '#shared/contracts/correlations';
import { adjustmentCreate } from '#shared/contracts/adjustments';
import { facilityCreate } from '#shared/contracts/facilities';
import { programmeCreate } from '#shared/contracts/programmes';
import { rankingContextRead, rankingInputsRead } from '#shared/contracts/rankings';
import { resultEnter } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { evaluateReduce } from '#shared/core/reduction/reduce';
import {
  adjustmentFields,
  facilityFields,
  programmeFields,
  resultFields,
  variantFields,
} from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

jest.setTimeout(60_000);

describe('pairs, correlations and adjustments in a programme', () => {
  let api: ApiHarness;
  let aerodynamicist: ApiMember;
  let programmeId: string;
  let small: string;
  let large: string;
  const variants: string[] = [];

  beforeAll(async () => {
    api = await startApi();
    aerodynamicist = await api.asMember('aerodynamicist');
    const facility = async (name: string) =>
      (await aerodynamicist.ok(facilityCreate, { body: facilityFields({ name }) })).id;
    small = await facility('Small');
    large = await facility('Large');
    const programme = await aerodynamicist.ok(programmeCreate, {
      body: programmeFields({ referenceFacilityId: large }),
    });
    programmeId = programme.id;
    for (const [name, bodyShape, value] of [
      ['Hatch', 'hatch', 0.28],
      ['Estate', 'estate', 0.3],
      ['Van', 'van', 0.33],
    ] as const) {
      const variant = await aerodynamicist.ok(variantCreate, {
        params: { programmeId },
        body: variantFields({ name, bodyShape }),
      });
      variants.push(variant.id);
      await enter(`${name} small`, variant.id, small, value + 0.005);
      await enter(`${name} large`, variant.id, large, value);
    }
  });
  afterAll(() => api.close());

  const enter = (name: string, variantId: string, facilityId: string, value: number, condition = {}) =>
    aerodynamicist.ok(resultEnter, {
      params: { programmeId },
      body: resultFields(
        { variantId, facilityId },
        {
          name,
          points: [{ yawDeg: 0, value, s: 0.0006, n: 3 }],
          condition: { ground: 'several-belts', wheels: 'rotating', ...condition },
        },
      ),
    });
  const pairsBetween = (facilityId: string, referenceFacilityId: string) =>
    aerodynamicist.ok(candidatePairList, {
      query: { facilityId, referenceFacilityId, replaces: 'blockage' },
    });
  const inputs = () =>
    aerodynamicist.ok(rankingInputsRead, { params: { programmeId }, query: { evidence: 'newest' } });

  it('propose one pair a variant, with the names of the results and the figures of the programme', async () => {
    const { pairs, refused } = await pairsBetween(small, large);
    expect(refused).toEqual([]);
    expect(pairs.map(({ geometry, newest }) => [geometry, newest])).toEqual([
      ['Estate', true],
      ['Hatch', true],
      ['Van', true],
    ]);
    expect(pairs[1]).toMatchObject({ resultName: 'Hatch small', referenceResultName: 'Hatch large' });
    expect((await pairsBetween(large, large)).pairs).toEqual([]);
  });

  it('enter the ranking as a correlation from the date of its adoption on, named by version in what stands beside', async () => {
    const { pairs } = await pairsBetween(small, large);
    const used = pairs.map(
      ({
        geometry,
        resultId,
        referenceResultId,
        dragAreaM2,
        uM2,
        referenceDragAreaM2,
        referenceUM2,
      }): CorrelationPair => ({
        geometry,
        resultId,
        referenceResultId,
        dragAreaM2,
        uM2,
        referenceDragAreaM2,
        referenceUM2,
      }),
    );
    const { id, versions } = await aerodynamicist.ok(correlationCreate, {
      body: {
        name: 'Small to large',
        facilityId: small,
        referenceFacilityId: large,
        replaces: ['blockage'],
        pairs: [...used, { ...used[0], leftOutReason: 'Twice the same body' }],
        comment: 'Three bodies',
      },
    });
    expect((await inputs()).correlations).toEqual([]);
    const adopt = (effectiveDate: string) =>
      aerodynamicist.ok(correlationAdopt, {
        params: { correlationId: id },
        body: { versionNumber: 1, effectiveDate, comment: 'Agreed' },
      });
    await adopt('2026-05-01');
    const document = await inputs();
    expect(document.correlations).toEqual([
      expect.objectContaining({
        id: versions[0]?.id,
        name: 'Small to large, version 1, in use since 2026-05-01',
        replaces: ['blockage'],
      }),
    ]);
    expect(document.correlations?.[0]?.pairs).toHaveLength(3);
    const context = await aerodynamicist.ok(rankingContextRead, { params: { programmeId } });
    expect(context.correlations).toEqual([
      { id: versions[0]?.id, name: 'Small to large', number: 1, since: '2026-05-01', by: expect.any(String) },
    ]);
    const reduced = evaluateReduce(document).reducedResults;
    const smallResults = document.results
      .filter(({ facilityId }) => facilityId === small)
      .map((one) => one.id);
    const steps = reduced
      .filter(({ resultId }) => smallResults.includes(resultId))
      .map(({ steps: all }) => all.at(-1)?.step);
    expect(steps).toEqual(['facility-correlation', 'facility-correlation', 'facility-correlation']);
  });

  it('bring a result in that an adjustment fits, for the body shapes that it names', async () => {
    const fixed = { ground: 'fixed-floor' };
    const hatch = await enter('Hatch fixed', variants[0]!, large, 0.29, fixed);
    const van = await enter('Van fixed', variants[2]!, large, 0.34, fixed);
    const outOf = async () =>
      evaluateReduce(await inputs())
        .excludedResults.filter(({ resultId }) => [hatch.id, van.id].includes(resultId))
        .map(({ resultId }) => resultId)
        .sort();
    expect(await outOf()).toEqual([hatch.id, van.id].sort());
    const { id } = await aerodynamicist.ok(adjustmentCreate, {
      body: adjustmentFields({ bodyShapes: ['hatch', 'pickup'] }),
    });
    expect((await inputs()).adjustments).toEqual([
      expect.objectContaining({ id, item: 'ground', variantIds: [variants[0]] }),
    ]);
    expect(await outOf()).toEqual([van.id]);
  });

  it('are not told to another organisation', async () => {
    const stranger = await api.asMember('aerodynamicist', api.second);
    const query = { facilityId: small, referenceFacilityId: large };
    expect((await stranger.refused(candidatePairList, { query })).code).toBe('not-found');
  });
});
