import type { Operation } from './operation';

/** Loaded one at a time: a call pays for what it asks. */
const AVAILABLE = {
  air: async () => (await import('./operations/air')).air,
  blockage: async () => (await import('./operations/blockage')).blockage,
  yaw: async () => (await import('./operations/yaw')).yaw,
  'reynolds-sweep': async () => (await import('./operations/reynolds-sweep')).reynoldsSweep,
  'friction-line': async () => (await import('./operations/friction-line')).frictionLine,
  correlation: async () => (await import('./operations/correlation')).correlation,
  budget: async () => (await import('./operations/budget')).budget,
  rank: async () => (await import('./operations/rank')).rank,
  reduce: async () => (await import('./operations/reduce')).reduce,
  'cycle-energy': async () => (await import('./operations/cycle-energy')).cycleEnergy,
  powertrain: async () => (await import('./operations/powertrain')).powertrain,
  combine: async () => (await import('./operations/combine')).combine,
  plan: async () => (await import('./operations/plan')).plan,
  'student-quantile': async () => (await import('./operations/student-quantile')).studentQuantile,
} as const satisfies { readonly [name: string]: () => Promise<Operation> };

export type OperationName = keyof typeof AVAILABLE;

/** Operations of later sections, with the section of the method that holds them. */
export const NOT_YET_AVAILABLE: { readonly [name: string]: number } = {
  statement: 11,
};

export const OPERATION_NAMES = Object.keys(AVAILABLE) as readonly OperationName[];

export function isOperationName(name: string): name is OperationName {
  return Object.hasOwn(AVAILABLE, name);
}

export function loadOperation(name: OperationName): Promise<Operation> {
  return AVAILABLE[name]();
}
