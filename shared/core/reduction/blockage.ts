import { DEFAULT_POLICIES } from '../constants';
import type { BlockageMethodInput, TunnelKind } from '../ranking/ranking-input';
import { refuse } from '../refusal';

/** A blockage correction at one drag area. */
export interface BlockageCorrection {
  /** C_D·A at model scale, corrected [m²]. */
  readonly modelDragAreaM2: number;
  /** d(corrected)/d(uncorrected), dimensionless: what every earlier amount is multiplied by. */
  readonly derivative: number;
}

export interface BlockageLimits {
  readonly blockageCaution: number;
  readonly blockageExcluded: number;
  readonly openJetLimit: number;
}

/**
 * β = s²·A_frontal/A_t, dimensionless, with the variant's frontal area at full scale [m²].
 *
 * @throws {Refused} model-larger-than-section (β ≥ 1)
 */
export function blockageRatio(scale: number, frontalAreaM2: number, sectionAreaM2: number): number {
  const ratio = (scale * scale * frontalAreaM2) / sectionAreaM2;
  if (!(ratio < 1)) {
    refuse(
      'model-larger-than-section',
      'facility.areaM2',
      `The model would fill ${ratio.toFixed(2)} of the section.`,
    );
  }
  return ratio;
}

/**
 * Closed and slotted sections: caution above 0.05, excluded above 0.10; open jets: excluded above 0.35 of the nozzle
 * (Regulation (EU) 2017/1151). The limits are policies.
 */
export function blockageVerdict(
  kind: TunnelKind,
  ratio: number,
  limits: BlockageLimits = DEFAULT_POLICIES,
): 'passes' | 'caution' | 'excluded' {
  if (kind === 'open-jet') return ratio > limits.openJetLimit ? 'excluded' : 'passes';
  if (ratio > limits.blockageExcluded) return 'excluded';
  return ratio > limits.blockageCaution ? 'caution' : 'passes';
}

function needed(value: number | null | undefined, where: string, words: string): number {
  return value ?? refuse('missing-input', where, words);
}

/** C_c = C_D/(1 + β/4)²: Barlow, Rae and Pope, area-ratio form. */
function areaRatio(x: number, ratio: number): BlockageCorrection {
  const factor = 1 / (1 + ratio / 4) ** 2;
  return { modelDragAreaM2: x * factor, derivative: factor };
}

/** C_c = C_D/(1 + θ·x/A_t): Maskell, ARC R&M 3400, for bluff bodies. */
function maskell(x: number, sectionAreaM2: number, theta: number): BlockageCorrection {
  const divisor = 1 + (theta * x) / sectionAreaM2;
  if (!(divisor > 0)) {
    refuse('not-positive', 'facility.blockage.theta', `θ = ${theta} would turn the drag's sign.`);
  }
  return { modelDragAreaM2: x / divisor, derivative: 1 / divisor ** 2 };
}

/** C_c = C_D/k, k = q_c/q from the facility's own calibration. */
function byFactor(x: number, factor: number): BlockageCorrection {
  if (!(factor > 0)) {
    refuse('not-positive', 'facility.blockage.factor', `k must be above 0, not ${factor}.`);
  }
  return { modelDragAreaM2: x / factor, derivative: 1 / factor };
}

/**
 * Corrects an uncorrected drag area at model scale [m²] in a section of an area [m²] at a blockage ratio.
 *
 * @throws {Refused} unknown-method, missing-input (theta, factor), not-positive (factor)
 */
export function correctForBlockage(
  blockage: BlockageMethodInput,
  modelDragAreaM2: number,
  ratio: number,
  sectionAreaM2: number,
): BlockageCorrection {
  const where = 'facility.blockage';
  switch (blockage.method) {
    case 'none':
      return { modelDragAreaM2, derivative: 1 };
    case 'area-ratio':
      return areaRatio(modelDragAreaM2, ratio);
    case 'maskell': {
      const theta = needed(blockage.theta, `${where}.theta`, 'Maskell’s θ is typed for the facility.');
      return maskell(modelDragAreaM2, sectionAreaM2, theta);
    }
    case 'factor': {
      const factor = needed(blockage.factor, `${where}.factor`, 'The facility’s calibration k is missing.');
      return byFactor(modelDragAreaM2, factor);
    }
    default:
      return refuse('unknown-method', `${where}.method`, `There is no blockage method “${blockage.method}”.`);
  }
}

/**
 * The amount of a blockage correction at full scale [m²]: the typed fraction of the correction, signed; for `none` the
 * typed fraction of the drag area.
 */
export function blockageAmount(
  blockage: BlockageMethodInput,
  uncorrectedM2: number,
  correctedM2: number,
): number {
  if (blockage.method === 'none') return (blockage.uRelative ?? 0) * correctedM2;
  return (blockage.uFractionOfCorrection ?? 0) * (correctedM2 - uncorrectedM2);
}

/** What the frontal area's uncertainty does through β [m²]: −CdA·s²·u(A)/(2·A_t·(1 + β/4)) for area-ratio, else none. */
export function frontalAreaThroughBlockage(
  blockage: BlockageMethodInput,
  dragAreaM2: number,
  scale: number,
  frontalAreaUM2: number,
  ratio: number,
  sectionAreaM2: number,
): number {
  if (blockage.method !== 'area-ratio') return 0;
  return (-dragAreaM2 * scale * scale * frontalAreaUM2) / (2 * sectionAreaM2 * (1 + ratio / 4));
}
