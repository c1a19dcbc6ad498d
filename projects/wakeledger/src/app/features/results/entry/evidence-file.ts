import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { ATTACHMENT_LIMIT_BYTES, ATTACHMENT_TYPES } from '#shared/contracts/attachments';
import { type ApiProblem, asApiProblem } from '../../../core/api/api-problem';
import { AttachmentsApi } from '../../../data/attachments/attachments-api';
import { ProblemBanner } from '../../../ui/problem-banner/problem-banner';
import { AttachmentLine } from '../page/attachment-line';

/** The file that a result rests on: a report, a protocol, a picture of the set-up. */
@Component({
  selector: 'wl-evidence-file',
  imports: [AttachmentLine, ProblemBanner],
  template: `
    <div class="wl-actions">
      <label class="wl-button">
        <ng-container i18n>Attach a file</ng-container>
        <input class="wl-heard" type="file" [accept]="accepted" #file (change)="bring(file)" />
      </label>
      @if (attachmentId(); as id) {
        <wl-attachment-line [attachmentId]="id" />
        <button type="button" class="wl-link" (click)="changed.emit('')" i18n>Leave it out</button>
      } @else {
        <span class="small" i18n>PDF, PNG, JPEG, WebP, CSV or text, at most 10 MB.</span>
      }
    </div>
    @if (busy()) {
      <span role="status" i18n>Bringing the file in …</span>
    }
    @if (tooLarge()) {
      <p class="wl-rust" role="alert" i18n>
        <span aria-hidden="true">▲ </span>This file is larger than 10 MB. Attach a smaller one.
      </p>
    }
    <wl-problem-banner [problem]="problem()" />
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    label:focus-within {
      outline: 2px solid var(--wl-petrol);
      outline-offset: 2px;
    }
    .small {
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvidenceFile {
  readonly attachmentId = input.required<string>();
  readonly changed = output<string>();

  private readonly attachments = inject(AttachmentsApi);
  protected readonly accepted = ATTACHMENT_TYPES.join(',');
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
