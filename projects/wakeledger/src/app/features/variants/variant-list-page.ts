import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  effect,
  inject,
  input,
  runInInjectionContext,
  untracked,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import type { Variant } from '#shared/contracts/variants';
import { Undo } from '../../core/editing/undo';
import { problemWords } from '../../core/errors/problem-words';
import { Session } from '../../core/session/session';
import { AttachmentsApi } from '../../data/attachments/attachments-api';
import { VariantFormPageActions, VariantListPageActions } from '../../data/variants/variants.actions';
import { variantsFeature } from '../../data/variants/variants.feature';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { Picture } from '../../ui/picture/picture';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';
import { confirmRetirement } from './confirm-retirement';
import { bodyDimensions } from './body-dimensions';
import { AREA_METHOD_WORDS, configurationWords, standingArea } from './variant-words';

/** Which variants does this programme compare? Each with its picture, dimensions, frontal area and configurations. */
@Component({
  selector: 'wl-variant-list-page',
  imports: [Busy, DatePipe, EmptyState, Picture, ProblemBanner, RouterLink],
  templateUrl: './variant-list-page.html',
  styleUrl: './variant-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VariantListPage {
  readonly programmeId = input.required<string>();

  private readonly store = inject(Store);
  private readonly undo = inject(Undo);
  private readonly format = inject(QuantityFormat);
  private readonly injector = inject(Injector);
  private readonly attachments = inject(AttachmentsApi);
  protected readonly mayEdit = computed(() => this.session.may('variants.edit'));
  private readonly session = inject(Session);

  protected readonly loading = this.store.selectSignal(variantsFeature.selectLoading);
  private readonly saving = this.store.selectSignal(variantsFeature.selectSaving);
  private readonly active = this.store.selectSignal(variantsFeature.selectActive);
  private readonly retired = this.store.selectSignal(variantsFeature.selectRetired);
  protected readonly problem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });

  /** One scale for all pictures, so that a longer car is drawn longer. */
  protected readonly longestMm = computed(() =>
    Math.max(...[...this.active(), ...this.retired()].map((each) => bodyDimensions(each).lengthMm)),
  );
  protected readonly rows = computed(() => this.active().map((variant) => this.row(variant)));
  protected readonly retiredRows = computed(() => this.retired().map((variant) => this.row(variant)));

  constructor() {
    effect(() => {
      const programmeId = this.programmeId();
      untracked(() => this.store.dispatch(VariantListPageActions.opened({ programmeId })));
    });
    effect(() => {
      const saving = this.saving();
      untracked(() => {
        if (saving.kind === 'saved') this.offerUndo(saving.entity);
        if (saving.kind === 'refused') this.undo.say(problemWords(saving.problem).title);
        if (saving.kind === 'conflict') {
          this.undo.say(
            $localize`${saving.theirs.name}:NAME: was changed meanwhile. Look again, then decide.`,
          );
        }
        if (saving.kind !== 'idle' && saving.kind !== 'saving') {
          this.store.dispatch(VariantFormPageActions.outcomeSeen());
        }
      });
    });
  }

  protected retry(): void {
    this.store.dispatch(VariantListPageActions.askedAgain({ programmeId: this.programmeId() }));
  }

  protected async retire(variant: Variant): Promise<void> {
    const confirmed = await runInInjectionContext(this.injector, () => confirmRetirement(variant));
    if (confirmed)
      this.store.dispatch(VariantListPageActions.retirementConfirmed({ variant, retired: true }));
  }

  protected bringBack(variant: Variant): void {
    this.store.dispatch(VariantListPageActions.retirementConfirmed({ variant, retired: false }));
  }

  private offerUndo(variant: Variant): void {
    const wasRetired = variant.retiredAt !== undefined;
    this.undo.offer(
      wasRetired
        ? $localize`${variant.name}:NAME: is retired.`
        : $localize`${variant.name}:NAME: is back in the programme.`,
      () =>
        this.store.dispatch(VariantListPageActions.retirementConfirmed({ variant, retired: !wasRetired })),
    );
  }

  private row(variant: Variant) {
    const area = standingArea(variant.frontalAreas);
    return {
      variant,
      retire: $localize`Retire ${variant.name}:NAME:`,
      bringBack: $localize`Bring ${variant.name}:NAME: back`,
      body: [BODY_SHAPE_NAMES[variant.bodyShape], variant.description ?? '']
        .filter((part) => part)
        .join(' · '),
      picture:
        variant.pictureAttachmentId === undefined
          ? undefined
          : this.attachments.addressOf(variant.pictureAttachmentId),
      dimensions: bodyDimensions(variant),
      size: this.size(variant),
      wheelbase:
        variant.wheelbaseMm === undefined ? undefined : this.format.text(variant.wheelbaseMm, 'length'),
      area: area && {
        figure: this.format.text(area.areaM2, 'area'),
        u: this.format.text(area.uM2, 'area'),
        method: AREA_METHOD_WORDS[area.method],
        date: area.date,
      },
      configurations: variant.configurations.map((each) => configurationWords(each, this.format)),
    };
  }

  /** In whole millimetres, which are what drawings carry. */
  private size({ lengthMm, widthMm, heightMm }: Variant): string | undefined {
    const parts = [lengthMm, widthMm, heightMm];
    if (parts.every((part) => part === undefined)) return undefined;
    const texts = parts.map((part) => (part === undefined ? '–' : this.format.value(part, 'length')));
    return `${texts.join(' × ')}\u202fmm`;
  }
}
