import { DEFAULT_LIMITS, DEFAULT_LIMITS_NUMBER } from '#shared/core/checks/limits';
import { pairOf } from './scenario/judged-input';
import { rankingInputOf } from './scenario/ranking-input';
import type { Scenario } from './scenario/scenario-types';
import type { SeedWriter } from './seed-writer';

const noon = (date: string): string => `${date}T11:00:00Z`;

/** What was judged in a scenario: limits, adjustments, correlations, judgements of results, plans. */
export async function loadJudgement(writer: SeedWriter, scenario: Scenario, by: string): Promise<void> {
  await loadPolicies(writer, scenario, by);
  await loadAdjustments(writer, scenario, by);
  await loadCorrelations(writer, scenario, by);
  await loadJudgements(writer, scenario, by);
  await loadPlans(writer, scenario, by);
}

async function loadPolicies(writer: SeedWriter, { policies }: Scenario, by: string): Promise<void> {
  let values: object = DEFAULT_LIMITS;
  for (const [index, { date, changes, comment }] of policies.entries()) {
    values = { ...values, ...changes };
    const number = DEFAULT_LIMITS_NUMBER + 1 + index;
    const id = writer.id('policies', String(number));
    await writer.insert('policy_versions', {
      id,
      number,
      values,
      comment,
      created_by: by,
      created_at: noon(date),
    });
    await writer.audit(noon(date), by, 'policies.changed', { kind: 'policies', id }, { ...changes, comment });
  }
}

async function loadAdjustments(writer: SeedWriter, { adjustments }: Scenario, by: string): Promise<void> {
  for (const [index, [key, fields]] of Object.entries(adjustments).entries()) {
    const id = writer.id('adjustment', key);
    const at = new Date(Date.parse(noon('2025-09-02')) + index * 60_000).toISOString();
    await writer.insert('adjustments', {
      id,
      name: fields.name,
      item: fields.item,
      from_value: jsonText(fields.fromValue),
      to_value: jsonText(fields.toValue),
      delta_drag_area_m2: fields.deltaDragAreaM2,
      u_m2: fields.uM2,
      per_unit_drag_area_m2: fields.perUnitDragAreaM2,
      u_per_unit_m2: fields.uPerUnitM2,
      degrees_of_freedom: fields.degreesOfFreedom,
      body_shapes: fields.bodyShapes,
      evidence: fields.evidence,
      created_by: by,
      created_at: at,
    });
    await writer.audit(at, by, 'adjustment.added', { kind: 'adjustment', id }, { name: fields.name });
  }
}

/** A column of JSON takes a text of its own only as JSON text. */
const jsonText = (value: unknown): string | undefined =>
  value === undefined ? undefined : JSON.stringify(value);

async function loadCorrelations(writer: SeedWriter, scenario: Scenario, by: string): Promise<void> {
  const input = rankingInputOf(scenario, 'newest');
  const variantOf = new Map(scenario.results.map(({ name, variant }) => [name, variant]));
  for (const [key, { name, facility, referenceFacility, versions }] of Object.entries(
    scenario.correlations,
  )) {
    const id = writer.id('correlation', key);
    const [first] = versions;
    if (first === undefined) continue;
    await writer.insert('correlations', {
      id,
      name,
      facility_id: writer.id('facility', facility),
      reference_facility_id: writer.id('facility', referenceFacility),
      created_by: by,
      created_at: noon(first.date),
    });
    await writer.audit(noon(first.date), by, 'correlation.added', { kind: 'correlation', id }, { name });
    for (const [index, { date, effectiveDate, pairs, comment }] of versions.entries()) {
      const versionId = writer.id('correlation version', key, String(index + 1));
      await writer.insert('correlation_versions', {
        id: versionId,
        correlation_id: id,
        number: index + 1,
        replaces: [],
        pairs: JSON.stringify(
          pairs.map((names) => {
            const { dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 } = pairOf(
              input,
              facility,
              referenceFacility,
              names,
            );
            const geometry = scenario.variants[variantOf.get(names[0]) ?? '']?.name;
            const resultId = writer.id('result', names[0]);
            const referenceResultId = writer.id('result', names[1]);
            return {
              geometry,
              resultId,
              referenceResultId,
              dragAreaM2,
              uM2,
              referenceDragAreaM2,
              referenceUM2,
            };
          }),
        ),
        comment,
        created_by: by,
        created_at: noon(date),
      });
      await writer.insert('correlation_adoptions', {
        id: writer.id('correlation adoption', key, String(index + 1)),
        correlation_id: id,
        version_id: versionId,
        effective_date: effectiveDate,
        comment,
        adopted_by: by,
        adopted_at: noon(date),
      });
    }
  }
}

async function loadJudgements(writer: SeedWriter, scenario: Scenario, by: string): Promise<void> {
  const tested = new Map(scenario.results.map(({ name, testDate }) => [name, testDate]));
  for (const { result, date, reynolds, includedReason, setAsideReason, comment } of scenario.judgements) {
    const resultId = writer.id('result', result);
    await writer.insert('result_judgements', {
      id: writer.id('judgement', result),
      result_id: resultId,
      reynolds:
        reynolds === undefined
          ? { kind: 'friction-line' }
          : { kind: 'sweep-of', resultId: writer.id('result', reynolds.sweepOf) },
      included_reason: includedReason,
      set_aside_reason: setAsideReason,
      comment,
      judged_by: by,
      judged_at: noon(date),
    });
    await writer.audit(
      noon(date),
      by,
      'result.judged',
      { kind: 'result', id: resultId },
      Object.fromEntries(
        Object.entries({ includedReason, setAsideReason, comment }).filter(([, said]) => said !== undefined),
      ),
    );
  }
  for (const result of scenario.checked) {
    await writer.insert('result_states', {
      id: writer.id('looked through', result),
      result_id: writer.id('result', result),
      state: 'checked',
      comment: 'Values, condition and checks looked through.',
      set_by: by,
      set_at: `${tested.get(result) ?? ''}T20:00:00Z`,
    });
  }
}

async function loadPlans(writer: SeedWriter, { plans }: Scenario, by: string): Promise<void> {
  for (const [key, { name, variant, facility, date, expected, inputs }] of Object.entries(plans)) {
    await writer.insert('test_plans', {
      id: writer.id('plan', key),
      programme_id: writer.id('programme'),
      variant_id: writer.id('variant', variant),
      facility_id: writer.id('facility', facility),
      name,
      inputs,
      expected_since: expected ? noon(date) : undefined,
      created_by: by,
      created_at: noon(date),
    });
  }
}
