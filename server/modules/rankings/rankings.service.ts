import type { RankingQuery } from '#shared/contracts/rankings';
import {
  choicesOfQuery,
  type EvidenceBasis,
  type RankingChoices,
} from '#shared/core/ranking/ranking-choices';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import {
  commonAreaOf,
  contextVariants,
  rankingInputs,
  standingAdoptions,
  type RankingRows,
} from './ranking-inputs';
import * as repository from './rankings.repository';
import { withoutRawEvidence } from './rankings.policy';

type Tx = MemberContext['tx'];

async function programmeRow(tx: Tx, programmeId: string): Promise<repository.ProgrammeRow> {
  return (await repository.findProgramme(tx, programmeId)) ?? fail('not-found');
}

async function rankingRows(tx: Tx, programmeId: string): Promise<RankingRows> {
  const programme = await programmeRow(tx, programmeId);
  const results = await repository.listResults(tx, programmeId);
  const facilityIds = new Set(results.map(({ facilityId }) => facilityId));
  if (programme.referenceFacilityId) facilityIds.add(programme.referenceFacilityId);
  return {
    programme,
    variants: await repository.listVariants(tx, programmeId),
    areas: await repository.newestAreas(tx, programmeId),
    configurations: await repository.listConfigurations(tx, programmeId),
    facilities: await repository.facilitiesById(tx, [...facilityIds]),
    results,
    points: await repository.listPoints(tx, programmeId),
    adoptions: await repository.currentAdoptions(tx, programmeId),
  };
}

/** @throws {ProblemError} unusable-input: without one area for all there is no coefficient to show */
function commonArea(rows: RankingRows): number {
  const areaM2 = commonAreaOf(rows);
  if (areaM2 !== null) return areaM2;
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
  { tx }: MemberContext,
  programmeId: string,
  evidence: EvidenceBasis,
): Promise<RankingInput> {
  const rows = await rankingRows(tx, programmeId);
  return rankingInputs(rows, commonArea(rows), evidence);
}

async function contextOf(
  tx: Tx,
  rows: RankingRows,
  cycles: RankingContext['cycles'],
): Promise<RankingContext> {
  const { programme } = rows;
  const sessionIds = new Set(rows.results.flatMap(({ testSessionId }) => testSessionId ?? []));
  return {
    programme: {
      id: programme.id,
      name: programme.name,
      commonArea: programme.commonArea ?? { kind: 'fixed', areaM2: commonArea(rows) },
      characteristicLengthName: programme.characteristicLengthName,
      milestones: await repository.listMilestones(tx, programme.id),
    },
    variants: contextVariants(rows),
    adoptions: standingAdoptions(rows.adoptions, rows.results),
    sessions: await repository.sessionsById(tx, [...sessionIds]),
    cycles,
  };
}

/** What the ranking screen needs beside the inputs, the traces of all cycles included. */
export async function readRankingContext(
  { tx }: MemberContext,
  programmeId: string,
): Promise<RankingContext> {
  const rows = await rankingRows(tx, programmeId);
  const keys = (await repository.listCycles(tx)).map(({ key }) => key);
  return contextOf(tx, rows, await repository.cycleTraces(tx, keys));
}

/** All cycles by name; only the chosen one brings its rows. */
async function offeredCycles(tx: Tx, chosen: string): Promise<RankingContext['cycles']> {
  const [trace] = await repository.cycleTraces(tx, [chosen]);
  const offered = await repository.listCycles(tx);
  return offered.map((cycle) => (cycle.key === trace?.key ? trace : { ...cycle, timeS: [], speedKmh: [] }));
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
  { tx }: MemberContext,
  programmeId: string,
  query: RankingQuery,
): Promise<RankingView> {
  const choices = choicesOf(query);
  const rows = await rankingRows(tx, programmeId);
  const inputs = rankingInputs(rows, commonArea(rows), 'newest');
  const context = await contextOf(tx, rows, await offeredCycles(tx, choices.cycle));
  return withoutRawEvidence(buildRankingView(inputs, context, choices));
}
