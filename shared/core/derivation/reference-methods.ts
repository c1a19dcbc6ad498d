import * as m from './mathml';
import type { Method } from './method';

const CdA = m.row(m.sub('C', 'D'), m.times, m.mi('A'));
const CdARef = m.row(m.sub('C', 'D'), m.times, m.sub('A', 'ref'));
const cf = (index: string): string => m.row(m.sub('c', 'f'), m.bracketed(m.sub('Re', index)));

/** Methods of sections 6 and 8: from a drag area at full scale to the programme's reference. */
export const REFERENCE_METHODS = {
  skinFriction: {
    id: 'skin-friction',
    version: 1,
    title: 'Skin friction',
    formulaMathml: m.math(
      m.sub('c', 'f'),
      m.equals,
      m.frac(m.mn('0.455'), m.sup(m.bracketed(m.sub('log', '10'), m.mi('Re')), m.mn('2.58'))),
    ),
    formulaText: 'c_f = 0.455/(log10 Re)^2.58',
    source: 'Prandtl–Schlichting; Schlichting, Boundary-Layer Theory',
    validity: 'Smooth plate, turbulent from its leading edge; Re above 1000.',
  },
  frictionLine: {
    id: 'friction-line',
    version: 1,
    title: 'Reynolds number, by the friction line',
    formulaMathml: m.math(
      CdARef,
      m.equals,
      m.frac(
        CdA,
        m.row(m.mn(1), m.plus, m.mi('φ'), m.bracketed(m.frac(cf('test'), cf('ref')), m.minus, m.mn(1))),
      ),
    ),
    formulaText: 'C_D·A_ref = C_D·A/(1 + φ·(c_f(Re_test)/c_f(Re_ref) − 1))',
    source: 'method section 6; share of friction φ = 0.12 ± 0.06 (memory)',
    validity:
      'Results without a sweep. What is not known of φ is shared by all results under one policy; half of the move is the variant’s own.',
  },
  sweepFit: {
    id: 'reynolds-sweep-fit',
    version: 1,
    title: 'Reynolds sweep: the fit',
    formulaMathml: m.math(CdA, m.equals, m.mi('a'), m.plus, m.mi('k'), m.times, m.sub('c', 'f')),
    formulaText: 'C_D·A = a + k·c_f(Re), ordinary least squares; ν = n − 2',
    source: 'method section 6; least squares with standard errors as in NIST StRD, linear regression',
    validity: 'At least four points, highest Reynolds number at least 1.5 times the lowest.',
  },
  sweepMove: {
    id: 'reynolds-sweep-move',
    version: 1,
    title: 'Reynolds number, along a sweep',
    formulaMathml: m.math(
      CdARef,
      m.equals,
      CdA,
      m.plus,
      m.mi('k'),
      m.times,
      m.bracketed(cf('ref'), m.minus, cf('test')),
    ),
    formulaText: 'C_D·A_ref = C_D·A + k·(c_f(Re_ref) − c_f(Re_test))',
    source: 'method section 6',
    validity: 'Both ends no further beyond the sweep than its own span in c_f.',
  },
  ownSweep: {
    id: 'reynolds-own-sweep',
    version: 1,
    title: 'Reynolds number, from its own sweep',
    formulaMathml: m.math(
      CdARef,
      m.equals,
      m.mover(CdA),
      m.plus,
      m.mi('k'),
      m.times,
      m.bracketed(cf('ref'), m.minus, m.mover(m.sub('c', 'f'))),
    ),
    formulaText: 'C_D·A_ref = mean of C_D·A + k·(c_f(Re_ref) − mean of c_f)',
    source: 'method section 6',
    validity:
      'The reference no further beyond the sweep than its own span in c_f. Its scatter stands for the repeatability.',
  },
  adjustment: {
    id: 'condition-adjustment',
    version: 1,
    title: 'Condition: adjustment',
    formulaMathml: m.math(CdA, m.plus, m.mi('Δ'), CdA),
    formulaText: 'C_D·A + ΔC_D·A, backwards with the sign turned',
    source: 'method section 8; the organisation’s own adjustment',
    validity: 'From one named value of an item to another, for the body classes that it was found for.',
  },
  adjustmentPerUnit: {
    id: 'condition-adjustment-per-unit',
    version: 1,
    title: 'Condition: adjustment per unit',
    formulaMathml: m.math(
      CdA,
      m.plus,
      m.frac(m.row(m.mi('Δ'), CdA), m.mtext('unit')),
      m.times,
      m.bracketed(m.mtext('reference'), m.minus, m.mtext('test')),
    ),
    formulaText: 'C_D·A + ΔC_D·A per unit·(reference − test)',
    source: 'method section 8; the organisation’s own adjustment',
    validity: 'Numeric items; in proportion to the difference.',
  },
  correlationFit: {
    id: 'facility-correlation-fit',
    version: 1,
    title: 'Correlation between facilities: the fit',
    formulaMathml: m.math(CdARef, m.equals, m.mi('a'), m.plus, m.mi('b'), m.times, CdA),
    formulaText:
      'C_D·A_ref = a + b·C_D·A, weighted least squares, w = 1/(u_x² + u_y²); b = 1 under five pairs',
    source:
      'method section 8; widened by √(χ²/ν) where that is above 1 (Birge, Phys. Rev. 40 (1932) 207); between pairs after DerSimonian and Laird, Control. Clin. Trials 7 (1986) 177',
    validity: 'Pairs of one geometry each; b above 0.',
  },
  correlation: {
    id: 'facility-correlation',
    version: 1,
    title: 'Correlation to the reference facility',
    formulaMathml: m.math(
      CdARef,
      m.equals,
      m.mover(m.mi('y')),
      m.plus,
      m.mi('b'),
      m.times,
      m.bracketed(CdA, m.minus, m.mover(m.mi('x'))),
    ),
    formulaText: 'C_D·A_ref = ȳ + b·(C_D·A − x̄)',
    source: 'method section 8',
    validity:
      'Within the range of the pairs. From here on the result carries the bias of the reference facility instead of its own.',
  },
} as const satisfies { readonly [name: string]: Method };
