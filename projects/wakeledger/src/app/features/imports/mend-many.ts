import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import type { ImportDetail, ImportFix, RowFilter } from '#shared/contracts/imports';
import { Undo } from '../../core/editing/undo';
import { ImportInView } from './import-in-view';

type Deed = 'set' | 'replace' | 'skip' | 'unskip';

/** Corrects every row that is shown at once: one text for a column, find and replace, or skip. */
@Component({
  selector: 'wl-mend-many',
  template: `
    <details>
      <summary i18n>Mend all rows shown at once</summary>
      <form class="many" (submit)="$event.preventDefault(); mend()">
        <label>
          <span i18n>What to do</span>
          <select class="wl-input" #deedOf (change)="choose(deedOf.value)">
            <option value="set" i18n>write one text into a column</option>
            <option value="replace" i18n>find and replace in a column</option>
            <option value="skip" i18n>skip the rows</option>
            <option value="unskip" i18n>take skipped rows back in</option>
          </select>
        </label>
        @if (deed() === 'set' || deed() === 'replace') {
          <label>
            <span i18n>Column</span>
            <select class="wl-input" #columnOf (change)="column.set(+columnOf.value)">
              @for (each of detail().columns; track each.index) {
                <option [value]="each.index" [selected]="column() === each.index">{{ each.header }}</option>
              }
            </select>
          </label>
        }
        @if (deed() === 'replace') {
          <label>
            <span i18n>Find</span>
            <input class="wl-input" #findOf [value]="find()" (input)="find.set(findOf.value)" />
          </label>
        }
        @if (deed() === 'set' || deed() === 'replace') {
          <label>
            <span>{{ textLabel() }}</span>
            <input class="wl-input" #textOf [value]="text()" (input)="text.set(textOf.value)" />
          </label>
        }
        <button type="submit" class="wl-button" [attr.aria-disabled]="!possible()" i18n>
          Do it in {{ shown() }} rows
        </button>
      </form>
    </details>
  `,
  styles: `
    details {
      margin-bottom: 10px;
    }
    summary {
      min-height: 24px;
      cursor: pointer;
    }
    .many {
      display: flex;
      flex-wrap: wrap;
      align-items: end;
      gap: 8px 14px;
      padding: 8px 0;
    }
    label {
      display: grid;
      gap: 4px;
      flex: 0 1 220px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MendMany {
  readonly detail = input.required<ImportDetail>();
  readonly filter = input.required<RowFilter>();
  /** How many rows the filter shows. */
  readonly shown = input.required<number>();

  private readonly view = inject(ImportInView);
  private readonly undo = inject(Undo);
  protected readonly deed = signal<Deed>('set');
  protected readonly column = signal(0);
  protected readonly find = signal('');
  protected readonly text = signal('');
  protected readonly textLabel = computed(() =>
    this.deed() === 'set' ? $localize`Text` : $localize`Replace by`,
  );
  protected readonly possible = computed(
    () => !this.view.busy() && this.shown() > 0 && (this.deed() !== 'replace' || this.find() !== ''),
  );

  protected choose(text: string): void {
    this.deed.set((['set', 'replace', 'skip', 'unskip'] as const).find((deed) => deed === text) ?? 'set');
  }

  protected async mend(): Promise<void> {
    if (!this.possible()) return;
    const changed = await this.view.fix(this.fix());
    if (changed !== undefined) this.undo.say($localize`${changed}:COUNT: rows were changed.`);
  }

  private fix(): ImportFix {
    const [kind, filter, column, text] = [this.deed(), this.filter(), this.column(), this.text()];
    if (kind === 'skip' || kind === 'unskip') return { kind, filter };
    return kind === 'set'
      ? { kind, column, text, filter }
      : { kind, column, find: this.find(), text, filter };
  }
}
