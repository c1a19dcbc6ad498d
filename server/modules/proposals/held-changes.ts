import type { JudgementOrder } from '#shared/contracts/judgements';
import type { Programme, ProgrammeFields } from '#shared/contracts/programmes';
import type { JudgementChange } from '#shared/contracts/proposals';
import type { Result } from '#shared/contracts/results';
import { usualReynolds } from '#shared/core/ranking/judged-result';
import { changedFacility } from '#shared/core/ranking/judgement-changes';
import type { Work } from '../../http/context';
import { demandFound } from '../../rules/refusals';
import { changeFacility, fieldsOfFacility, findFacility } from '../facilities';
import { changePolicies, policiesInForce } from '../policies';
import { changeProgramme, findProgramme } from '../programmes';
import { adoptEvidence, findResults, judgeResults, standingAdoptions } from '../results';

type Change<Kind extends JudgementChange['kind']> = Extract<JudgementChange, { kind: Kind }>;
type ResultChange = Change<'set-aside' | 'bring-back' | 'include-not-comparable'>;

const isAboutResult = (change: JudgementChange): change is ResultChange => 'resultId' in change;

/** What is held of a result with the changes about it; everything else that was held stays. */
function judgementOrder(result: Result, changes: readonly ResultChange[]): JudgementOrder {
  const { judgement } = result;
  const start: JudgementOrder = {
    resultId: result.id,
    reynolds: judgement?.reynolds ?? usualReynolds(result),
    includedReason: judgement?.includedReason,
    setAsideReason: judgement?.setAsideReason,
    expectedJudgementId: judgement?.id,
  };
  return changes.reduce((order, change) => {
    switch (change.kind) {
      case 'set-aside':
        return { ...order, setAsideReason: change.reason };
      case 'bring-back':
        return { ...order, setAsideReason: undefined };
      case 'include-not-comparable':
        return { ...order, includedReason: change.reason };
    }
  }, start);
}

async function holdResults(
  work: Work,
  programmeId: string,
  changes: readonly ResultChange[],
  comment: string,
): Promise<void> {
  if (changes.length === 0) return;
  const results = await findResults(work.tx, programmeId, [...new Set(changes.map((each) => each.resultId))]);
  const orders = results.map((result) =>
    judgementOrder(
      result,
      changes.filter(({ resultId }) => resultId === result.id),
    ),
  );
  await judgeResults(work, programmeId, orders, comment);
}

async function holdEvidence(
  work: Work,
  programmeId: string,
  changes: readonly Change<'evidence'>[],
  comment: string,
): Promise<void> {
  if (changes.length === 0) return;
  // Setting a result aside may just have written another adoption: the one that stands now is taken over.
  const standing = await standingAdoptions(
    work.tx,
    changes.map(({ variantId }) => variantId),
  );
  const orders = changes.map(({ variantId, resultIds, rule }) => ({
    variantId,
    resultIds,
    rule,
    expectedAdoptionId: standing.get(variantId)?.id,
  }));
  await adoptEvidence(work, programmeId, orders, comment);
}

async function holdFacility(work: Work, change: Change<'facility'>, comment: string): Promise<void> {
  const before = demandFound(await findFacility(work.tx, change.facilityId));
  const fields = changedFacility(fieldsOfFacility(before), change);
  await changeFacility(work, before.id, { ...fields, comment }, before.version);
}

async function holdPolicies(work: Work, change: Change<'policies'>, comment: string): Promise<void> {
  const { number, values } = await policiesInForce(work.tx);
  await changePolicies(work, { expectedNumber: number, values: { ...values, ...change.values }, comment });
}

function fieldsOfProgramme(programme: Programme): ProgrammeFields {
  const { id: _id, version: _version, retiredAt: _retiredAt, ...fields } = programme;
  return fields;
}

async function holdFrictionLine(work: Work, programmeId: string, { frictionLine }: Change<'friction-line'>) {
  const programme = demandFound(await findProgramme(work.tx, programmeId));
  const fields = { ...fieldsOfProgramme(programme), frictionLine };
  await changeProgramme(work, programmeId, fields, programme.version);
}

/**
 * Lets changes hold by the services that do the same by hand. First what everything is reduced with, then what is held
 * of results, then what variants rest on: each adoption stores its evaluation of the programme as it then is.
 */
export async function holdChanges(
  work: Work,
  programmeId: string,
  changes: readonly JudgementChange[],
  comment: string,
): Promise<void> {
  const evidence: Change<'evidence'>[] = [];
  for (const change of changes) {
    if (change.kind === 'facility') await holdFacility(work, change, comment);
    if (change.kind === 'policies') await holdPolicies(work, change, comment);
    if (change.kind === 'friction-line') await holdFrictionLine(work, programmeId, change);
    if (change.kind === 'evidence') evidence.push(change);
  }
  await holdResults(work, programmeId, changes.filter(isAboutResult), comment);
  await holdEvidence(work, programmeId, evidence, comment);
}
