import type { RankingInput, ResultInput } from '#shared/core/ranking/ranking-input';
import { adjustmentsOf, judgedResults, policiesOf, withJudgement } from './judged-input';
import type { Scenario, ScenarioAdoption } from './scenario-types';

/**
 * The scenario as the method takes it, with the scenario's own keys as ids: what a ranking of the seeded programme must
 * come to, computed without a database. `adopted` gives variants with an adoption their adopted results alone.
 */
export function rankingInputOf(
  scenario: Scenario,
  evidence: 'adopted' | 'newest',
  request: RankingInput['request'] = {},
): RankingInput {
  const { commonAreaOf, referenceFacility, milestones: _milestones, ...programme } = scenario.programme;
  const area = scenario.variants[commonAreaOf]?.frontalAreas[0]?.areaM2;
  if (area === undefined) throw new Error(`${commonAreaOf} has no frontal area`);
  const withdrawn = new Set(scenario.withdrawals.map(({ result }) => result));
  const standing = scenario.results
    .map((result, index) => ({ result, entrySequence: index + 1 }))
    .filter(({ result }) => !withdrawn.has(result.name));
  const adopted = standingAdoptions(scenario);
  const all = standing.map(({ result, entrySequence }): ResultInput => {
    const { variant, facility, session, installation, model, source: _source, ...raw } = result;
    const { remark: _remark, attachmentId: _attachmentId, ...rest } = raw;
    return {
      ...rest,
      id: result.name,
      variantId: variant,
      facilityId: facility,
      sessionId: session === undefined ? undefined : `${facility}: ${session}`,
      installationId: installation,
      modelId: model,
      entrySequence,
    };
  });
  const judged = judgedResults(all, scenario);
  const results = judged.filter(({ id, variantId }) => {
    const own = adopted.get(variantId);
    return evidence === 'newest' || own === undefined || own.results.includes(id);
  });
  const input: RankingInput = {
    programme: {
      name: programme.name,
      referenceSpeedKmh: programme.referenceSpeedKmh,
      referenceAir: programme.referenceAir,
      referenceCondition: programme.referenceCondition,
      characteristicLengthM: programme.characteristicLengthM,
      commonAreaM2: area,
      confidence: programme.confidence,
      referenceFacilityId: referenceFacility,
      windSpeedMs: programme.windSpeedMs,
      policies: policiesOf(scenario),
    },
    facilities: Object.entries(scenario.facilities).map(([id, fields]) => {
      const { usualCondition: _usual, remark: _remark, checkBody: _body, ...facility } = fields;
      return { ...facility, id };
    }),
    adjustments: adjustmentsOf(scenario),
    models: [...new Set(all.flatMap(({ modelId }) => modelId ?? []))].map((id) => ({ id })),
    variants: Object.entries(scenario.variants).map(([id, { frontalAreas, configurations }]) => ({
      id,
      frontalAreaM2: frontalAreas[0]?.areaM2 ?? 0,
      frontalAreaUM2: frontalAreas[0]?.uM2,
      massKg: configurations[0]?.massKg,
      rollingResistance: configurations[0]?.rollingResistance,
      roadLoadReference: configurations[0]?.roadLoadReference,
      evidence: (evidence === 'adopted' ? adopted.get(id)?.rule : undefined) ?? 'newest',
    })),
    results,
    request,
  };
  return withJudgement(input, { ...input, results: judged }, scenario);
}

/** The last adoption of each variant. */
function standingAdoptions({ adoptions, results }: Scenario): ReadonlyMap<string, ScenarioAdoption> {
  const variantOf = new Map(results.map((result) => [result.name, result.variant]));
  return new Map(adoptions.map((adoption) => [variantOf.get(adoption.results[0]) ?? '', adoption]));
}
