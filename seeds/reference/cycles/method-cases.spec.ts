import { evaluateCycleEnergy, type CycleEnergyInput } from '#shared/core/road-load/cycle-energy-operation';
import { evaluatePowertrain, type PowertrainInput } from '#shared/core/road-load/powertrain-operation';
import { type Refused } from '#shared/core/refusal';
import { cycleEnergyInputSchema } from '#shared/contracts/method/cycle-energy';
import { powertrainInputSchema } from '#shared/contracts/method/powertrain';
import { builtInCycle } from './built-in-cycles';
import fixture from './testing/energy-and-powertrain-cases.json';

/** The state that the cases of `powertrain` name; the air itself has cases of its own. */
const UN_GTR_15_DENSITY = 1.189;

interface Tolerance {
  readonly relative?: number;
  readonly absolute?: number;
}
interface Case {
  readonly id: string;
  readonly operation: string;
  readonly about: string;
  readonly input: object;
  readonly expected: object;
  readonly tolerance?: Tolerance & { readonly fields?: Readonly<Record<string, Tolerance>> };
}

const cases: readonly Case[] = fixture.cases;
const isRefused = ({ expected }: Case): boolean => 'refusal' in expected;

function evaluate({ operation, input }: Case): object {
  if (operation === 'cycle-energy') {
    return evaluateCycleEnergy(cycleEnergyInputSchema.parse(input) as CycleEnergyInput, builtInCycle);
  }
  const parsed = powertrainInputSchema.parse(input);
  const given: PowertrainInput = { ...parsed, airDensityKgM3: UN_GTR_15_DENSITY };
  return evaluatePowertrain(given, builtInCycle);
}

/** Fields of both sides are the same, and every number lies within max(relative·|expected|, absolute). */
function expectWithin(
  found: unknown,
  expected: unknown,
  tolerance: Tolerance,
  fields: Case['tolerance'],
  at: string,
): void {
  if (typeof expected === 'number') {
    const allowed = Math.max((tolerance.relative ?? 0) * Math.abs(expected), tolerance.absolute ?? 1e-14);
    expect({ at, off: Math.abs(Number(found) - expected) <= allowed ? 0 : found }).toEqual({ at, off: 0 });
    return;
  }
  const [left, right] = [found as Record<string, unknown>, expected as Record<string, unknown>];
  expect(Object.keys(left).sort()).toEqual(Object.keys(right).sort());
  for (const [name, value] of Object.entries(right)) {
    expectWithin(left[name], value, fields?.fields?.[name] ?? tolerance, fields, `${at}.${name}`);
  }
}

test.each(cases.filter((one) => !isRefused(one)).map((one) => [one.id, one.about, one] as const))(
  'Case %s: %s',
  (_id, _about, one) => {
    const { relative, absolute } = { ...fixture.defaultTolerance, ...one.tolerance };
    expectWithin(evaluate(one), one.expected, { relative, absolute }, one.tolerance, one.id);
  },
);

test('Case refuse-cycle-time: time stands still', () => {
  const one = cases.find(({ id }) => id === 'refuse-cycle-time') as Case;
  expect(() => evaluate(one)).toThrow(
    expect.objectContaining({ code: 'cycle-time-not-increasing', where: 'cycle row 3' }) as Refused,
  );
});

test('Case refuse-unknown-field: a misspelt field is not passed over', () => {
  const one = cases.find(({ id }) => id === 'refuse-unknown-field') as Case;
  const { error } = cycleEnergyInputSchema.safeParse(one.input);
  expect(error?.issues).toMatchObject([{ code: 'unrecognized_keys', keys: ['rotatingfactor'] }]);
});

test('An unknown cycle is refused by name', () => {
  const input = { cycle: 'wltc', f0N: 1, f1NPerKmh: 0, f2NPerKmh2: 0, massKg: 1000 };
  expect(() => evaluateCycleEnergy(input, builtInCycle)).toThrow(
    expect.objectContaining({ code: 'unknown-cycle', where: 'cycle' }) as Refused,
  );
});
