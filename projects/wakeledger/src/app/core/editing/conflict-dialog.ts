import { DIALOG_DATA, Dialog, DialogRef } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import type { ConflictRow } from './conflict-rows';

export type ConflictAnswer = 'save-mine' | 'take-theirs';

interface ConflictData {
  readonly what: string;
  readonly rows: readonly ConflictRow[];
}

/** A colleague saved first: shows both versions field by field and lets the person choose, or go on editing. */
@Component({
  selector: 'wl-conflict-dialog',
  template: `
    <h2 id="wl-conflict-title" i18n>A colleague changed {{ data.what }} meanwhile</h2>
    <p i18n>Nothing of yours is lost. These fields differ from what you opened:</p>
    <div class="wl-scroll">
      <table class="wl-table">
        <thead>
          <tr>
            <th scope="col" i18n>Field</th>
            <th scope="col" i18n>As you opened it</th>
            <th scope="col" i18n>Yours</th>
            <th scope="col" i18n>Your colleague’s</th>
          </tr>
        </thead>
        <tbody>
          @for (row of data.rows; track row.label) {
            <tr>
              <th scope="row">
                {{ row.label }}
                @if (row.clash) {
                  <span class="wl-rust" i18n>▲ both changed</span>
                }
              </th>
              <td>{{ row.before || '–' }}</td>
              <td>{{ row.mine || '–' }}</td>
              <td>{{ row.theirs || '–' }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    <div class="wl-actions end">
      <button type="button" class="wl-button" cdkFocusInitial (click)="close(undefined)" i18n>
        Go on editing
      </button>
      <button type="button" class="wl-button" (click)="close('take-theirs')" i18n>
        Take theirs, drop mine
      </button>
      <button type="button" class="wl-button wl-severe" (click)="close('save-mine')" i18n>
        Save mine over theirs
      </button>
    </div>
  `,
  styleUrl: './conflict-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConflictDialog {
  protected readonly data = inject<ConflictData>(DIALOG_DATA);
  private readonly dialog = inject<DialogRef<ConflictAnswer, ConflictDialog>>(DialogRef);

  protected close(answer: ConflictAnswer | undefined): void {
    this.dialog.close(answer);
  }
}

/** Opens the dialog; undefined means: go on editing. Needs an injection context. */
export async function resolveConflict(
  what: string,
  rows: readonly ConflictRow[],
): Promise<ConflictAnswer | undefined> {
  const dialog = inject(Dialog).open<ConflictAnswer, ConflictData, ConflictDialog>(ConflictDialog, {
    data: { what, rows },
    ariaLabelledBy: 'wl-conflict-title',
    autoFocus: '[cdkFocusInitial]',
  });
  return firstValueFrom(dialog.closed, { defaultValue: undefined });
}
