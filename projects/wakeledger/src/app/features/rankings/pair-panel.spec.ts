import { TestBed } from '@angular/core/testing';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import { dragStage, evidenceStage, reduceStage } from '#shared/core/ranking/ranking-view-stages';
import { probabilityLowerOf, separabilityWithin } from '#shared/core/ranking/comparables';
import { fiveVariants } from '#shared/testing/ranking-scenario';
import { pairRows } from './pair-rows';
import { PairPanel } from './pair-panel';

const { inputs, context } = fiveVariants();
const view = buildRankingView(inputs, context, { ...DEFAULT_CHOICES, cycle: 'short' });

describe('one variant against the others', () => {
  it('has the probabilities and separations of the ranking itself, for every pair', () => {
    const reduced = reduceStage(inputs, inputs.programme.referenceAir);
    const { set } = dragStage(evidenceStage(inputs.variants, reduced, context, 'adopted', 'zero-yaw'));
    const separable = separabilityWithin(set, view.confidence);
    view.rows.forEach((row, a) => {
      const others = set.ids.map((_, at) => at).filter((at) => at !== a);
      pairRows(view, row).forEach((pair, position) => {
        const b = others[position] ?? -1;
        expect(pair.variantId).toBe(set.ids[b]);
        expect(pair.probabilityLower).toBeCloseTo(probabilityLowerOf(set, a, b), 10);
        expect(pair.separable).toBe(separable(a, b));
      });
    });
  });

  it('lets what both share cancel: the difference is known better than either figure', () => {
    const [first, second] = view.rows;
    const [pair] = pairRows(view, first!);
    expect(pair?.differenceM2).toBeCloseTo(second!.figure.dragAreaM2 - first!.figure.dragAreaM2, 14);
    const both = Math.hypot(first!.figure.expandedUncertaintyM2, second!.figure.expandedUncertaintyM2);
    expect(pair?.expandedUncertaintyM2).toBeGreaterThan(0);
    expect(pair!.expandedUncertaintyM2).toBeLessThan(both / 2);
  });

  it('begins with the first, and says in words how many can be told apart', () => {
    const fixture = TestBed.createComponent(PairPanel);
    fixture.componentRef.setInput('view', view);
    TestBed.tick();
    const element = fixture.nativeElement as HTMLElement;
    expect(element.querySelectorAll('tbody tr')).toHaveLength(4);
    expect(element.querySelector('[role=status]')?.textContent).toContain('Liftback can be told from');
    const select = element.querySelector('select');
    if (!select) throw new Error('Nothing can be chosen.');
    select.value = 'sport';
    select.dispatchEvent(new Event('change'));
    TestBed.tick();
    const apart = pairRows(
      view,
      view.rows.find(({ variantId }) => variantId === 'sport')!,
    );
    expect(element.querySelector('[role=status]')?.textContent).toContain(
      `Sport can be told from ${apart.filter(({ separable }) => separable).length} of 4 others`,
    );
    expect(element.querySelectorAll('tbody .wl-plum')).toHaveLength(
      apart.filter(({ separable }) => !separable).length,
    );
  });
});
