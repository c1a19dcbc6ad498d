import { DIALOG_DATA, Dialog, DialogRef } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';

export interface Confirmation {
  readonly title: string;
  readonly detail: string;
  readonly confirm: string;
  readonly cancel: string;
  /** The confirmed deed takes something away. */
  readonly severe?: boolean;
  /** Asks for a reason, which must be given. */
  readonly reasonLabel?: string;
}

/** Asks one question before something that cannot be undone. The focus begins on the harmless answer. */
@Component({
  selector: 'wl-confirm-dialog',
  template: `
    <h2 id="wl-confirm-title">{{ data.title }}</h2>
    <p>{{ data.detail }}</p>
    @if (data.reasonLabel; as label) {
      <label>
        {{ label }}
        <textarea class="wl-input" rows="3" #reason (input)="given.set(reason.value)"></textarea>
      </label>
    }
    <div class="wl-actions end">
      <button type="button" class="wl-button" cdkFocusInitial (click)="close(undefined)">
        {{ data.cancel }}
      </button>
      <button
        type="button"
        class="wl-button"
        [class.wl-severe]="data.severe"
        [class.wl-main]="!data.severe"
        [disabled]="data.reasonLabel && given().trim() === ''"
        (click)="close(given().trim())"
      >
        {{ data.confirm }}
      </button>
    </div>
  `,
  styleUrl: './confirm-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly data = inject<Confirmation>(DIALOG_DATA);
  private readonly dialog = inject<DialogRef<string, ConfirmDialog>>(DialogRef);
  protected readonly given = signal('');

  protected close(answer: string | undefined): void {
    this.dialog.close(answer);
  }
}

/** Opens the question and waits for the answer: the reason ('' where none was asked), or undefined for no. */
export async function askInDialog(confirmation: Confirmation): Promise<string | undefined> {
  const dialog = inject(Dialog).open<string, Confirmation, ConfirmDialog>(ConfirmDialog, {
    data: confirmation,
    role: 'alertdialog',
    ariaLabelledBy: 'wl-confirm-title',
    autoFocus: confirmation.reasonLabel ? 'textarea' : '[cdkFocusInitial]',
  });
  return firstValueFrom(dialog.closed, { defaultValue: undefined });
}

/** As {@link askInDialog}, for a plain yes or no. Both need an injection context. */
export async function confirmInDialog(confirmation: Confirmation): Promise<boolean> {
  return (await askInDialog(confirmation)) !== undefined;
}
