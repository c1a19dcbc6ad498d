import type * as z from 'zod';
import {
  CORRELATION_REPLACES,
  type candidatePairList,
  type CandidatePair,
  type CorrelationReplaces,
} from '#shared/contracts/correlations';
import { candidatePairs, type PairRequest } from '#shared/core/correlation/candidate-pairs';
import { Refused } from '#shared/core/refusal';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import { knownFacilityIds } from '../facilities';
import { readEvidenceDocument } from '../rankings';
import { programmesWithBoth } from './correlation-pairs.repository';

type Query = z.output<(typeof candidatePairList)['query']>;
type Answer = z.output<(typeof candidatePairList)['response']>;

const stepsOf = (words: string | undefined): readonly CorrelationReplaces[] =>
  CORRELATION_REPLACES.filter((step) => words?.split(',').includes(step));

/** Pairs from every programme of the organisation, as each of them reduces its own results. */
export async function listCandidatePairs(
  work: MemberContext,
  { facilityId, referenceFacilityId, replaces }: Query,
): Promise<Answer> {
  const known = await knownFacilityIds(work.tx, [facilityId, referenceFacilityId]);
  if (!known.has(facilityId) || !known.has(referenceFacilityId)) fail('not-found');
  const request = { facilityId, referenceFacilityId, replaces: stepsOf(replaces) };
  const answers: Answer[] = [];
  for (const programme of await programmesWithBoth(work.tx, [facilityId, referenceFacilityId])) {
    answers.push(await pairsOf(work, programme, request));
  }
  return {
    pairs: answers.flatMap(({ pairs }) => pairs),
    refused: answers.flatMap(({ refused }) => refused),
  };
}

async function pairsOf(
  work: MemberContext,
  programme: { readonly id: string; readonly name: string },
  request: PairRequest,
): Promise<Answer> {
  const { inputs, context } = await readEvidenceDocument(work, programme.id);
  const setAside = new Set(context.setAside.map(({ resultId }) => resultId));
  const results = new Map(
    inputs.results.filter(({ id }) => !setAside.has(id)).map((result) => [result.id, result]),
  );
  const variants = new Map(inputs.variants.map(({ id, name }) => [id, name ?? id]));
  const nameOf = (id: string): string => results.get(id)?.name ?? id;
  const dateOf = (id: string): string => results.get(id)?.testDate ?? '';
  try {
    const { pairs, refused } = candidatePairs({ ...inputs, results: [...results.values()] }, request);
    return {
      pairs: pairs.map((pair): CandidatePair => ({
        programmeId: programme.id,
        programmeName: programme.name,
        ...pair,
        geometry: variants.get(pair.variantId) ?? pair.variantId,
        resultName: nameOf(pair.resultId),
        testDate: dateOf(pair.resultId),
        referenceResultName: nameOf(pair.referenceResultId),
        referenceTestDate: dateOf(pair.referenceResultId),
        cautions: [...pair.cautions],
        excludedBy: [...pair.excludedBy],
      })),
      refused: refused.map(({ resultId, detail }) => ({
        programmeName: programme.name,
        resultName: nameOf(resultId),
        detail,
      })),
    };
  } catch (error) {
    // One programme whose own reference is unusable leaves the others.
    if (!(error instanceof Refused)) throw error;
    return {
      pairs: [],
      refused: [{ programmeName: programme.name, resultName: programme.name, detail: error.detail }],
    };
  }
}
