import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  inject,
  runInInjectionContext,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import type { Adjustment } from '#shared/contracts/adjustments';
import { asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { AdjustmentsApi } from '../../data/adjustments/adjustments-api';
import { AttachmentsApi } from '../../data/attachments/attachments-api';
import { Busy } from '../../ui/busy/busy';
import { conditionItemWord } from '../../ui/condition/condition-words';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { differenceWords, shapeWords, worthWords } from './adjustment-words';

/** What is a difference of the test condition worth? In the order in which the first that fits is used. */
@Component({
  selector: 'wl-adjustment-list-page',
  imports: [Busy, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './adjustment-list-page.html',
  styleUrl: './adjustment-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AdjustmentListPage {
  private readonly api = inject(AdjustmentsApi);
  private readonly attachments = inject(AttachmentsApi);
  private readonly session = inject(Session);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);

  protected readonly mayEdit = computed(() => this.session.may('adjustments.edit'));
  private readonly mayReadEvidence = computed(() => this.session.may('results.read'));
  protected readonly adjustments = rxResource({ stream: () => this.api.list() });
  private readonly known = computed(() => (this.adjustments.hasValue() ? this.adjustments.value() : []));
  protected readonly ready = computed(() => this.adjustments.hasValue());
  protected readonly problem = computed(() => {
    const error = this.adjustments.error();
    return error === undefined ? undefined : asApiProblem(error);
  });
  protected readonly rows = computed(() =>
    this.known()
      .filter(({ retiredAt }) => retiredAt === undefined)
      .map((adjustment) => this.row(adjustment)),
  );
  protected readonly retired = computed(() =>
    this.known()
      .filter(({ retiredAt }) => retiredAt !== undefined)
      .map((adjustment) => this.row(adjustment)),
  );

  protected async retire(adjustment: Adjustment): Promise<void> {
    const { name } = adjustment;
    const confirmed = await runInInjectionContext(this.injector, () =>
      confirmInDialog({
        title: $localize`Retire ${name}:NAME:?`,
        detail: $localize`Results that only this adjustment makes comparable stay out of every ranking again. What was adopted with it keeps its figures, and it can be brought back at any time.`,
        confirm: $localize`Retire`,
        cancel: $localize`Keep it`,
        severe: true,
      }),
    );
    if (confirmed) this.setRetired(adjustment, true);
  }

  protected setRetired(adjustment: Adjustment, retired: boolean): void {
    const { name } = adjustment;
    this.api.retire(adjustment, retired).subscribe({
      next: (saved) => {
        this.undo.offer(
          retired ? $localize`${name}:NAME: is retired.` : $localize`${name}:NAME: is back.`,
          () => this.setRetired(saved, !retired),
        );
        this.adjustments.reload();
      },
      error: (thrown: unknown) => {
        const problem = asApiProblem(thrown);
        this.undo.say(
          problem.code === 'conflict'
            ? $localize`${name}:NAME: was changed meanwhile. Look again, then decide.`
            : problem.message,
        );
        this.adjustments.reload();
      },
    });
  }

  private row(adjustment: Adjustment) {
    const { name, item, degreesOfFreedom, evidence, attachmentId } = adjustment;
    return {
      adjustment,
      item: conditionItemWord(item),
      difference: differenceWords(adjustment, this.preferences.numberLocale()),
      worth: worthWords(adjustment, this.format),
      freedom:
        degreesOfFreedom === undefined
          ? undefined
          : this.format.value(degreesOfFreedom, 'number', { digits: 0 }),
      shapes: shapeWords(adjustment),
      evidence,
      file:
        attachmentId !== undefined && this.mayReadEvidence()
          ? this.attachments.addressOf(attachmentId)
          : undefined,
      fileLabel: $localize`The file behind ${name}:NAME:`,
      retire: $localize`Retire ${name}:NAME:`,
      bringBack: $localize`Bring ${name}:NAME: back`,
    };
  }
}
