import type { Facility } from '#shared/contracts/facilities';
import type { Programme } from '#shared/contracts/programmes';
import type { Variant } from '#shared/contracts/variants';
import { reductionContextOf } from '#shared/core/reduction/reduction-context';
import type { ReductionContext } from '#shared/core/reduction/reduction';
import { Refused } from '#shared/core/refusal';
import type { Work } from '../../http/context';
import { latestPastDay } from '../../rules/clock';
import { demandFound } from '../../rules/refusals';
import { listFacilities } from '../facilities';
import { findProgramme } from '../programmes';
import { listVariants } from '../variants';
import type { CheckContext } from './checking/check-context';
import { nameKey } from './checking/check-context';
import { facilityLookup, variantLookup } from './checking/known-names';
import type { ImportRecord } from './imports.repository';
import { takenResultNames } from './result-names.repository';

export interface Surroundings {
  readonly variants: readonly Variant[];
  readonly facilities: readonly Facility[];
  readonly context: CheckContext;
}

/** What the rows of an import are checked against, as it stands in this transaction. */
export async function surroundingsOf(work: Work, record: ImportRecord): Promise<Surroundings> {
  const programme = demandFound(await findProgramme(work.tx, record.programmeId));
  const variants = await listVariants(work.tx, record.programmeId);
  const facilities = await listFacilities(work.tx);
  const taken = new Set((await takenResultNames(work.tx, record.programmeId)).map(nameKey));
  return {
    variants,
    facilities,
    context: {
      latestPastDay: latestPastDay(work.now),
      variantOf: variantLookup(variants, record.mapping.variants),
      facilityOf: facilityLookup(facilities, record.mapping.facilities),
      isNameTaken: (name) => taken.has(nameKey(name)),
      reduction: referenceOf(programme),
    },
  };
}

/** The common area has no part in the reduction of one result; any stands in for it where none is chosen yet. */
const ANY_AREA_M2 = 1;

function referenceOf(programme: Programme): ReductionContext | undefined {
  const { referenceSpeedKmh, referenceAir, referenceCondition, characteristicLengthM, windSpeedMs } =
    programme;
  try {
    return reductionContextOf({
      programme: {
        referenceSpeedKmh,
        referenceAir,
        referenceCondition,
        characteristicLengthM,
        windSpeedMs,
        commonAreaM2: ANY_AREA_M2,
        policies: { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 },
      },
      facilities: [],
      variants: [],
      results: [],
    });
  } catch (error) {
    if (error instanceof Refused) return undefined;
    throw error;
  }
}
