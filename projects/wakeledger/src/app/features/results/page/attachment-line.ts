import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { asApiProblem } from '../../../core/api/api-problem';
import { problemWords } from '../../../core/errors/problem-words';
import { AttachmentsApi } from '../../../data/attachments/attachments-api';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';

/** The file beside a result: its name and size, as a link that saves it. */
@Component({
  selector: 'wl-attachment-line',
  template: `
    @if (file.error()) {
      <span class="wl-rust" role="alert"><span aria-hidden="true">▲ </span>{{ failure() }}</span>
    } @else if (words(); as it) {
      <a [href]="address()" download>{{ it.name }}</a>, {{ it.size }}
    } @else {
      <span role="status" i18n>Looking for the file …</span>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AttachmentLine {
  readonly attachmentId = input.required<string>();

  private readonly attachments = inject(AttachmentsApi);
  private readonly format = inject(QuantityFormat);
  protected readonly file = rxResource({
    params: () => this.attachmentId(),
    stream: ({ params }) => this.attachments.describe(params),
  });
  protected readonly address = computed(() => this.attachments.addressOf(this.attachmentId()));
  protected readonly failure = computed(() => problemWords(asApiProblem(this.file.error())).title);
  protected readonly words = computed(() => {
    if (!this.file.hasValue()) return undefined;
    const { fileName, sizeBytes } = this.file.value();
    const kilobytes = this.format.value(sizeBytes / 1000, 'number', { digits: sizeBytes < 10_000 ? 1 : 0 });
    return { name: fileName, size: `${kilobytes}\u202fkB` };
  });
}
