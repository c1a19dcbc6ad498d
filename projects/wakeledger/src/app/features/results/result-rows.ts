import type { Result, ResultState } from '#shared/contracts/results';
import type { CheckLimits } from '#shared/core/checks/limits';
import type { ReducedEvidence } from '../../data/results/reduced-evidence';
import type { CheckLanguage } from '../../ui/checks/check-figures';
import { QUANTITY_UNITS, QUANTITY_WORDS } from '../../ui/words/evidence-words';
import { checkOf, type ResultCheck } from './result-check';

/** One line of the list, values as numbers so that they sort and export as numbers. */
export interface ResultRow {
  readonly id: string;
  readonly name: string;
  readonly variant: string;
  readonly facility: string;
  readonly testDate: string;
  readonly quantity: string;
  /** At zero yaw, the mean of its readings, exactly in the unit in which it came. */
  readonly value: number | null;
  readonly unit: string;
  readonly angles: number;
  readonly speedKmh: number | null;
  readonly scale: number;
  readonly dragAreaM2: number | null;
  readonly expandedUM2: number | null;
  readonly check: ResultCheck;
  readonly state: ResultState;
  readonly session: string;
}

export interface ResultNames {
  variant(id: string): string;
  facility(id: string): string;
  /** Of a variant, for what is plausible. */
  bodyShape(id: string): string | undefined;
}

/** The results of a programme as rows, newest test first. */
export function resultRows(
  results: readonly Result[],
  evidence: ReducedEvidence,
  names: ResultNames,
  words: CheckLanguage,
  ground: { readonly unchecked: string | undefined; readonly limits: CheckLimits | undefined },
): readonly ResultRow[] {
  return results
    .map((result) => {
      const reduction = evidence.reductions.get(result.id);
      const refused = evidence.refused.get(result.id);
      const figure = result.withdrawn ? undefined : reduction?.output.zeroYaw;
      return {
        id: result.id,
        name: result.name,
        variant: names.variant(result.variantId),
        facility: names.facility(result.facilityId),
        testDate: result.testDate,
        quantity: QUANTITY_WORDS[result.quantity],
        value: zeroYawValue(result),
        unit: QUANTITY_UNITS[result.quantity],
        angles: new Set(result.points.map(({ yawDeg }) => yawDeg)).size,
        speedKmh: result.speedKmh ?? result.points[0]?.speedKmh ?? null,
        scale: result.scale,
        dragAreaM2: figure?.dragAreaM2 ?? null,
        expandedUM2: figure?.expandedUncertaintyM2 ?? null,
        check: checkOf(
          result,
          {
            context: evidence.context,
            reduction,
            refused,
            ...ground,
            bodyShape: names.bodyShape(result.variantId),
          },
          words,
        ),
        state: result.state,
        session: result.session ?? '',
      };
    })
    .sort((one, other) => (one.testDate < other.testDate ? 1 : one.testDate > other.testDate ? -1 : 0));
}

/** The reading at zero yaw; the mean where there are several. */
function zeroYawValue(result: Result): number | null {
  const values = result.points.filter(({ yawDeg }) => yawDeg === 0).map(({ value }) => value);
  if (values.length === 0) return null;
  return values.length === 1
    ? (values[0] ?? null)
    : values.reduce((sum, value) => sum + value, 0) / values.length;
}
