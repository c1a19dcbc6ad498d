import { skinFriction } from '#shared/core/similarity/skin-friction';
import type { SweepPoint } from '#shared/core/similarity/reynolds-sweep';
import { reynoldsWords } from '../../../ui/checks/check-figures';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';
import type { SweepView } from './sweep-view';

/** One thing that a sweep says; a shape of its own stands beside each ink. */
export interface SweepVerdictWords {
  readonly words: string;
  readonly shape: string;
  readonly ink: string;
}

export interface SweepFact {
  readonly label: string;
  readonly words: string;
}

/** Measured less fitted [m²]. */
export function offTheFit({ outcome }: SweepView, { reynolds, dragAreaM2 }: SweepPoint): number {
  return dragAreaM2 - (outcome.interceptM2 + outcome.slopeM2 * skinFriction(reynolds));
}

const good = (words: string): SweepVerdictWords => ({ words, shape: '●', ink: 'wl-moss' });
const warn = (words: string): SweepVerdictWords => ({ words, shape: '▲', ink: 'wl-ochre' });

function transitionWords({ outcome, minimumReynolds, points }: SweepView, format: QuantityFormat) {
  const minimum = reynoldsWords(minimumReynolds, format);
  if (outcome.clearsTransitionCaution) {
    return good(
      $localize`It reaches above the minimum of ${minimum}:MINIMUM: and is flat: the caution about transition is resolved for results that use it.`,
    );
  }
  const reaches = Math.max(...points.map(({ reynolds }) => reynolds)) > minimumReynolds;
  return warn(
    reaches
      ? $localize`It reaches above the minimum of ${minimum}:MINIMUM: but is not flat: the caution about transition stands.`
      : $localize`It lies wholly below the minimum of ${minimum}:MINIMUM:: the caution about transition stands. Only points above the minimum can resolve it.`,
  );
}

/** What the sweep says, in sentences that need no formula. */
export function sweepVerdicts(view: SweepView, format: QuantityFormat): readonly SweepVerdictWords[] {
  const { outcome, toleranceM2 } = view;
  const tolerance = format.text(toleranceM2, 'drag-area');
  const lowest = reynoldsWords(outcome.lowestReynoldsWithinTolerance, format);
  return [
    outcome.flatWithinTolerance
      ? good(
          $localize`Flat: at every point the drag area is within ${tolerance}:TOLERANCE: of that at the reference.`,
        )
      : warn(
          $localize`Not flat: some points differ by more than ${tolerance}:TOLERANCE: from the reference.`,
        ),
    transitionWords(view, format),
    good(
      outcome.lowestReynoldsIsSweepStart
        ? $localize`A test may be as low as Re ${lowest}:LOWEST:, where this sweep begins, and stay within the tolerance.`
        : $localize`A test may be as low as Re ${lowest}:LOWEST: and stay within the tolerance.`,
    ),
  ];
}

/** The fit in figures: C_D·A = a + k·c_f(Re). */
export function sweepFacts({ outcome }: SweepView, format: QuantityFormat): readonly SweepFact[] {
  const area = (value: number, digits = 4) => format.text(value, 'drag-area', { digits });
  return [
    {
      label: $localize`Fit`,
      words: $localize`C_D·A = a + k·c_f(Re), least squares, ${String(outcome.degreesOfFreedom)}:NU: degrees of freedom`,
    },
    {
      label: $localize`a and its standard error`,
      words: `${area(outcome.interceptM2)}; ${area(outcome.interceptStandardErrorM2)}`,
    },
    {
      label: $localize`k and its standard error`,
      words: `${area(outcome.slopeM2, 2)}; ${area(outcome.slopeStandardErrorM2, 2)}`,
    },
    { label: $localize`Scatter of one point, s`, words: area(outcome.residualStandardDeviationM2) },
    {
      label: $localize`At the reference`,
      words: format.text(outcome.predictionAtReferenceM2, 'drag-area', {
        digits: 4,
        expandedU: outcome.predictionExpandedUncertaintyM2,
      }),
    },
  ];
}
