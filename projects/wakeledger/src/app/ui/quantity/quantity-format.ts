import { Injectable, computed, inject } from '@angular/core';
import { THIN_SPACE, formatNumber, formatSignificant, formatSigned } from '../../core/numbers/format-number';
import { Preferences } from '../../core/preferences/preferences';
import { type Display, type QuantityKind, displayOf } from './quantity-kinds';

export interface FormatOptions {
  readonly expandedU?: number;
  readonly digits?: number;
  /** Off where the unit stands in the column's head. */
  readonly withUnit?: boolean;
  /** Always writes the sign: for changes. */
  readonly signed?: boolean;
}

/** Figures as text in the person's locale and units: for sentences, axis labels and cells drawn outside a template. */
@Injectable({ providedIn: 'root' })
export class QuantityFormat {
  private readonly preferences = inject(Preferences);
  private readonly units = computed(() => ({
    speed: this.preferences.speed(),
    energy: this.preferences.energy(),
  }));

  display(kind: QuantityKind): Display {
    return displayOf(kind, this.units());
  }

  /** Value alone, in the person's unit. */
  value(value: number, kind: QuantityKind, options: FormatOptions = {}): string {
    const { digits, factor } = this.display(kind);
    const write = options.signed ? formatSigned : formatNumber;
    return write(value * factor, options.digits ?? digits, this.preferences.numberLocale());
  }

  /** A number inside a calculation: `1.577 × 10⁻⁵`. */
  significant(value: number, digits: number): string {
    return formatSignificant(value, digits, this.preferences.numberLocale());
  }

  /** `0.594 ± 0.008 m²` */
  text(value: number, kind: QuantityKind, options: FormatOptions = {}): string {
    const { unit } = this.display(kind);
    const figure = this.value(value, kind, options);
    const u =
      options.expandedU === undefined
        ? ''
        : ` ±\u00a0${this.value(options.expandedU, kind, { digits: options.digits })}`;
    return `${figure}${u}${unit && options.withUnit !== false ? THIN_SPACE + unit : ''}`;
  }
}
