import { combine, type Combination } from '../combination/combination';
import { pickEvidence } from '../ranking/evidence';
import type { FacilityInput, RankingInput, ResultInput } from '../ranking/ranking-input';
import { reduceResults } from '../reduction/reduce';
import type { Reduction } from '../reduction/reduction';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { normalNumbers, shareOf, simulate, type Simulated } from '../testing/simulation';
import { amount, budgetOf, differenceOf, figureOf, probabilityLower, type KeyedFigure } from './budget';

/**
 * Whole budgets against simulation: the measurement is written down a second time as plain arithmetic, every cause of uncertainty is drawn, and
 * the spread of the outcome is held against the product's propagation (JCGM 101:2008, with 2e5 draws). Nothing here uses a derivative.
 */
const DRAWS = 200_000;

function expectAgreement(simulated: Simulated, figure: KeyedFigure): void {
  const { dragAreaM2, standardUncertaintyM2 } = figureOf(figure);
  const { standardDeviation, standardErrorOfDeviation, mean, standardErrorOfMean } = simulated;
  expect(Math.abs(standardDeviation - standardUncertaintyM2)).toBeLessThan(3 * standardErrorOfDeviation);
  expect(Math.abs(mean - dragAreaM2)).toBeLessThan(3 * standardErrorOfMean);
}

function reductionsOf(input: RankingInput): ReadonlyMap<string, Reduction> {
  const { reductions, refused } = reduceResults(input);
  expect(refused).toEqual([]);
  return new Map(reductions.map((one) => [one.output.resultId, one]));
}

describe('A model in a closed section, corrected after Maskell and brought up by the friction line', () => {
  const [sectionM2, theta, methodU, scale, scaleU] = [8.2, 1.2, 0.15, 0.4, 0.0002] as const;
  const facility: FacilityInput = {
    id: 'tunnel',
    kind: 'closed',
    areaM2: sectionM2,
    blockage: { method: 'maskell', theta, uFractionOfCorrection: methodU },
    biasURelative: 0.008,
    sessionURelative: 0.003,
    installationURelative: 0.002,
    repeatabilityURelative: 0.0025,
  };
  const result: ResultInput = aResult('r', 'a', {
    modelId: 'clay',
    scale,
    speedKmh: 180,
    quotedAreaM2: 0.36,
    quotedAreaUM2: 0.0007,
    quotedAreaScale: 'model',
    points: [{ value: 0.29, n: 4 }],
  });
  const input = aRanking({
    facilities: [facility],
    models: [{ id: 'clay', scaleU }],
    results: [result],
  });
  const withLine: RankingInput = {
    ...input,
    programme: { ...input.programme, policies: { frictionShare: 0.12, frictionShareU: 0.06 } },
  };
  const reduction = reductionsOf(withLine).get('r')!;
  const shape = (re: number): number => 0.455 / Math.log10(re) ** 2.58;
  const lineRatio =
    shape(reduction.output.reynolds!) / shape(reduceResults(withLine).context.referenceReynolds) - 1;

  const fullScaleM2 = reduction.output.steps[0]!.dragAreaM2!;
  /** The line’s correction: half of it is how sure its shape is, whatever the friction share. */
  const correction = fullScaleM2 / (1 + 0.12 * lineRatio) - fullScaleM2;

  /** The drag area at the reference as the numbers of one draw make it, all 0 for the figure itself. */
  function measured(normal: () => number): number {
    const reading = 0.29 * (1 + (0.0025 / Math.sqrt(4)) * normal());
    const x = reading * (0.36 + 0.0007 * normal());
    const corrected = x / (1 + (theta * x) / sectionM2);
    const byMethod = x + (corrected - x) * (1 + methodU * normal());
    const fullScale = byMethod / (scale + scaleU * normal()) ** 2;
    const withFacility = fullScale * (1 + 0.008 * normal() + 0.003 * normal() + 0.002 * normal());
    const atReference = withFacility / (1 + (0.12 + 0.06 * normal()) * lineRatio);
    return atReference + (correction / 2) * normal();
  }

  it('is the same figure in plain arithmetic', () => {
    expect(measured(() => 0)).toBeCloseTo(reduction.zeroYaw.dragAreaM2, 14);
  });

  it('has the uncertainty that the simulation finds, and U covers what a coverage factor of 2 promises', () => {
    const simulated = simulate(DRAWS, () => measured(normal));
    expectAgreement(simulated, reduction.zeroYaw);
    const { dragAreaM2, expandedUncertaintyM2 } = figureOf(reduction.zeroYaw);
    const covered = shareOf(simulated.draws, (x) => Math.abs(x - dragAreaM2) <= expandedUncertaintyM2);
    // Three standard errors of a share of 0.9545 in 2e5 draws.
    expect(Math.abs(covered - 0.9545)).toBeLessThan(3 * Math.sqrt((0.9545 * 0.0455) / DRAWS));
  });

  const normal = normalNumbers(20310301);
});

describe('A figure carried to the reference facility by a correlation', () => {
  const xs = [0.52, 0.56, 0.6, 0.64, 0.68, 0.72];
  const line = (x: number): number => 0.02 + 0.95 * x;
  const uM2 = 0.002;
  const pairs = xs.map((x) => ({ dragAreaM2: x, uM2: 0, referenceDragAreaM2: line(x), referenceUM2: uM2 }));
  const input = aRanking({
    facilities: [
      aFacility('tunnel', {
        blockage: { method: 'none' },
        biasURelative: 0.02,
        repeatabilityURelative: 0.001,
      }),
      aFacility('home', { kind: 'open-jet', areaM2: 24, biasURelative: 0.006 }),
    ],
    results: [aResult('r', 'a', { points: [{ value: 0.28 }] })],
    correlations: [{ id: 'line', facilityId: 'tunnel', referenceFacilityId: 'home', pairs }],
  });
  const programme = { ...input.programme, referenceFacilityId: 'home' };
  const { zeroYaw } = reductionsOf({ ...input, programme }).get('r')!;
  const normal = normalNumbers(20310302);

  /** An ordinary line through the pairs: they have equal weights. */
  function fitted(ys: readonly number[]): (x: number) => number {
    const n = xs.length;
    const meanX = xs.reduce((sum, x) => sum + x, 0) / n;
    const meanY = ys.reduce((sum, y) => sum + y, 0) / n;
    let xx = 0;
    let xy = 0;
    xs.forEach((x, i) => {
      xx += (x - meanX) ** 2;
      xy += (x - meanX) * ((ys[i] ?? NaN) - meanY);
    });
    return (x) => meanY + (xy / xx) * (x - meanX);
  }

  function measured(draw: () => number): number {
    const reading = 0.28 * 2.24 * (1 + 0.001 * draw()) + 0.002 * draw() + 0.001 * draw();
    const carried = fitted(xs.map((x) => line(x) + uM2 * draw()))(reading);
    return carried * (1 + 0.006 * draw());
  }

  it('has the uncertainty that new pairs and a new reading in every draw find', () => {
    expect(measured(() => 0)).toBeCloseTo(zeroYaw.dragAreaM2, 13);
    expectAgreement(
      simulate(DRAWS, () => measured(normal)),
      zeroYaw,
    );
  });

  it('leaves its own facility’s bias behind', () => {
    const keys = zeroYaw.budget.map(({ key }) => key);
    expect(keys).toContain('facility-bias:home');
    expect(keys).not.toContain('facility-bias:tunnel');
  });
});

describe('Two variants of one facility and session', () => {
  const facility = aFacility('tunnel', {
    blockage: { method: 'area-ratio', uFractionOfCorrection: 0.5 },
    biasURelative: 0.01,
    sessionUM2: 0.002,
    installationUM2: 0.001,
    repeatabilityURelative: 0.002,
  });
  const values = { a: 0.28, b: 0.283 } as const;
  const resultOf = (id: 'a' | 'b'): ResultInput =>
    aResult(id, id, { sessionId: 's', installationId: `i-${id}`, points: [{ value: values[id] }] });
  const input = aRanking({
    facilities: [facility],
    variants: [aVariant('a', { frontalAreaUM2: 0 }), aVariant('b', { frontalAreaUM2: 0 })],
    results: [resultOf('a'), resultOf('b')],
  });
  const reductions = reductionsOf(input);
  const a = reductions.get('a')!.zeroYaw;
  const b = reductions.get('b')!.zeroYaw;
  const normal = normalNumbers(20310303);

  /** What both share is drawn once, what each has by itself twice. */
  function difference(): number {
    const [method, bias, session] = [normal(), normal(), normal()];
    const measured = (value: number): number => {
      const x = value * 2.24 * (1 + 0.002 * normal());
      const corrected = x / (1 + 2.24 / 46 / 4) ** 2;
      const byMethod = x + (corrected - x) * (1 + 0.5 * method);
      return byMethod * (1 + 0.01 * bias) + 0.002 * session + 0.001 * normal();
    };
    return measured(values.b) - measured(values.a);
  }

  it('differ with the uncertainty that is left when what they share has cancelled', () => {
    const simulated = simulate(DRAWS, difference);
    expectAgreement(simulated, differenceOf(b, a));
    const lower = shareOf(simulated.draws, (x) => x > 0);
    const probability = probabilityLower(a, b);
    expect(Math.abs(lower - probability)).toBeLessThan(
      3 * Math.sqrt((probability * (1 - probability)) / DRAWS),
    );
    expect(figureOf(differenceOf(b, a)).standardUncertaintyM2).toBeLessThan(
      0.4 * figureOf(a).standardUncertaintyM2,
    );
  });
});

/** Draws of a mean: each key once, and by itself what makes every own part R times as wide. */
function scatteredMean(
  figures: readonly KeyedFigure[],
  { weights, birgeRatio, unsharedStandardUncertaintyM2 }: Combination,
  normal: () => number,
): () => number {
  const keys = [...new Set(figures.flatMap(({ budget }) => budget.map(({ key }) => key)))];
  const excess = Math.sqrt((birgeRatio ?? 1) ** 2 - 1);
  const results = figures.map(({ dragAreaM2, budget }, i) => ({
    weight: weights[i] ?? NaN,
    dragAreaM2,
    amounts: keys.map((key) => budget.find((entry) => entry.key === key)?.amountM2 ?? 0),
    own: excess * (unsharedStandardUncertaintyM2[i] ?? NaN),
  }));
  const errors = new Float64Array(keys.length);
  return () => {
    for (let k = 0; k < errors.length; k++) errors[k] = normal();
    let mean = 0;
    for (const { weight, dragAreaM2, amounts, own } of results) {
      let value = dragAreaM2 + own * normal();
      amounts.forEach((u, k) => (value += u * (errors[k] ?? NaN)));
      mean += weight * value;
    }
    return mean;
  };
}

describe('A mean that Birge’s ratio widens', () => {
  const values = [0.6226, 0.6358, 0.616, 0.6301];
  /** A bias in three results, smaller in one; a session in two; repeatabilities; a blockage share of both signs. */
  const amounts: readonly Readonly<Record<string, number>>[] = [
    { 'facility-bias:A': 0.004, 'session:1': 0.002, 'repeatability:a': 0.0021, 'friction-share:p': 0.001 },
    { 'facility-bias:A': 0.004, 'session:1': 0.002, 'repeatability:b': 0.0018, 'friction-share:p': -0.001 },
    { 'facility-bias:A': 0.003, 'session:2': 0.0024, 'repeatability:c': 0.002, 'friction-share:p': 0.001 },
    { 'facility-bias:B': 0.005, 'session:3': 0.0022, 'repeatability:d': 0.0015, 'friction-share:p': 0.0012 },
  ];
  const figures = values.map((dragAreaM2, i) => ({
    dragAreaM2,
    budget: budgetOf(Object.entries(amounts[i] ?? {}).map(([key, u]) => amount(key, u))),
  }));
  const combined = combine(figures, 'v');
  const normal = normalNumbers(20310304);

  it('is wider than its keys say', () => {
    expect(combined.birgeRatio).toBeGreaterThan(1.2);
  });

  it('has the spread of a mean whose results scatter by themselves as Birge’s ratio says', () => {
    const draw = scatteredMean(figures, combined, normal);
    expectAgreement(simulate(DRAWS, draw), combined.figure);
  });

  it('is what a variant is ranked by, through the whole reduction', () => {
    const result = (id: string, value: number, sessionId: string): ResultInput =>
      aResult(id, 'a', { sessionId, points: [{ value }] });
    const given = aRanking({
      variants: [aVariant('a', { evidence: 'weighted-mean' })],
      results: [result('r1', 0.275, 's1'), result('r2', 0.285, 's2'), result('r3', 0.281, 's3')],
    });
    const reduced = reduceResults(given);
    const { figure, combination } = pickEvidence(given.variants, reduced, 'zero-yaw').chosen[0]!;
    expect(combination?.birgeRatio).toBeGreaterThan(1);
    const readings = reduced.reductions.map(({ zeroYaw }) => zeroYaw);
    const draw = scatteredMean(readings, combination!, normal);
    expectAgreement(simulate(DRAWS, draw), figure);
  });
});
