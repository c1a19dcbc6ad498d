import type { JudgementChange, ProposalGround } from '#shared/contracts/proposals';
import { frictionLineOf } from './proposals.policy';
import type { Work } from '../../http/context';
import { demandFound } from '../../rules/refusals';
import { findFacility } from '../facilities';
import { policiesInForce } from '../policies';
import { findProgramme } from '../programmes';
import { findResults, standingAdoptions } from '../results';
import { findVariant } from '../variants';

/** What holds of a change's subject, and which results that the change names no longer count for anything. */
export interface Ground {
  readonly holds: ProposalGround;
  readonly withdrawn: readonly string[];
}

async function groundOfOne(work: Work, programmeId: string, change: JudgementChange): Promise<Ground> {
  const { tx } = work;
  switch (change.kind) {
    case 'set-aside':
    case 'bring-back':
    case 'include-not-comparable': {
      const [result] = await findResults(tx, programmeId, [change.resultId]);
      const { id: resultId, name, judgement, withdrawn } = demandFound(result);
      return {
        holds: {
          kind: 'result',
          resultId,
          name,
          ...(judgement === undefined ? {} : { judgementId: judgement.id }),
        },
        withdrawn: withdrawn === undefined ? [] : [name],
      };
    }
    case 'evidence': {
      const { variantId } = change;
      const { name } = demandFound(await findVariant(tx, programmeId, variantId));
      const standing = (await standingAdoptions(tx, [variantId])).get(variantId);
      const named = await findResults(tx, programmeId, change.resultIds);
      return {
        holds: {
          kind: 'evidence',
          variantId,
          name,
          resultIds: [...(standing?.resultIds ?? [])],
          rule: standing?.rule ?? 'newest',
          ...(standing === undefined ? {} : { adoptionId: standing.id }),
        },
        withdrawn: named.filter(({ withdrawn }) => withdrawn !== undefined).map((result) => result.name),
      };
    }
    case 'facility': {
      const facility = demandFound(await findFacility(tx, change.facilityId));
      const { id: facilityId, name, versionNumber: number } = facility;
      const { blockage, biasURelative, sessionURelative } = facility;
      return {
        holds: { kind: 'facility', facilityId, name, number, blockage, biasURelative, sessionURelative },
        withdrawn: [],
      };
    }
    case 'policies': {
      return { holds: { kind: 'policies', ...(await policiesInForce(tx)) }, withdrawn: [] };
    }
    case 'friction-line': {
      const programme = demandFound(await findProgramme(tx, programmeId));
      return {
        holds: { kind: 'friction-line', frictionLine: frictionLineOf(programme) },
        withdrawn: [],
      };
    }
  }
}

/** What holds now of the subject of each change, in their order. @throws {ProblemError} not-found */
export async function groundOf(
  work: Work,
  programmeId: string,
  changes: readonly JudgementChange[],
): Promise<readonly Ground[]> {
  const ground: Ground[] = [];
  for (const change of changes) ground.push(await groundOfOne(work, programmeId, change));
  return ground;
}
