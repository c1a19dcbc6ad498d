import * as m from './mathml';
import type { Method } from './method';

const oneOver = (below: string): string => m.frac(m.mn(1), below);

/** Methods of section 10: several results of one variant. */
export const COMBINATION_METHODS = {
  weightedMean: {
    id: 'weighted-mean',
    version: 1,
    title: 'Weighted mean of the results',
    formulaMathml: m.math(
      m.mover(m.mi('x')),
      m.equals,
      m.mo('∑'),
      m.sub('w', 'i'),
      m.times,
      m.sub('x', 'i'),
      m.mo(','),
      m.sub('w', 'i'),
      m.mo('∝'),
      oneOver(m.squared(m.sub('u', 'i'))),
    ),
    formulaText: 'x̄ = Σ w_i·x_i, w_i ∝ 1/u_i² of each result’s own part',
    source: 'weighted least squares; method section 10',
    validity:
      'What all results hold under one key with one sign is common: it takes no part in the weights and survives whole.',
  },
  birgeRatio: {
    id: 'birge-ratio',
    version: 1,
    title: 'Agreement of the results: Birge ratio',
    formulaMathml: m.math(
      m.mi('R'),
      m.equals,
      m.sqrt(m.frac(m.squared(m.mi('χ')), m.row(m.mi('n'), m.minus, m.mn(1)))),
    ),
    formulaText: 'R = √(χ²/(n − 1)); R > 1 adds (R² − 1)·Σ w²u²',
    source: 'Birge, Phys. Rev. 40 (1932) 207',
    validity:
      'On each result’s own part. For scatter that no key describes the widened mean covers about 90 %.',
  },
  randomEffects: {
    id: 'random-effects-mean',
    version: 1,
    title: 'Beside it: the mean with a variance between results',
    formulaMathml: m.math(
      m.squared(m.mi('τ')),
      m.equals,
      m.frac(
        m.row(m.squared(m.mi('χ')), m.minus, m.bracketed(m.mi('n'), m.minus, m.mn(1))),
        m.row(
          m.mo('∑'),
          m.mi('w'),
          m.minus,
          m.frac(m.row(m.mo('∑'), m.squared(m.mi('w'))), m.row(m.mo('∑'), m.mi('w'))),
        ),
      ),
    ),
    formulaText: 'τ² = max(0, (χ² − (n − 1))/(Σw − Σw²/Σw)), then weights 1/(u² + τ²)',
    source: 'DerSimonian and Laird, Control. Clin. Trials 7 (1986) 177',
    validity: 'For comparison: the ranking does not use it.',
  },
} as const satisfies { readonly [name: string]: Method };
