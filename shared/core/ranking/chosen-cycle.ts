import { constantSpeedCycle } from '../cycles/cycle';
import type { ContextCycle } from './ranking-context';

const CONSTANT_PREFIX = 'constant:';
const PLAIN_NUMBER = /^\d{1,3}(\.\d{1,3})?$/;
/** Fastest constant speed that is offered [km/h]: above any road car. */
export const LARGEST_CONSTANT_SPEED_KMH = 500;
/** Its energy is shown per kilometre, which does not depend on how long it lasts. */
const DURATION_S = 3600;

/** How a constant speed [km/h] stands in an address, in place of a cycle's key. */
export function constantCycleKey(speedKmh: number): string {
  return `${CONSTANT_PREFIX}${speedKmh}`;
}

/** The constant speed [km/h] that a key stands for; null where it stands for another cycle or none. */
export function constantSpeedOf(key: string): number | null {
  if (!key.startsWith(CONSTANT_PREFIX)) return null;
  const text = key.slice(CONSTANT_PREFIX.length);
  const speedKmh = PLAIN_NUMBER.test(text) ? Number(text) : 0;
  return speedKmh > 0 && speedKmh <= LARGEST_CONSTANT_SPEED_KMH ? speedKmh : null;
}

/** The cycle of a choice, a constant speed included; else the first there is. */
export function chosenCycle(cycles: readonly ContextCycle[], key: string): ContextCycle | undefined {
  const speedKmh = constantSpeedOf(key);
  if (speedKmh !== null) {
    const { timeS, speedKmh: speeds } = constantSpeedCycle(speedKmh, DURATION_S);
    return {
      key,
      name: `constant ${speedKmh} km/h`,
      source: 'does not start from rest',
      timeS: Array.from(timeS),
      speedKmh: Array.from(speeds),
    };
  }
  return cycles.find((cycle) => cycle.key === key) ?? cycles.find(({ timeS }) => timeS.length > 0);
}
