import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { constantSpeedCycle, prepareCycle } from '../cycles/cycle';
import type { RankingInput, ResultInput } from '../ranking/ranking-input';
import { evaluateRank } from '../ranking/rank';
import { reduceResults } from '../reduction/reduce';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { derivationAsText, methodChain } from './derivation';
import { COMPARISON_METHODS, ENERGY_METHODS } from './energy-methods';
import { keyLabel } from './key-labels';
import { nameOf, type Method } from './method';
import { REDUCTION_METHODS } from './reduction-methods';
import { REFERENCE_METHODS } from './reference-methods';
import { traceOfEnergy } from './trace-of-energy';
import { onCommonArea, traceOfFigure } from './trace-of-figure';

const yawed = [
  { yawDeg: -8, value: 0.32, n: 3 },
  { yawDeg: -4, value: 0.29, s: 0.0004, n: 3 },
  { yawDeg: 0, value: 0.28, s: 0.0005, n: 5 },
  { yawDeg: 4, value: 0.291, s: 0.0004, n: 3 },
  { yawDeg: 8, value: 0.322, n: 3 },
];
const force: Partial<ResultInput> = { quantity: 'force', tareAlreadySubtracted: false, tareN: 6 };

const results: readonly ResultInput[] = [
  aResult('coefficient', 'a', { points: yawed }),
  aResult('model', 'a', { facilityId: 'model-tunnel', scale: 0.4, modelId: 'm' }),
  aResult('force', 'a', { ...force, points: [{ value: 540, s: 1, n: 4 }] }),
  aResult('force-q', 'a', {
    ...force,
    speedKmh: null,
    dynamicPressurePa: 880,
    points: [{ value: 540, n: 4 }],
  }),
  aResult('repeats', 'a', {
    points: [
      { value: 0.28, n: 3 },
      { value: 0.282, n: 2 },
    ],
  }),
  aResult('corrected', 'a', { facilityId: 'jet', blockageAlreadyCorrectedBy: 'the facility' }),
  aResult('jet', 'a', { facilityId: 'jet' }),
  aResult('drag-area', 'a', { facilityId: 'solver', quantity: 'drag-area', points: [{ value: 0.63 }] }),
  aResult('coastdown', 'a', {
    facilityId: 'track',
    quantity: 'coastdown-f2',
    air: { state: 'un-gtr-15' },
    points: [{ value: 0.0285, s: 0.0001, n: 5 }],
    stated: { expandedU: 0.0007, k: 2 },
  }),
];

const input: RankingInput = aRanking({
  facilities: [
    aFacility('tunnel', { name: 'Full-size tunnel' }),
    aFacility('model-tunnel', { areaM2: 8.2, blockage: { method: 'maskell', theta: 1.2 } }),
    aFacility('jet', { kind: 'open-jet', areaM2: 24, blockage: { method: 'factor', factor: 1.011 } }),
    aFacility('solver', { kind: 'simulation' }),
    aFacility('track', { kind: 'road' }),
  ],
  models: [{ id: 'm', scaleU: 0.0004 }],
  variants: [aVariant('a', { name: 'Hatch' })],
  results,
});
const reduced = reduceResults(input);

describe('A derivation', () => {
  it.each(results.map(({ id }) => id))('of %s ends in the very figure of the ranking', (id) => {
    const output = reduced.reductions.find((one) => one.output.resultId === id)?.output;
    const trace = traceOfFigure(input, id, 'zero-yaw');
    expect(trace.value).toBe(output?.zeroYaw.dragAreaM2);
    expect(trace.standardUncertainty).toBe(output?.zeroYaw.standardUncertaintyM2);
    expect(trace.expandedUncertainty).toBe(output?.zeroYaw.expandedUncertaintyM2);
    expect(trace.budget.reduce((sum, share) => sum + share.shareOfVariance, 0)).toBeCloseTo(1, 12);
  });

  it('of a wind average ends in that of the ranking, and is refused where there is none', () => {
    const output = reduced.reductions[0]?.output;
    const trace = traceOfFigure(input, 'coefficient', 'wind-averaged');
    expect(trace.value).toBe(output?.windAveragedDragAreaM2);
    expect(trace.standardUncertainty).toBe(output?.windAveragedStandardUncertaintyM2);
    expect(() => traceOfFigure(input, 'force', 'wind-averaged')).toThrow('yaw-too-few-angles');
  });

  it('lists the steps that apply, in order, and no others', () => {
    expect(methodChain(traceOfFigure(input, 'force', 'zero-yaw'))).toEqual([
      'moist-air@1',
      'sutherland-viscosity@1',
      'tare@1',
      'dynamic-pressure@1',
      'flow-similarity@1',
      'force-to-drag-area@1',
      'blockage-area-ratio@1',
      'full-scale-drag-area@1',
      'uncertainty-budget@1',
    ]);
    expect(methodChain(traceOfFigure(input, 'force-q', 'zero-yaw'))).toContain('measured-dynamic-pressure@1');
    expect(methodChain(traceOfFigure(input, 'repeats', 'zero-yaw'))).toContain('zero-yaw-mean@1');
    expect(methodChain(traceOfFigure(input, 'model', 'zero-yaw'))).toContain('blockage-maskell@1');
    expect(methodChain(traceOfFigure(input, 'jet', 'zero-yaw'))).toContain('blockage-factor@1');
    expect(methodChain(traceOfFigure(input, 'coastdown', 'zero-yaw')).slice(0, 1)).toEqual([
      'reference-air@1',
    ]);
  });

  it('says who has corrected already, instead of a step', () => {
    const trace = traceOfFigure(input, 'corrected', 'zero-yaw');
    expect(methodChain(trace).filter((name) => name.startsWith('blockage'))).toEqual([]);
    expect(trace.steps.flatMap((step) => step.assumed)).toContain(
      'blockage was already corrected by the facility',
    );
  });

  it('goes on to the coefficient on the common area', () => {
    const output = evaluateRank({ ...input, results: [results[0] as ResultInput] }, () => undefined);
    const trace = onCommonArea(traceOfFigure(input, 'coefficient', 'zero-yaw'), 2.24);
    expect(trace.value).toBe(output.ranking[0]?.coefficientOnCommonArea);
  });

  it('of an energy ends in that of the ranking', () => {
    const request = { cycle: { constantSpeedKmh: 110, durationS: 900 } };
    const one = { ...input, results: [results[0] as ResultInput], request };
    const [energy] = evaluateRank(one, () => undefined).energy ?? [];
    const [reduction] = reduceResults(one).reductions;
    const variant = input.variants[0] as (typeof input.variants)[number];
    const zeroYaw = reduction?.zeroYaw ?? { dragAreaM2: NaN, budget: [] };
    const cycle = prepareCycle(constantSpeedCycle(110, 900));
    const trace = traceOfEnergy({ variant, zeroYaw }, { cycle, airDensityKgM3: 1.225 });
    expect(trace.value).toBe(energy?.wheelEnergyJ);
    expect(trace.standardUncertainty).toBe(energy?.standardUncertaintyJ);
    expect(methodChain(trace)[0]).toBe('road-load-built-up@1');
    expect(trace.steps[2]?.value).toBe(energy?.exchangeRateJPerM2);
  });

  it('can be copied as text, with formulas in symbols and in values, sources and the budget', () => {
    const text = derivationAsText(traceOfFigure(input, 'coefficient', 'wind-averaged'));
    expect(text).toContain('x = C_D·A_q');
    expect(text).toContain('0.28 × 2.24 m²');
    expect(text).toContain('SAE J1252 (memory)');
    expect(text).toContain('Bias of the facility: Full-size tunnel');
    expect(text).not.toContain('NaN');
    expect(text).not.toContain('undefined');
  });

  it('names what a key belongs to', () => {
    expect(keyLabel('session:s4')).toBe('Session in the facility: s4');
    expect(keyLabel('facility-bias:x', new Map([['x', 'Jet']]))).toBe('Bias of the facility: Jet');
    expect(keyLabel('anything:else')).toBe('anything: else');
  });
});

describe('Every method', () => {
  const methods: readonly Method[] = [
    REDUCTION_METHODS,
    REFERENCE_METHODS,
    ENERGY_METHODS,
    COMPARISON_METHODS,
  ].flatMap((set) => Object.values(set));
  const page = readFileSync(join(__dirname, '..', 'METHODS.md'), 'utf8');

  it('has a name of its own', () => {
    expect(new Set(methods.map(nameOf)).size).toBe(methods.length);
  });

  it.each(methods.map((method) => [nameOf(method), method] as const))(
    '%s stands in METHODS.md with formula, source and validity',
    (name, method) => {
      const [, after = ''] = page.split(`### ${name}\n`);
      const [part = ''] = after.split('\n### ');
      for (const words of [method.formulaText, method.source, method.validity]) expect(part).toContain(words);
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
      expect(formulaMathml.startsWith('<math>')).toBe(true);
    },
  );
});
