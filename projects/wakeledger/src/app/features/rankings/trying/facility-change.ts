import type { JudgementChange } from '#shared/contracts/proposals';
import type { BlockageMethodInput, FacilityInput } from '#shared/core/ranking/ranking-input';
import type { BlockageMethodName } from '../../../ui/words/evidence-words';
import { typedValue, type TypedValue } from './typed-value';

/** Corrections as they are typed: uncertainties in per cent. */
export interface TypedCorrections {
  readonly method: BlockageMethodName;
  /** θ or the factor, for the methods that have one. */
  readonly amount: string;
  readonly bias: string;
  readonly session: string;
}

type FacilityChange = Extract<JudgementChange, { kind: 'facility' }>;

const PERCENT = { minimum: 0, maximum: 100 };
/** θ and q_c/q are of the order of one. */
const FACTOR = { minimum: 0.01, maximum: 20 };
/** Below the last digit that can be typed. */
const SAME = 1e-9;

function fractionTyped(text: string, held: number | null | undefined): TypedValue | 'unchanged' {
  const typed = typedValue(text, PERCENT);
  if (typed === 'nothing') return held == null ? 'unchanged' : 'unusable';
  if (typed === 'unusable') return typed;
  return held != null && Math.abs(typed / 100 - held) < SAME ? 'unchanged' : typed / 100;
}

type Blockage = NonNullable<FacilityChange['blockage']>;

function blockageTyped(
  held: BlockageMethodInput | null | undefined,
  { method, amount }: TypedCorrections,
): Blockage | 'unchanged' | 'unusable' {
  if (!held) return 'unchanged';
  // The uncertainty of a correction that stays one is kept; without a correction there is nothing to take it of.
  const u = method === 'none' ? {} : { uFractionOfCorrection: held.uFractionOfCorrection ?? undefined };
  const kept = method === 'none' && held.uRelative != null ? { uRelative: held.uRelative } : u;
  if (method === 'none' || method === 'area-ratio') {
    return held.method === method ? 'unchanged' : { method, ...kept };
  }
  const value = typedValue(amount, FACTOR);
  if (typeof value !== 'number') return 'unusable';
  const before = method === 'maskell' ? held.theta : held.factor;
  if (held.method === method && before != null && Math.abs(before - value) < SAME) return 'unchanged';
  return method === 'maskell' ? { method, theta: value, ...kept } : { method, factor: value, ...kept };
}

/** What is typed against what holds: the change, or that there is none, or that it cannot be used. */
export function facilityChange(
  facility: FacilityInput,
  typed: TypedCorrections,
): FacilityChange | 'unchanged' | 'unusable' {
  const blockage = blockageTyped(facility.blockage, typed);
  const bias = fractionTyped(typed.bias, facility.biasURelative);
  const session = fractionTyped(typed.session, facility.sessionURelative);
  if (blockage === 'unusable' || bias === 'unusable' || session === 'unusable') return 'unusable';
  const change: FacilityChange = {
    kind: 'facility',
    facilityId: facility.id,
    ...(blockage === 'unchanged' ? {} : { blockage }),
    ...(typeof bias === 'number' ? { biasURelative: bias } : {}),
    ...(typeof session === 'number' ? { sessionURelative: session } : {}),
  };
  return Object.keys(change).length === 2 ? 'unchanged' : change;
}
