import { Injectable, inject } from '@angular/core';
import { Store } from '@ngrx/store';
import type { RankingView, ViewRow } from '#shared/core/ranking/ranking-view';
import { rankingsFeature } from '../../../data/rankings/rankings.feature';
import { type DerivationSources, selectDerivationSources } from '../../../data/rankings/rankings.selectors';
import type { Derivation, DerivationStep } from '../../../ui/derivation-sheet/derivation';
import { stepFromTrace } from '../../../ui/derivation-sheet/from-trace';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import type { FigureKind } from '../figure-kind';
import { energyInUnits } from './figure-steps';
import { closingSteps, headOf, outlineDerivation, sharesOfRow } from './outline';
import { dragTrace, energyTrace } from './traces';

/** How a figure of the ranking came about: down to the raw reading for those who hold the inputs. */
@Injectable({ providedIn: 'root' })
export class FigureDerivations {
  private readonly format = inject(QuantityFormat);
  private readonly sources = inject(Store).selectSignal(selectDerivationSources);
  private readonly tried = inject(Store).selectSignal(rankingsFeature.selectTried);

  /** Of a ranking with something tried on it, each says so: what is copied or saved travels without its page. */
  of(kind: FigureKind, row: ViewRow, view: RankingView): Derivation {
    const derivation = this.derived(kind, row, view);
    return this.tried().length === 0
      ? derivation
      : { ...derivation, summary: $localize`Tried, not saved. ${derivation.summary}:SUMMARY:` };
  }

  private derived(kind: FigureKind, row: ViewRow, view: RankingView): Derivation {
    const sources = this.sources();
    const steps = sources && this.tracedSteps(kind, row, view, sources);
    if (!steps) return outlineDerivation(kind, row, view, this.format);
    return {
      ...headOf(kind, row, view, this.format),
      steps,
      ...sharesOfRow(row, this.format),
    };
  }

  private tracedSteps(
    kind: FigureKind,
    row: ViewRow,
    view: RankingView,
    sources: DerivationSources,
  ): readonly DerivationStep[] | null {
    const drag = dragTrace(kind, row, view, sources);
    if (!drag) return null;
    const toDragArea = drag.steps.map((step) => stepFromTrace(step, this.format));
    if (kind !== 'energy') return [...toDragArea, ...closingSteps(kind, row, view, this.format)];
    const energy = energyTrace(row, sources);
    if (!energy) return null;
    return [
      ...toDragArea,
      ...energy.steps.map((step) => stepFromTrace(step, this.format)),
      ...energyInUnits(row, view, this.format),
    ];
  }
}
