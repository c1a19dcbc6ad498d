import { createHash } from 'node:crypto';
import { canonicalText } from '#shared/core/canonical-text';
import { evaluateEvidence, type EvidenceEvaluation } from '#shared/core/ranking/evaluation';
import {
  evaluationDifferences,
  roundedNumbers,
  type EvaluationDifference,
} from '#shared/core/ranking/evaluation-difference';
import { evidenceInputOf, type EvidenceChoice } from '#shared/core/ranking/evaluation-input';
import type { EvaluationOutput, EvaluationParameters } from '#shared/core/ranking/evaluation-output';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { Refused } from '#shared/core/refusal';

/** An evaluation as it is stored. */
export interface StoredEvaluation {
  /** Canonical JSON of the inputs. */
  readonly inputs: string;
  /** SHA-256 of it, hexadecimal. */
  readonly inputsHash: string;
  readonly methods: readonly string[];
  readonly parameters: EvaluationParameters;
  readonly output: EvaluationOutput;
}

/** Everything that decides an evaluation and does not stand in its inputs: which versions they were. */
function parametersOf(
  input: RankingInput,
  context: Pick<RankingContext, 'facilityVersions'>,
): EvaluationParameters {
  const facilityIds = new Set(input.facilities.map(({ id }) => id));
  return {
    policyId: input.programme.policies?.policyId ?? null,
    frictionLine: input.programme.policies?.frictionLine ?? null,
    facilityVersions: context.facilityVersions.filter(({ facilityId }) => facilityIds.has(facilityId)),
    correlationIds: (input.correlations ?? []).map(({ id }) => id),
    adjustmentIds: (input.adjustments ?? []).map(({ id }) => id),
  };
}

export function hashOf(inputs: string): string {
  return createHash('sha256').update(inputs, 'utf8').digest('hex');
}

/** Evaluates stored text: what is computed is what is kept, in the order in which it is kept. */
function evaluated(inputs: string, evaluate: Evaluate): EvidenceEvaluation {
  return evaluate(JSON.parse(inputs) as RankingInput);
}

export type Evaluate = (input: RankingInput) => EvidenceEvaluation;

/** The evidence of one variant, evaluated for keeping. @throws {Refused} what refuses the whole ranking */
export function recordOf(
  input: RankingInput,
  context: Pick<RankingContext, 'facilityVersions'>,
  choice: EvidenceChoice,
): StoredEvaluation {
  const own = evidenceInputOf(input, choice);
  const inputs = canonicalText(own);
  const { output, methods } = evaluated(inputs, evaluateEvidence);
  return {
    inputs,
    inputsHash: hashOf(inputs),
    methods,
    parameters: parametersOf(own, context),
    output: roundedNumbers(output),
  };
}

/** What a stored evaluation comes to now, beside what is kept of it. */
export interface Replay {
  /** Empty: the same, to 1e-12. */
  readonly differences: readonly EvaluationDifference[];
  /** The code of the refusal, where the method refuses these inputs now. */
  readonly refusal?: string;
}

/** Computes a stored evaluation again; inputs that were touched since, or other methods, are differences too. */
export function replayOf(
  stored: Pick<StoredEvaluation, 'inputs' | 'inputsHash' | 'methods' | 'output'>,
  evaluate: Evaluate = evaluateEvidence,
): Replay {
  const hash = hashOf(stored.inputs);
  const touched = evaluationDifferences({ inputsHash: stored.inputsHash }, { inputsHash: hash });
  try {
    const now = evaluated(stored.inputs, evaluate);
    return {
      differences: [
        ...touched,
        ...evaluationDifferences({ methods: stored.methods }, { methods: now.methods }),
        ...evaluationDifferences(stored.output, now.output),
      ],
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { differences: touched, refusal: error.code };
  }
}
