import { Injectable, inject } from '@angular/core';
import type { RankingView, ViewRow } from '#shared/core/ranking/ranking-view';
import type { Derivation } from '../../../ui/derivation-sheet/derivation';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import type { FigureKind } from '../figure-kind';
import { outlineDerivation } from './outline';

/** How a figure of the ranking came about: down to the raw reading for those who hold the inputs. */
@Injectable({ providedIn: 'root' })
export class FigureDerivations {
  private readonly format = inject(QuantityFormat);

  of(kind: FigureKind, row: ViewRow, view: RankingView): Derivation {
    return outlineDerivation(kind, row, view, this.format);
  }
}
