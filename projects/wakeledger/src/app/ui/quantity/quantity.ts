import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { QuantityFormat } from './quantity-format';
import type { QuantityKind } from './quantity-kinds';

/** A figure: value ± U unit, the uncertainty smaller, in the person's locale and units. */
@Component({
  selector: 'wl-quantity',
  template: `@if (shown(); as it) {
      <span>{{ it.value }}</span>
      @if (it.u) {
        <span class="u">&nbsp;±&nbsp;{{ it.u }}</span>
      }
      @if (it.unit) {
        <span class="unit" [class.u]="it.u">&#8239;{{ it.unit }}</span>
      }
    } @else {
      <span class="wl-heard" i18n>no figure</span><span aria-hidden="true">–</span>
    }`,
  styles: `
    :host {
      white-space: nowrap;
    }
    .unit {
      margin-left: 0.08em;
    }
    .u {
      font-size: 0.83em;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Quantity {
  /** In the unit of its kind (see QUANTITY_KINDS); nothing is shown as a dash, never as 0. */
  readonly value = input.required<number | null | undefined>();
  readonly kind = input.required<QuantityKind>();
  /** U, the expanded uncertainty, in the same unit. */
  readonly expandedU = input<number | null>();
  readonly digits = input<number>();
  readonly signed = input(false);
  /** Off where the unit stands in the column's head. */
  readonly withUnit = input(true);

  private readonly format = inject(QuantityFormat);

  protected readonly shown = computed(() => {
    const value = this.value();
    if (value === undefined || value === null || !Number.isFinite(value)) return undefined;
    const kind = this.kind();
    const digits = this.digits();
    const u = this.expandedU();
    return {
      value: this.format.value(value, kind, { digits, signed: this.signed() }),
      u: u === undefined || u === null ? undefined : this.format.value(u, kind, { digits }),
      unit: this.withUnit() ? this.format.display(kind).unit : '',
    };
  });
}
