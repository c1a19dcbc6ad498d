import { TestBed } from '@angular/core/testing';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import { fiveVariants, sweepResult } from '#shared/testing/ranking-scenario';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { evidenceWords, scatterWords } from './evidence-line';

/** The liftback by the weighted mean of two results; the second is higher by this factor. */
function liftback(factor: number) {
  const { inputs, context } = fiveVariants();
  const shape = { id: 'liftback', name: 'Liftback', coefficient: 0.249 * factor, areaM2: 2.19, massKg: 1650 };
  const second = { ...sweepResult(shape, 'r-second', '2026-11-01', 40), sessionId: 'winter' };
  const resultIds = ['r-liftback', 'r-second'];
  const adoption = {
    id: 'a',
    variantId: 'liftback',
    resultIds,
    rule: 'weighted-mean' as const,
    at: '',
    by: '',
  };
  const view = buildRankingView(
    { ...inputs, results: [...inputs.results, second] },
    { ...context, adoptions: [adoption] },
    { ...DEFAULT_CHOICES, cycle: 'short' },
  );
  const row = view.rows.find(({ variantId }) => variantId === 'liftback');
  if (!row) throw new Error('The liftback is not ranked.');
  return row;
}

describe('what a weighted mean says beside the variant', () => {
  it('names its results and that it is one', () => {
    expect(evidenceWords(liftback(1.001))).toMatch(/^weighted mean of VT-0010 · .*; VT-0040 · /);
  });

  it('warns of scatter that no uncertainty accounts for, with the Birge ratio, and only then', () => {
    const format = TestBed.inject(QuantityFormat);
    expect(scatterWords(liftback(1.0001), format)).toEqual([]);
    const wide = liftback(1.05);
    const ratio = wide.combination?.birgeRatio ?? 0;
    expect(ratio).toBeGreaterThan(2);
    expect(scatterWords(wide, format)[0]).toContain(`Birge ratio ${ratio.toFixed(1)}`);
    expect(scatterWords(wide, format)[0]).toContain('about 90 %');
  });
});
