import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pickEvidence } from '../ranking/evidence';
import type { Basis } from '../ranking/ranking-input';
import { reduceResults } from '../reduction/reduce';
import { aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { figureOf } from '../uncertainty/budget';
import { COMBINATION_METHODS } from './combination-methods';
import { methodChain, type Derivation } from './derivation';
import { nameOf, type Method } from './method';
import { traceOfCombination } from './trace-of-combination';

const sweep = (value: number) => [0, 5, 10].map((yawDeg) => ({ yawDeg, value: value * (1 + yawDeg / 100) }));

function traced(
  values: readonly number[],
  basis: Basis,
): { trace: Derivation; dragAreaM2: number; u: number } {
  const input = aRanking({
    variants: [aVariant('a', { evidence: 'weighted-mean' })],
    results: values.map((value, i) =>
      aResult(`r${i}`, 'a', { name: `Run ${i}`, sessionId: `s${i}`, points: sweep(value) }),
    ),
  });
  const reduced = reduceResults(input);
  const evidence = pickEvidence(input.variants, reduced, basis).chosen[0]!;
  const names = new Map([['a', 'Estate']]);
  const trace = traceOfCombination('a', reduced.reductions, reduced.context, basis, names);
  const { dragAreaM2, standardUncertaintyM2: u } = figureOf(evidence.figure);
  return { trace, dragAreaM2, u };
}

const stepNamed = (trace: Derivation, id: string) => trace.steps.find(({ methodId }) => methodId === id);

describe('The derivation of a weighted mean', () => {
  it.each(['zero-yaw', 'wind-averaged'] as const)('comes to the figure that is ranked, %s', (basis) => {
    const { trace, dragAreaM2, u } = traced([0.28, 0.281, 0.2795], basis);
    expect(trace.value).toBe(dragAreaM2);
    expect(stepNamed(trace, 'weighted-mean')?.value).toBe(dragAreaM2);
    expect(trace.standardUncertainty).toBe(u);
    expect(trace.budget.reduce((sum, { shareOfVariance }) => sum + shareOfVariance, 0)).toBeCloseTo(1, 12);
  });

  it('begins with the steps of each result, under its name', () => {
    const { trace } = traced([0.28, 0.281], 'zero-yaw');
    const titles = trace.steps.map(({ title }) => title);
    expect(titles.filter((title) => title.startsWith('Run 0: ')).length).toBeGreaterThan(3);
    expect(titles.filter((title) => title.startsWith('Run 0: ')).length).toBe(
      titles.filter((title) => title.startsWith('Run 1: ')).length,
    );
    expect(trace.title).toBe('Drag area C_D·A of Estate, weighted mean of 2 results, zero yaw');
  });

  it('ends with the mean, the agreement, the mean beside it and one budget', () => {
    const { trace } = traced([0.28, 0.281], 'zero-yaw');
    expect(methodChain(trace).slice(-4)).toEqual([
      'weighted-mean@1',
      'birge-ratio@1',
      'random-effects-mean@1',
      'uncertainty-budget@1',
    ]);
    expect(methodChain(trace).filter((name) => name === 'uncertainty-budget@1')).toHaveLength(1);
  });

  it('cautions where the results scatter more than their own uncertainties say, and only there', () => {
    expect(stepNamed(traced([0.26, 0.3], 'zero-yaw').trace, 'birge-ratio')?.cautions).toHaveLength(1);
    expect(stepNamed(traced([0.28, 0.2801], 'zero-yaw').trace, 'birge-ratio')?.cautions).toEqual([]);
  });

  it('says nothing of agreement where there is one result', () => {
    const { trace } = traced([0.28], 'zero-yaw');
    expect(stepNamed(trace, 'birge-ratio')).toBeUndefined();
    expect(trace.title).toContain('weighted mean of 1 result,');
  });
});

describe('Every method of combination', () => {
  const page = readFileSync(join(__dirname, '..', 'METHODS.md'), 'utf8');
  const methods: readonly Method[] = Object.values(COMBINATION_METHODS);

  it.each(methods.map((method) => [nameOf(method), method] as const))(
    '%s stands in METHODS.md with formula, source and validity',
    (name, { formulaText, source, validity }) => {
      const [, after = ''] = page.split(`### ${name}\n`);
      const [part = ''] = after.split('\n### ');
      for (const words of [formulaText, source, validity]) expect(part).toContain(words);
    },
  );

  it.each(methods.map((method) => [nameOf(method), method] as const))(
    '%s has a formula whose every element is closed',
    (_name, { formulaMathml }) => {
      const open: string[] = [];
      for (const [, end, element = ''] of formulaMathml.matchAll(/<(\/?)([a-z]+)>/g)) {
        if (end === '/') expect(open.pop()).toBe(element);
        else open.push(element);
      }
      expect(open).toEqual([]);
    },
  );
});
