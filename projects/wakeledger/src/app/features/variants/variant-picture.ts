import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import type { BODY_SHAPES } from '#shared/contracts/variants';
import { ATTACHMENT_LIMIT_BYTES } from '#shared/contracts/attachments';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { AttachmentsApi } from '../../data/attachments/attachments-api';
import { Picture } from '../../ui/picture/picture';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { bodyDimensions } from './body-dimensions';

interface Drawn {
  readonly name: string;
  readonly bodyShape: (typeof BODY_SHAPES)[number];
  readonly lengthMm: number | null;
  readonly heightMm: number | null;
  readonly wheelbaseMm: number | null;
}

/** The variant's picture: drawn from what is typed, or one's own. */
@Component({
  selector: 'wl-variant-picture',
  imports: [Picture, ProblemBanner],
  template: `
    <div class="frame">
      @if (address(); as source) {
        <img [src]="source" [alt]="drawn().name" />
      } @else {
        <wl-picture [name]="drawn().name || unnamed" [dimensions]="dimensions()" />
      }
    </div>
    @if (editable()) {
      <div class="wl-actions">
        <label class="wl-button">
          <ng-container i18n>Bring in a picture</ng-container>
          <input
            class="wl-heard"
            type="file"
            accept="image/png,image/jpeg,image/webp"
            #file
            (change)="bring(file)"
          />
        </label>
        @if (attachmentId()) {
          <button type="button" class="wl-link" (click)="changed.emit('')" i18n>
            Use the drawn silhouette
          </button>
        }
        <span class="small" i18n
          >PNG, JPEG or WebP, at most 10 MB; else it is drawn from its dimensions.</span
        >
      </div>
      @if (busy()) {
        <span role="status" i18n>Bringing the picture in …</span>
      }
      <wl-problem-banner [problem]="problem()" />
      @if (tooLarge()) {
        <p class="wl-rust" role="alert" i18n>
          <span aria-hidden="true">▲ </span>This file is larger than 10 MB. Choose a smaller picture.
        </p>
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 10px;
    }
    .frame {
      height: 130px;
      max-width: 420px;
    }
    .frame > * {
      display: block;
      width: 100%;
      height: 100%;
      object-fit: contain;
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
export class VariantPicture {
  readonly drawn = input.required<Drawn>();
  readonly attachmentId = input.required<string>();
  readonly editable = input(false);
  /** The id of the picture brought in; empty for the drawn one. */
  readonly changed = output<string>();

  private readonly attachments = inject(AttachmentsApi);
  protected readonly unnamed = $localize`The variant’s silhouette`;
  protected readonly busy = signal(false);
  protected readonly tooLarge = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly dimensions = computed(() => bodyDimensions(this.drawn()));
  protected readonly address = computed(() => {
    const id = this.attachmentId();
    return id === '' ? undefined : this.attachments.addressOf(id);
  });

  protected bring(chooser: HTMLInputElement): void {
    const file = chooser.files?.[0];
    chooser.value = '';
    if (!file) return;
    this.problem.set(undefined);
    this.tooLarge.set(file.size > ATTACHMENT_LIMIT_BYTES);
    if (this.tooLarge()) return;
    this.busy.set(true);
    this.attachments.bring(file, 'picture').subscribe({
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
