import type { EvaluationDifference } from '#shared/core/ranking/evaluation-difference';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { replayOf, type Evaluate, type StoredEvaluation } from '../../modules/evaluations';

/** What of a database connection is used. */
export interface Queries {
  query<Row>(text: string, values: readonly unknown[]): Promise<{ rows: Row[] }>;
}

/** A stored evaluation that comes to something else now, or is refused. */
export interface ReplayOutcome {
  readonly evaluationId: string;
  readonly organisation: string;
  readonly programme: string;
  readonly variant: string;
  /** Names of the results that were adopted. */
  readonly results: readonly string[];
  readonly storedAt: string;
  readonly differences: readonly EvaluationDifference[];
  readonly refusal?: string;
}

export interface ReplaySummary {
  readonly evaluations: number;
  readonly same: number;
  /** Those that differ or are refused. */
  readonly moved: number;
}

type Row = Omit<StoredEvaluation, 'inputsHash'> & {
  readonly id: string;
  readonly organisation_id: string;
  readonly organisation: string;
  readonly programme: string;
  readonly variant: string;
  readonly inputs_hash: string;
  readonly stored_at: Date;
};

/** How many are held at once: what is stored may be more than fits into memory. */
const PAGE = 200;
const NOWHERE = '00000000-0000-0000-0000-000000000000';

const STATEMENT = `
  select e.id, e.organisation_id, o.name as organisation, p.name as programme, v.name as variant, e.inputs, e.inputs_hash,
    e.methods, e.parameters, e.output, e.created_at as stored_at
  from evaluations e
  join organisations o on o.id = e.organisation_id
  join programmes p on p.organisation_id = e.organisation_id and p.id = e.programme_id
  join variants v on v.organisation_id = e.organisation_id and v.id = e.variant_id
  where (e.organisation_id, e.id) > ($1::uuid, $2::uuid)
  order by e.organisation_id, e.id limit $3`;

function resultNames(inputs: string): readonly string[] {
  const { results } = JSON.parse(inputs) as RankingInput;
  return results.map(({ id, name }) => name ?? id);
}

function outcomeOf(row: Row, evaluate: Evaluate | undefined): ReplayOutcome {
  const { id, organisation, programme, variant, inputs, stored_at } = row;
  const replay = replayOf({ ...row, inputsHash: row.inputs_hash }, evaluate);
  return {
    evaluationId: id,
    organisation,
    programme,
    variant,
    results: resultNames(inputs),
    storedAt: stored_at.toISOString(),
    ...replay,
  };
}

/**
 * Computes every stored evaluation of every organisation again, as the maintenance login, page by page; `report` hears of those
 * that are not what they were.
 */
export async function replayEvaluations(
  client: Queries,
  report: (outcome: ReplayOutcome) => void,
  evaluate?: Evaluate,
): Promise<ReplaySummary> {
  let [evaluations, moved] = [0, 0];
  let last = [NOWHERE, NOWHERE];
  for (;;) {
    const { rows } = await client.query<Row>(STATEMENT, [...last, PAGE]);
    for (const row of rows) {
      evaluations += 1;
      const outcome = outcomeOf(row, evaluate);
      if (outcome.differences.length === 0 && outcome.refusal === undefined) continue;
      moved += 1;
      report(outcome);
    }
    const end = rows.at(-1);
    if (end === undefined || rows.length < PAGE) return { evaluations, same: evaluations - moved, moved };
    last = [end.organisation_id, end.id];
  }
}
