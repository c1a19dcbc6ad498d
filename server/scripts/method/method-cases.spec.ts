import { run } from './run';
import { differences, type CaseTolerance } from './testing/compare';
import independent from './testing/independent-cases.json';
import fixture from './testing/method-cases.json';

/** A worked case: computed apart from this code, in another language, to 12 digits. */
interface MethodCase {
  readonly id: string;
  readonly operation: string;
  readonly about: string;
  readonly input: object;
  readonly expected: { readonly [field: string]: unknown };
  readonly expectedBeyondTheOperation?: readonly string[];
  readonly tolerance?: CaseTolerance | null;
}

const cases = [...fixture.cases, ...independent.cases] as unknown as readonly MethodCase[];
const refusedCode = ({ expected }: MethodCase): string | undefined =>
  (expected['refusal'] as { readonly code: string } | undefined)?.code;
const titled = (list: readonly MethodCase[]) => list.map((one) => [one.id, one.about, one] as const);

describe('The worked cases of the machine entry', () => {
  test.each(titled(cases.filter((one) => refusedCode(one) === undefined)))(
    '%s: %s',
    async (_id, _about, one) => {
      const answer = await run([one.operation], () => JSON.stringify(one.input));
      const beyond = new Set(one.expectedBeyondTheOperation ?? []);
      const expected = Object.fromEntries(
        Object.entries(one.expected).filter(([field]) => !beyond.has(field)),
      );
      const { fields, ...tolerance } = { ...fixture.defaultTolerance, ...one.tolerance } as CaseTolerance;
      expect(answer.stderr).toBe('');
      expect(differences(JSON.parse(answer.stdout), expected, tolerance, fields)).toEqual([]);
    },
  );

  test.each(titled(cases.filter((one) => refusedCode(one) !== undefined)))(
    '%s is refused: %s',
    async (_id, _about, one) => {
      const answer = await run([one.operation], () => JSON.stringify(one.input));
      expect(answer).toMatchObject({ stdout: '', exitCode: 2 });
      expect(JSON.parse(answer.stderr)).toMatchObject({ code: refusedCode(one) });
    },
  );
});
