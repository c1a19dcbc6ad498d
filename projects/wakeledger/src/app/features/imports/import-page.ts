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
import { Router, RouterLink } from '@angular/router';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { Busy } from '../../ui/busy/busy';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { ColumnsStep } from './columns-step';
import { ImportInView } from './import-in-view';
import { NamesStep } from './names-step';
import { RowsStep } from './rows-step';
import { StoredStep } from './stored-step';
import { WhenWords } from './when-words';

const STEPS = ['columns', 'names', 'rows', 'stored'] as const;
type Step = (typeof STEPS)[number];

const STEP_WORDS: Readonly<Record<Step, string>> = {
  columns: $localize`1 Columns`,
  names: $localize`2 Names`,
  rows: $localize`3 Rows`,
  stored: $localize`4 Stored`,
};

/** One import, step by step. Its state decides how far one can go; the address says where one is. */
@Component({
  selector: 'wl-import-page',
  imports: [Busy, ColumnsStep, NamesStep, ProblemBanner, RouterLink, RowsStep, StoredStep, WhenWords],
  templateUrl: './import-page.html',
  styleUrl: './import-page.scss',
  providers: [ImportInView],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  readonly programmeId = input.required<string>();
  readonly importId = input.required<string>();
  /** From the address. */
  readonly step = input<string>();

  private readonly injector = inject(Injector);
  private readonly router = inject(Router);
  protected readonly view = inject(ImportInView);
  protected readonly detail = this.view.detail;

  /** Farthest step that the state allows. */
  private readonly farthest = computed<Step>(() => {
    const detail = this.detail();
    if (!detail || detail.state === 'mapping' || detail.state === 'failed') return 'columns';
    if (detail.state === 'stored' || detail.state === 'withdrawn' || detail.state === 'cancelled')
      return 'stored';
    return 'rows';
  });
  protected readonly current = computed<Step>(() => {
    const farthest = this.farthest();
    if (farthest !== 'rows') return farthest;
    const asked = STEPS.find((step) => step === this.step());
    if (asked !== undefined && asked !== 'stored') return asked;
    return this.openNames() > 0 ? 'names' : 'rows';
  });
  /** Names that the programme does not know and nobody has decided on. */
  private readonly openNames = computed(() => {
    const detail = this.detail();
    if (!detail) return 0;
    const decided = new Set(detail.mapping.variants.map(({ text }) => text.toLowerCase()));
    const placed = new Set(detail.mapping.facilities.map(({ text }) => text.toLowerCase()));
    return (
      detail.unknownVariants.filter(({ text }) => !decided.has(text.toLowerCase())).length +
      detail.unknownFacilities.filter(({ text }) => !placed.has(text.toLowerCase())).length
    );
  });
  protected readonly steps = computed(() => {
    const farthest = this.farthest();
    const open = farthest === 'rows' && !this.view.runs();
    return STEPS.map((step) => ({
      step,
      words: STEP_WORDS[step],
      current: step === this.current(),
      reachable: open && step !== 'stored',
      open: step === 'names' ? this.openNames() : 0,
    }));
  });

  constructor() {
    effect(() => {
      const [programmeId, importId] = [this.programmeId(), this.importId()];
      untracked(() => void this.view.open(programmeId, importId));
    });
  }

  /** After a check, the step that comes next is the state's to decide. */
  protected goOn(step?: Step): void {
    void this.router.navigate([], { queryParams: step === undefined ? {} : { step } });
  }

  protected async discard(): Promise<void> {
    const sure = await runInInjectionContext(this.injector, () =>
      confirmInDialog({
        title: $localize`Lay this import aside?`,
        detail: $localize`Its rows and what you mended in them are removed. Nothing of it has been stored.`,
        confirm: $localize`Lay aside`,
        cancel: $localize`Keep it`,
        severe: true,
      }),
    );
    if (sure && (await this.view.discard()))
      await this.router.navigate(['/programmes', this.programmeId(), 'import']);
  }
}
