import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { ATTACHMENT_LIMIT_BYTES, ATTACHMENT_TYPES } from '#shared/contracts/attachments';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { AttachmentsApi } from '../../data/attachments/attachments-api';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';

/** The file behind an adjustment, where there is one: a report or a protocol. */
@Component({
  selector: 'wl-adjustment-evidence',
  imports: [ProblemBanner],
  template: `
    <div class="wl-actions">
      <label class="wl-button">
        <ng-container i18n>Attach a file</ng-container>
        <input class="wl-heard" type="file" [accept]="accepted" #file (change)="bring(file)" />
      </label>
      @if (address(); as address) {
        <a [href]="address" i18n>the attached file</a>
        <button type="button" class="wl-link" (click)="changed.emit('')" i18n>Leave it out</button>
      } @else {
        <span class="small" i18n>Optional: PDF, PNG, JPEG, WebP, CSV or text, at most 10 MB.</span>
      }
    </div>
    <p role="status">
      @if (busy()) {
        <ng-container i18n>Bringing the file in …</ng-container>
      }
      @if (tooLarge()) {
        <span class="wl-rust" i18n>This file is larger than 10 MB. Attach a smaller one.</span>
      }
    </p>
    <wl-problem-banner [problem]="problem()" />
  `,
  styles: `
    label:focus-within {
      outline: 2px solid var(--wl-petrol);
      outline-offset: 2px;
    }
    .small {
      font-size: var(--wl-small);
    }
    p {
      margin: 4px 0 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AdjustmentEvidence {
  readonly attachmentId = input.required<string>();
  readonly changed = output<string>();

  private readonly attachments = inject(AttachmentsApi);
  protected readonly accepted = ATTACHMENT_TYPES.join(',');
  protected readonly address = computed(() =>
    this.attachmentId() === '' ? undefined : this.attachments.addressOf(this.attachmentId()),
  );
  protected readonly busy = signal(false);
  protected readonly tooLarge = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);

  protected bring(chooser: HTMLInputElement): void {
    const file = chooser.files?.[0];
    chooser.value = '';
    if (!file) return;
    this.problem.set(undefined);
    this.tooLarge.set(file.size > ATTACHMENT_LIMIT_BYTES);
    if (this.tooLarge()) return;
    this.busy.set(true);
    this.attachments.bring(file, 'evidence').subscribe({
      next: ({ id }) => {
        this.busy.set(false);
        this.changed.emit(id);
      },
      error: (thrown: unknown) => {
        this.busy.set(false);
        this.problem.set(asApiProblem(thrown));
      },
    });
  }
}
