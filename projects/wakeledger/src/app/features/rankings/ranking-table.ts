import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { RankingView, ViewRow } from '#shared/core/ranking/ranking-view';
import { Picture } from '../../ui/picture/picture';
import { type BodyDimensions, isBodyShape } from '../../ui/picture/silhouette';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { Quantity } from '../../ui/quantity/quantity';
import { AxisHead } from '../../ui/statement-line/axis-head';
import { dragAxis } from '../../ui/statement-line/drag-axis';
import { type StatementFigures, valuesOf } from '../../ui/statement-line/statement-figures';
import { type LegendMark, StatementLegend } from '../../ui/statement-line/statement-legend';
import { StatementLine } from '../../ui/statement-line/statement-line';
import { bracketsOf } from './brackets';
import type { FigureKind } from './figure-kind';
import { GridFocus } from './grid-focus';
import { evidenceWords, scatterWords } from './evidence-line';
import { cautionWords } from './method-words';
import { probabilityWords } from './ranking-words';
import { RowMovement } from './row-movement';

/** Which figure of which variant a person wants to see derived. */
export interface FigureAsked {
  readonly row: ViewRow;
  readonly kind: FigureKind;
}

/** The ranking as one picture: rank, variant, its place on the shared drag-area axis, its figures. */
@Component({
  selector: 'wl-ranking-table',
  imports: [AxisHead, GridFocus, Picture, Quantity, RouterLink, RowMovement, StatementLegend, StatementLine],
  templateUrl: './ranking-table.html',
  styleUrl: './ranking-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RankingTable {
  readonly view = input.required<RankingView>();
  readonly programmeId = input.required<string>();
  /** P(lowest) by variant; undefined until the worker has answered. */
  readonly lowest = input<ReadonlyMap<string, number>>();
  readonly figureAsked = output<FigureAsked>();

  private readonly format = inject(QuantityFormat);

  private readonly lines = computed(
    () =>
      new Map(
        this.view().rows.map((row): [string, StatementFigures] => [
          row.variantId,
          {
            carried: { value: row.figure.dragAreaM2, expandedU: row.figure.expandedUncertaintyM2 },
            simulated: row.evidence.every(({ facilityKind }) => facilityKind === 'simulation'),
          },
        ]),
      ),
  );
  protected readonly axis = computed(() =>
    dragAxis([...this.lines().values()].flatMap((figures) => [...valuesOf(figures)])),
  );
  protected readonly marks = computed((): readonly LegendMark[] =>
    [...this.lines().values()].some(({ simulated }) => simulated) ? ['carried', 'simulated'] : ['carried'],
  );
  protected readonly brackets = computed(() => bracketsOf(this.view().groups));
  protected readonly ids = computed(() => this.view().rows.map(({ variantId }) => variantId));
  protected readonly lowestWords = computed(() => {
    const lowest = this.lowest();
    return (variantId: string): string => {
      const probability = lowest?.get(variantId);
      return probability === undefined ? '…' : probabilityWords(probability, this.format);
    };
  });
  protected readonly commonArea = computed(() => this.format.text(this.view().commonAreaM2, 'area'));
  protected readonly energyUnit = computed(() => this.format.display('energy-per-distance').unit);

  /** All silhouettes at one scale, so that a longer body looks longer. */
  protected readonly longest = computed(() =>
    Math.max(0, ...this.view().rows.map(({ lengthMm }) => lengthMm ?? 0)),
  );

  /** What a variant's silhouette is drawn from; null where its dimensions are not known. */
  protected bodyOf({ bodyShape, lengthMm, heightMm, wheelbaseMm }: ViewRow): BodyDimensions | null {
    if (lengthMm === null || heightMm === null || wheelbaseMm === null) return null;
    return { bodyShape: isBodyShape(bodyShape) ? bodyShape : 'other', lengthMm, heightMm, wheelbaseMm };
  }

  protected lineOf(row: ViewRow): StatementFigures {
    return this.lines().get(row.variantId) ?? {};
  }

  protected evidenceOf(row: ViewRow): string {
    return evidenceWords(row);
  }

  protected cautionsOf(row: ViewRow): readonly string[] {
    return [...row.cautions.map(cautionWords), ...scatterWords(row, this.format)];
  }
}
