import { CELSIUS_ZERO_K, KMH_PER_MS } from '../constants';
import { correctForBlockage } from '../reduction/blockage';
import { measuredDragArea, pointFlow } from '../reduction/measured-value';
import type {
  ReducedPoint,
  Reduction,
  ReductionContext,
  ResultParts,
  ReynoldsStep,
} from '../reduction/reduction';
import { needed } from '../reduction/result-parts';
import { fullScaleDragArea } from '../reduction/scale';
import type { PointInput, ResultInput } from '../ranking/ranking-input';
import { isZeroYaw } from '../reduction/yaw/yaw-points';
import { stepOf, type DerivationStep } from './derivation';
import { inValues, joined, plain } from './in-values';
import { limitsUsed } from './policy-words';
import { REDUCTION_METHODS as METHODS } from './reduction-methods';
import { referenceSteps, type StepsToFigure } from './reference-steps';

/** The cautions that belong to one step, in words. */
function cautionIf(condition: boolean, words: string): string[] {
  return condition ? [words] : [];
}

/** None where the result states no air, which only a correlation for Reynolds allows. */
function airSteps({ result, air }: ResultParts): DerivationStep[] {
  if (air === null) return [];
  const { state, temperatureC, pressurePa, relativeHumidity } = result.air ?? {};
  const named = state != null && state !== 'custom';
  const density = named
    ? stepOf(METHODS.referenceAir, {
        values: inValues`${state}: T = ${air.temperatureK} K`,
        value: air.densityKgM3,
        unit: 'kg/m³',
        assumed: [`the source used the state ${state}`],
      })
    : stepOf(METHODS.moistAir, {
        values: inValues`t = ${temperatureC} °C, p = ${pressurePa} Pa, h = ${relativeHumidity}`,
        value: air.densityKgM3,
        unit: 'kg/m³',
        assumed: ['400 µmol/mol CO₂'],
        cautions: cautionIf(
          air.notes.includes('outside-cipm-2007-range'),
          'outside the range of CIPM-2007, 15 to 27 °C and 600 to 1100 hPa',
        ),
      });
  const viscosity = stepOf(METHODS.viscosity, {
    values: inValues`T = ${air.temperatureK} K (${air.temperatureK - CELSIUS_ZERO_K} °C), ρ = ${air.densityKgM3} kg/m³`,
    value: air.kinematicViscosityM2S,
    unit: 'm²/s',
  });
  return [density, viscosity];
}

function tareStep(point: PointInput, result: ResultInput, netForceN: number): DerivationStep[] {
  if (result.quantity !== 'force' || result.tareAlreadySubtracted !== false) return [];
  return [
    stepOf(METHODS.tare, {
      values: inValues`${point.value} N − ${point.tareN ?? result.tareN} N`,
      value: netForceN,
      unit: 'N',
    }),
  ];
}

function pressureStep(parts: ResultParts, point: PointInput): DerivationStep[] {
  if (parts.result.quantity !== 'force') return [];
  const flow = pointFlow(point, parts);
  const method = flow.dynamicPressureMeasured ? METHODS.measuredDynamicPressure : METHODS.dynamicPressure;
  const values = flow.dynamicPressureMeasured
    ? inValues`q = ${flow.dynamicPressurePa} Pa`
    : inValues`½ × ${parts.air?.densityKgM3} kg/m³ × (${flow.speedMs} m/s)²`;
  return [stepOf(method, { values, value: needed(flow.dynamicPressurePa, 'dynamicPressurePa'), unit: 'Pa' })];
}

function modelStep(parts: ResultParts, point: PointInput): DerivationStep {
  const { result, scale, air } = parts;
  const flow = pointFlow(point, parts);
  const measured = measuredDragArea(point, parts, flow);
  const outcome = { value: measured.modelDragAreaM2, unit: 'm²' };
  switch (result.quantity) {
    case 'force':
      return stepOf(METHODS.forceToDragArea, {
        ...outcome,
        values: inValues`${measured.netForceN} N / ${flow.dynamicPressurePa} Pa`,
        assumed: result.tareAlreadySubtracted === true ? ['the tare was subtracted by the source'] : [],
      });
    case 'coefficient':
      return stepOf(METHODS.coefficientToDragArea, {
        ...outcome,
        values: inValues`${point.value} × ${result.quotedAreaM2} m²${result.quotedAreaScale === 'full' ? inValues` × ${scale}²` : null}`,
      });
    case 'coastdown-f2':
      return stepOf(METHODS.coastdown, {
        ...outcome,
        values: inValues`2 × 3.6² × ${point.value} N/(km/h)² / ${air?.densityKgM3} kg/m³`,
        assumed: ['all of f2 is aerodynamic drag'],
      });
    default:
      return stepOf(METHODS.statedDragArea, { ...outcome, values: inValues`${point.value} m² × ${scale}²` });
  }
}

const BLOCKAGE_METHODS = {
  none: METHODS.blockageNone,
  'area-ratio': METHODS.blockageAreaRatio,
  maskell: METHODS.blockageMaskell,
  factor: METHODS.blockageFactor,
} as const;

/** The blockage step from the drag area of the step before; none outside tunnels or where the source has corrected. */
function blockageSteps(
  parts: ResultParts,
  modelDragAreaM2: number,
  cautions: readonly string[],
): DerivationStep[] {
  const { facility, tunnel, result } = parts;
  const { blockage } = facility;
  if (tunnel === null || blockage == null || result.blockageAlreadyCorrectedBy != null) return [];
  if (parts.replaced.blockage) return [];
  const method = Object.entries(BLOCKAGE_METHODS).find(([name]) => name === blockage.method)?.[1];
  if (method === undefined) return [];
  const { blockageRatio, areaM2 } = tunnel;
  const typed = [
    ...(blockage.method === 'maskell' ? [inValues`θ = ${blockage.theta}`] : []),
    ...(blockage.method === 'factor' ? [inValues`k = ${blockage.factor}`] : []),
  ];
  return [
    stepOf(method, {
      values: joined(
        [inValues`x = ${modelDragAreaM2} m², β = ${blockageRatio}, A_t = ${areaM2} m²`, ...typed],
        ', ',
      ),
      value: correctForBlockage(blockage, modelDragAreaM2, blockageRatio, areaM2).modelDragAreaM2,
      unit: 'm²',
      cautions,
    }),
  ];
}

function fullScaleStep(reduction: Reduction, correctedM2: number): DerivationStep {
  const { parts, zeroYawPoints } = reduction;
  const { scale, result, model } = parts;
  const others = zeroYawPoints.length - 1;
  return stepOf(METHODS.fullScale, {
    values: inValues`${correctedM2} m² / ${scale}²`,
    value: fullScaleDragArea(correctedM2, scale),
    unit: 'm²',
    assumed: [
      ...(result.blockageAlreadyCorrectedBy == null
        ? []
        : [`blockage was already corrected by ${result.blockageAlreadyCorrectedBy}`]),
      ...(model === null || model.scaleU != null ? [] : ['the model is exactly to scale']),
      ...(reduction.reynolds.kind === 'own-sweep'
        ? [
            `shown for the first point of the sweep; the other ${others} are reduced alike, each at its own speed`,
          ]
        : []),
    ],
    cautions: conditionCautions(reduction),
  });
}

/** What it means that no step brings the drag area to the reference Reynolds number. */
function uncorrectedReynolds(step: ReynoldsStep): string[] {
  if (step.kind === 'none') {
    return ['the drag area is that at the reference Reynolds number: no correction between them'];
  }
  if (step.kind !== 'friction-line' || step.applied) return [];
  const omitted = plain(2 * step.move.reynoldsShapeAmountM2);
  return [
    `the friction line is off: the correction that it would make, ${omitted} m², counts as uncertainty`,
  ];
}

/** Why a result stays out, or counts nevertheless, where its condition is not the reference and nothing adjusts for it. */
function conditionCautions({ condition }: Reduction): string[] {
  const { notComparable, includedReason } = condition;
  if (notComparable.length === 0) return [];
  return [
    `not comparable: ${notComparable.join(', ')} differ from the reference condition`,
    ...(includedReason === null ? [] : [`included with a written reason: “${includedReason}”`]),
  ];
}

function flowStep(reduction: Reduction, context: ReductionContext): DerivationStep[] {
  const { parts, output, zeroYawPoints } = reduction;
  const speedMs = zeroYawPoints[0]?.flow.speedMs ?? null;
  const reynolds = zeroYawPoints[0]?.reynolds ?? null;
  const { air } = parts;
  if (speedMs === null || air === null || reynolds === null) return [];
  const { characteristicLengthM } = context.programme;
  return [
    stepOf(METHODS.flow, {
      values: joined(
        [
          inValues`U = ${speedMs} m/s (${speedMs * KMH_PER_MS} km/h), L = ${characteristicLengthM} m`,
          inValues`s = ${parts.scale}, ν_k = ${air.kinematicViscosityM2S} m²/s`,
          inValues`M = ${output.mach} (highest), Re_ref = ${context.referenceReynolds}`,
        ],
        ', ',
      ),
      value: reynolds,
      unit: '',
      assumed: [
        ...uncorrectedReynolds(reduction.reynolds),
        ...limitsUsed(context.programme.policies?.policyId),
      ],
      cautions: [
        ...cautionIf(
          output.cautions.includes('mach'),
          'compressibility: the Mach number is above the caution limit',
        ),
        ...cautionIf(output.cautions.includes('transition'), 'transition may sit in the wrong place'),
        ...cautionIf(output.excludedBy.includes('mach'), 'excluded: the Mach number is above its limit'),
      ],
    }),
  ];
}

function meanStep(points: readonly ReducedPoint[]): DerivationStep[] {
  if (points.length < 2) return [];
  return [
    stepOf(METHODS.zeroYawMean, {
      values: inValues`(${joined(
        points.map(({ dragAreaM2 }) => [dragAreaM2]),
        ' + ',
      )}) m² / ${points.length}`,
      value: points.reduce((sum, point) => sum + point.dragAreaM2, 0) / points.length,
      unit: 'm²',
    }),
  ];
}

/** The steps from the first zero-yaw reading to the zero-yaw figure at the reference, each from the value of the one before. */
export function zeroYawSteps(reduction: Reduction, context: ReductionContext): StepsToFigure {
  const { parts, zeroYawPoints, output } = reduction;
  const point = (parts.result.points ?? []).find((one) => isZeroYaw(one.yawDeg ?? 0)) ?? {};
  const model = modelStep(parts, point);
  const blockage = blockageSteps(parts, model.value, [
    ...cautionIf(output.cautions.includes('blockage'), 'the blockage ratio is above the caution limit'),
    ...cautionIf(output.excludedBy.includes('blockage'), 'excluded: the blockage ratio is above its limit'),
  ]);
  const fullScale = fullScaleStep(reduction, (blockage.at(-1) ?? model).value);
  const mean = reduction.reynolds.kind === 'own-sweep' ? [] : meanStep(zeroYawPoints);
  const reference = referenceSteps(reduction, context, (mean.at(-1) ?? fullScale).value);
  const steps = [
    ...airSteps(parts),
    ...tareStep(point, parts.result, zeroYawPoints[0]?.netForceN ?? NaN),
    ...pressureStep(parts, point),
    ...flowStep(reduction, context),
    model,
    ...blockage,
    fullScale,
    ...mean,
    ...reference.steps,
  ];
  return { steps, dragAreaM2: reference.dragAreaM2 };
}
