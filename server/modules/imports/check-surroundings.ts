import type { Facility } from '#shared/contracts/facilities';
import type { Programme } from '#shared/contracts/programmes';
import type { Variant } from '#shared/contracts/variants';
import type { CheckSurroundings } from '#shared/core/checks/checks-of';
import { policiesInputOf, type CheckLimits } from '#shared/core/checks/limits';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { reductionContextOf } from '#shared/core/reduction/reduction-context';
import { Refused } from '#shared/core/refusal';
import type { Work } from '../../http/context';
import { dayOf, latestPastDay } from '../../rules/clock';
import { demandFound } from '../../rules/refusals';
import { adjustmentInputs } from '../adjustments';
import { correlationsInUse } from '../correlations';
import { listFacilities } from '../facilities';
import { policiesInForce } from '../policies';
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
  const policies = await policiesInForce(work.tx);
  const correlations = await correlationsInUse(
    work.tx,
    programme.referenceFacilityId ?? null,
    dayOf(work.now),
  );
  return {
    variants,
    facilities,
    context: {
      latestPastDay: latestPastDay(work.now),
      variantOf: variantLookup(variants, record.mapping.variants),
      facilityOf: facilityLookup(facilities, record.mapping.facilities),
      isNameTaken: (name) => taken.has(nameKey(name)),
      checks: checkSurroundings(programme, policies, {
        facilities,
        adjustments: await adjustmentInputs(work.tx, variants),
        correlations: correlations.map(({ input }) => input),
      }),
    },
  };
}

/** The common area has no part in the reduction of one result; any stands in for it where none is chosen yet. */
const ANY_AREA_M2 = 1;

/** The programme's reference with the limits in force; undefined where it cannot be used as it stands. */
function checkSurroundings(
  programme: Programme,
  policies: { readonly number: number; readonly values: CheckLimits },
  document: Pick<RankingInput, 'facilities' | 'adjustments' | 'correlations'>,
): CheckSurroundings | undefined {
  const { referenceSpeedKmh, referenceAir, referenceCondition, characteristicLengthM, windSpeedMs } =
    programme;
  try {
    const context = reductionContextOf({
      ...document,
      programme: {
        referenceSpeedKmh,
        referenceAir,
        referenceCondition,
        characteristicLengthM,
        windSpeedMs,
        referenceFacilityId: programme.referenceFacilityId,
        commonAreaM2: ANY_AREA_M2,
        policies: policiesInputOf(policies.values, policies.number, programme.frictionLine ?? 'on'),
      },
      variants: [],
      results: [],
    });
    return { context, limits: policies.values };
  } catch (error) {
    if (error instanceof Refused) return undefined;
    throw error;
  }
}
