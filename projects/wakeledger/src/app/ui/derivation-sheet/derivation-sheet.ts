import { Clipboard } from '@angular/cdk/clipboard';
import { DIALOG_DATA, Dialog, DialogRef } from '@angular/cdk/dialog';
import { Overlay } from '@angular/cdk/overlay';
import { ChangeDetectionStrategy, Component, Injectable, computed, inject, signal } from '@angular/core';
import { saveWorkbook } from '../../core/export/workbook';
import { Formula } from '../formula/formula';
import { Symbols } from '../formula/symbols';
import type { Derivation } from './derivation';
import { derivationSheets } from './derivation-sheets';
import { derivationText, percent } from './derivation-text';

/** The chain of steps from what was measured to the figure on screen, as a sheet from the right. */
@Component({
  selector: 'wl-derivation-sheet',
  imports: [Formula, Symbols],
  templateUrl: './derivation-sheet.html',
  styleUrl: './derivation-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DerivationSheet {
  protected readonly derivation = inject<Derivation>(DIALOG_DATA);
  private readonly dialog = inject<DialogRef<undefined, DerivationSheet>>(DialogRef);
  private readonly clipboard = inject(Clipboard);
  protected readonly copied = signal<'no' | 'yes' | 'failed'>('no');

  protected readonly shares = computed(() =>
    this.derivation.budget
      .filter(({ share }) => share > 0)
      .toSorted((one, other) => other.share - one.share)
      .map((each, index) => ({ ...each, ink: `ink-${index % 6}`, percent: percent(each.share) })),
  );

  protected copy(): void {
    this.copied.set(this.clipboard.copy(derivationText(this.derivation)) ? 'yes' : 'failed');
  }

  protected async saveAsWorkbook(): Promise<void> {
    await saveWorkbook(derivationSheets(this.derivation), $localize`derivation.xlsx`);
  }

  protected close(): void {
    this.dialog.close();
  }
}

/** Opens a derivation; closing it puts the focus back on the figure it was opened from. */
@Injectable({ providedIn: 'root' })
export class DerivationOpener {
  private readonly dialog = inject(Dialog);
  private readonly overlay = inject(Overlay);

  open(derivation: Derivation): DialogRef<undefined, DerivationSheet> {
    return this.dialog.open<undefined, Derivation, DerivationSheet>(DerivationSheet, {
      data: derivation,
      ariaLabelledBy: 'wl-derivation-title',
      autoFocus: '#wl-derivation-title',
      positionStrategy: this.overlay.position().global().right('0').top('0'),
      height: '100vh',
      maxWidth: '100vw',
    });
  }
}
