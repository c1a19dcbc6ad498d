import { refuse } from '../refusal';
import { constantSpeedCycle, type CycleTrace } from './cycle';

/** A cycle as it is named or given: a built-in one, one constant speed, or rows of one's own. */
export type CycleInput =
  | string
  | {
      readonly constantSpeedKmh: number;
      readonly durationS: number;
      readonly timeS?: null | undefined;
      readonly speedKmh?: null | undefined;
    }
  | {
      readonly timeS: readonly number[];
      readonly speedKmh: readonly number[];
      readonly constantSpeedKmh?: null | undefined;
      readonly durationS?: null | undefined;
    };

/** Finds a built-in cycle by its name. The core holds none: whoever calls brings the collection. */
export type BuiltInCycles = (name: string) => CycleTrace | undefined;

/**
 * The rows that an input stands for.
 *
 * @throws {Refused} unknown-cycle, not-positive (constant speed or its duration)
 */
export function traceOf(input: CycleInput, builtIn: BuiltInCycles): CycleTrace {
  if (typeof input === 'string') {
    return builtIn(input) ?? refuse('unknown-cycle', 'cycle', `There is no built-in cycle “${input}”.`);
  }
  return input.constantSpeedKmh == null ? input : constantSpeedCycle(input.constantSpeedKmh, input.durationS);
}
