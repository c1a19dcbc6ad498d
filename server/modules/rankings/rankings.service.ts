import type { RankingQuery } from '#shared/contracts/rankings';
import { choicesOfQuery, type AreaChoice, type RankingChoices } from '#shared/core/ranking/ranking-choices';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { ConsideredEvidence } from '#shared/core/ranking/ranking-view-input';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import { dayOf } from '../../rules/clock';
import { adjustmentInputs } from '../adjustments';
import { correlationsInUse } from '../correlations';
import { currentVersions } from '../facilities';
import { policiesInForce } from '../policies';
import {
  commonAreaOf,
  contextCorrelations,
  contextVariants,
  rankingInputs,
  sessionsOf,
  type CommonArea,
  type ProgrammeRows,
  type RankingRows,
} from './ranking-inputs';
import { decisionsOf } from './ranking-decisions';
import * as repository from './rankings.repository';
import { withoutRawEvidence } from './rankings.policy';

/** The transaction to read in, and the moment: correlations are used from a date on. */
type Reading = Pick<MemberContext, 'tx' | 'now'>;

/** Facilities that the ranking reduces with: those of its results and that of the programme's sign-off. */
function facilityIdsOf({ programme, results }: Pick<ProgrammeRows, 'programme' | 'results'>): string[] {
  const ids = new Set(results.map(({ facilityId }) => facilityId));
  if (programme.referenceFacilityId) ids.add(programme.referenceFacilityId);
  return [...ids];
}

async function programmeRows({ tx, now }: Reading, programmeId: string): Promise<ProgrammeRows> {
  const programme = (await repository.findProgramme(tx, programmeId)) ?? fail('not-found');
  const results = await repository.listResults(tx, programmeId);
  const variants = await repository.listVariants(tx, programmeId);
  return {
    programme,
    variants,
    areas: await repository.newestAreas(tx, programmeId),
    configurations: await repository.listConfigurations(tx, programmeId),
    results,
    facilityVersions: await currentVersions(tx, facilityIdsOf({ programme, results })),
    adoptions: await repository.currentAdoptions(tx, programmeId),
    judgements: await repository.currentJudgements(tx, programmeId),
    policies: await policiesInForce(tx),
    adjustments: await adjustmentInputs(tx, variants),
    correlations: await correlationsInUse(tx, programme.referenceFacilityId, dayOf(now)),
  };
}

async function rankingRows(reading: Reading, programmeId: string): Promise<RankingRows> {
  const rows = await programmeRows(reading, programmeId);
  return {
    ...rows,
    facilities: await repository.facilitiesById(reading.tx, facilityIdsOf(rows)),
    points: await repository.listPoints(reading.tx, programmeId),
  };
}

/** @throws {ProblemError} unusable-input: without one area for all there is no coefficient to show */
function commonArea(rows: ProgrammeRows, asked: AreaChoice): CommonArea {
  const area = commonAreaOf(rows, asked);
  if (area) return area;
  if (rows.variants.length === 0) {
    fail('unusable-input', { reason: 'no-variants', detail: 'The programme has no variants to rank yet.' });
  }
  fail('unusable-input', {
    reason: 'no-common-area',
    where: 'commonArea',
    detail: 'Choose the common reference area of the programme: a fixed area, or that of one variant.',
  });
}

/** The inputs of the ranking, in the shape that the machine entry takes. */
export async function readRankingInputs(
  reading: Reading,
  programmeId: string,
  area: RankingQuery['area'],
  evidence: ConsideredEvidence,
): Promise<RankingInput> {
  const rows = await rankingRows(reading, programmeId);
  return rankingInputs(rows, commonArea(rows, choicesOf({ area }).area).areaM2, evidence);
}

/** All results of a programme, judged, and what was decided about them: what judgements and evaluations are made from. */
export interface EvidenceDocument {
  readonly inputs: RankingInput;
  readonly context: Pick<RankingContext, 'adoptions' | 'setAside' | 'included' | 'facilityVersions'>;
}

/**
 * Evidence stands without a common area: no drag area depends on one. Where none is chosen yet, the first variant's own
 * takes its place in the document.
 */
export async function readEvidenceDocument(reading: Reading, programmeId: string): Promise<EvidenceDocument> {
  const rows = await rankingRows(reading, programmeId);
  const areaM2 = commonAreaOf(rows, { kind: 'programme' })?.areaM2 ?? rows.areas[0]?.areaM2 ?? 1;
  return {
    inputs: rankingInputs(rows, areaM2, 'all'),
    context: { ...decisionsOf(rows), facilityVersions: rows.facilityVersions },
  };
}

/** What stands beside the inputs. The ranking itself needs no milestones: they are for the screen. */
function contextOf(
  rows: ProgrammeRows,
  area: CommonArea,
  cycles: RankingContext['cycles'],
  milestones: RankingContext['programme']['milestones'] = [],
): RankingContext {
  const { programme } = rows;
  return {
    programme: {
      id: programme.id,
      name: programme.name,
      commonArea: area.policy,
      characteristicLengthName: programme.characteristicLengthName,
      milestones,
    },
    variants: contextVariants(rows),
    ...decisionsOf(rows),
    policyNumber: rows.policies.number === 0 ? null : rows.policies.number,
    sessions: sessionsOf(rows.results),
    facilityVersions: rows.facilityVersions,
    correlations: contextCorrelations(rows),
    cycles,
  };
}

/** What the ranking screen needs beside the inputs, the traces of all cycles included. */
export async function readRankingContext(
  reading: Reading,
  programmeId: string,
  query: RankingQuery,
): Promise<RankingContext> {
  const { tx } = reading;
  const rows = await programmeRows(reading, programmeId);
  const area = commonArea(rows, choicesOf(query).area);
  const cycles = await repository.listCycles(tx, 'all');
  return contextOf(rows, area, cycles, await repository.listMilestones(tx, programmeId));
}

function choicesOf(query: RankingQuery): RankingChoices {
  const { choices, unreadable } = choicesOfQuery(query);
  const [first] = unreadable;
  if (first !== undefined) {
    fail('unusable-input', { where: first, detail: `“${query[first]}” is none of the choices of ${first}.` });
  }
  return choices;
}

/** The ranking as it is shown, computed here for those who may not hold the inputs. */
export async function readRankingView(
  reading: Reading,
  programmeId: string,
  query: RankingQuery,
): Promise<RankingView> {
  const { tx } = reading;
  const choices = choicesOf(query);
  const rows = await rankingRows(reading, programmeId);
  const area = commonArea(rows, choices.area);
  const inputs = rankingInputs(rows, area.areaM2, 'all');
  const context = contextOf(rows, area, await repository.listCycles(tx, choices.cycle));
  return withoutRawEvidence(buildRankingView(inputs, context, choices));
}
