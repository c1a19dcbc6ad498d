import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  Injector,
  afterNextRender,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import {
  type AbstractControl,
  NonNullableFormBuilder,
  ReactiveFormsModule,
  Validators,
} from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import type { Correlation, CorrelationPair, CorrelationReplaces } from '#shared/contracts/correlations';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { formPulse } from '../../core/editing/form-pulse';
import { focusFirstFault, revealErrors } from '../../core/editing/reveal-errors';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { CorrelationsApi } from '../../data/correlations/correlations-api';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { Busy } from '../../ui/busy/busy';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { REPLACED_STEPS, refusalWords } from './correlation-words';
import { FitPanel } from './fit-panel';
import { fittedPairs } from './fitted-pairs';
import { HandPair } from './hand-pair';
import { lacksReason, pairDrafts, pairsOfDrafts, sharedResults, type PairDecision } from './pair-drafts';
import { PairTable } from './pair-table';

/** Which pairs bring one facility to another? A new correlation, or the next version of one. */
@Component({
  selector: 'wl-correlation-form-page',
  imports: [
    Busy,
    Field,
    FitPanel,
    HandPair,
    PairTable,
    ProblemBanner,
    ReactiveFormsModule,
    RouterLink,
    WlInput,
  ],
  templateUrl: './correlation-form-page.html',
  styleUrl: './correlations.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CorrelationFormPage implements HoldsChanges {
  /** Absent: a new correlation; else the next version of this one. */
  readonly correlationId = input<string>();

  private readonly api = inject(CorrelationsApi);
  private readonly facilitiesApi = inject(FacilitiesApi);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  protected readonly form = this.builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    facilityId: ['', [Validators.required]],
    referenceFacilityId: ['', [Validators.required]],
    comment: ['', [Validators.required, Validators.minLength(3), Validators.maxLength(1000)]],
  });
  private readonly pulse = formPulse(signal(this.form));
  private readonly value = computed(() => (this.pulse(), this.form.getRawValue()));
  protected readonly replaces = signal<readonly CorrelationReplaces[]>([]);
  protected readonly steps = REPLACED_STEPS;
  private readonly decisions = signal<ReadonlyMap<string, PairDecision>>(new Map());
  private readonly byHand = signal<readonly CorrelationPair[]>([]);
  private readonly changed = signal(false);
  protected readonly strict = signal(false);
  protected readonly busy = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);

  private readonly facilities = rxResource({ stream: () => this.facilitiesApi.list() });
  protected readonly choices = computed(() =>
    (this.facilities.hasValue() ? this.facilities.value() : []).filter(
      ({ id, retiredAt }) => retiredAt === undefined || id === this.value().facilityId,
    ),
  );
  private readonly existing = rxResource({
    params: () => this.correlationId(),
    stream: ({ params }) => this.api.read(params),
  });
  protected readonly base = computed<Correlation | undefined>(() =>
    this.existing.hasValue() ? this.existing.value() : undefined,
  );
  private readonly question = computed(
    () => {
      const { facilityId, referenceFacilityId } = this.value();
      return facilityId === '' || referenceFacilityId === '' || facilityId === referenceFacilityId
        ? undefined
        : { facilityId, referenceFacilityId, replaces: this.replaces() };
    },
    { equal: (one, other) => JSON.stringify(one) === JSON.stringify(other) },
  );
  protected readonly candidates = rxResource({
    params: () => this.question(),
    stream: ({ params }) => this.api.pairs(params),
  });
  protected readonly asked = computed(() => this.question() !== undefined);
  protected readonly refused = computed(() =>
    this.candidates.hasValue() ? this.candidates.value().refused : [],
  );
  protected readonly drafts = computed(() =>
    pairDrafts(
      this.candidates.hasValue() ? this.candidates.value().pairs : [],
      this.base()?.versions[0]?.pairs ?? [],
      this.byHand(),
      this.decisions(),
    ),
  );
  protected readonly shared = computed(() => sharedResults(this.drafts()).join(', '));
  protected readonly pairs = computed(() => pairsOfDrafts(this.drafts()));
  protected readonly names = computed(() => {
    const { facilityId, referenceFacilityId } = this.value();
    const name = (id: string): string => this.choices().find((each) => each.id === id)?.name ?? '…';
    return { from: name(facilityId), to: name(referenceFacilityId) };
  });
  protected readonly handLabels = computed(() => ({
    figure: $localize`Drag area in ${this.names().from}:FACILITY:`,
    u: $localize`Its u in ${this.names().from}:FACILITY:`,
    reference: $localize`Drag area in ${this.names().to}:FACILITY:`,
    referenceU: $localize`Its u in ${this.names().to}:FACILITY:`,
  }));
  protected readonly sameFacility = computed(() => {
    const { facilityId, referenceFacilityId } = this.value();
    return facilityId !== '' && facilityId === referenceFacilityId;
  });
  protected readonly loadingProblem = computed(() => {
    const error = this.facilities.error() ?? this.existing.error() ?? this.candidates.error();
    return error === undefined ? undefined : asApiProblem(error);
  });

  /** One key for one wish: sending the same form again after a lost answer does it once. */
  private commandKey = newCommandKey();

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const base = this.base();
      if (base !== undefined) untracked(() => this.begin(base));
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty || this.changed();
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected toggle(step: CorrelationReplaces): void {
    this.changed.set(true);
    this.replaces.update((steps) =>
      steps.includes(step) ? steps.filter((each) => each !== step) : [...steps, step],
    );
  }

  protected decide({ key, decision }: { readonly key: string; readonly decision: PairDecision }): void {
    this.changed.set(true);
    this.decisions.update((decisions) => new Map(decisions).set(key, decision));
  }

  protected add(pair: CorrelationPair): void {
    this.changed.set(true);
    this.byHand.update((pairs) => [...pairs, pair]);
  }

  /** One typed now goes; one of the version before is left out, with a reason. */
  protected remove(key: string): void {
    const typed = this.drafts().find((draft) => draft.key === key)?.pair;
    if (typed !== undefined && this.byHand().includes(typed)) {
      this.byHand.update((pairs) => pairs.filter((pair) => pair !== typed));
    } else {
      this.decide({ key, decision: { included: false, reason: '' } });
    }
  }

  protected save(): void {
    revealErrors(this.form);
    this.strict.set(true);
    const fitted = fittedPairs(this.pairs());
    if (this.form.invalid || this.sameFacility() || this.drafts().some(lacksReason)) {
      this.focusFault();
      return;
    }
    if (fitted.kind === 'refused') {
      this.undo.say(refusalWords(fitted.code));
      return;
    }
    this.send();
  }

  private begin({ name, facilityId, referenceFacilityId, versions }: Correlation): void {
    this.form.reset({ name, facilityId, referenceFacilityId, comment: '' });
    this.form.controls.name.disable();
    this.form.controls.facilityId.disable();
    this.form.controls.referenceFacilityId.disable();
    this.replaces.set(versions[0]?.replaces ?? []);
  }

  private send(): void {
    this.problem.set(undefined);
    this.busy.set(true);
    const { name, facilityId, referenceFacilityId, comment } = this.form.getRawValue();
    const version = { replaces: [...this.replaces()], pairs: this.pairs(), comment: comment.trim() };
    const base = this.base();
    const saved =
      base === undefined
        ? this.api.create({ name: name.trim(), facilityId, referenceFacilityId, ...version }, this.commandKey)
        : this.api.addVersion(base.id, { ...version, basedOnNumber: base.latestNumber }, this.commandKey);
    saved.subscribe({
      next: (correlation) => {
        this.busy.set(false);
        this.form.markAsPristine();
        this.changed.set(false);
        this.undo.say(
          $localize`Version ${correlation.latestNumber}:NUMBER: of ${correlation.name}:NAME: is saved. It is used once it is adopted.`,
        );
        void this.router.navigate(['/correlations', correlation.id]);
      },
      error: (thrown: unknown) => this.onRefused(asApiProblem(thrown)),
    });
  }

  private onRefused(problem: ApiProblem): void {
    this.busy.set(false);
    // A lost answer keeps its key: the same command may have been carried out.
    if (problem.code !== 'no-connection') this.commandKey = newCommandKey();
    this.problem.set(problem);
    showIssues(this.form, problem.issues);
    this.focusFault();
  }

  private focusFault(): void {
    afterNextRender(() => focusFirstFault(this.host), { injector: this.injector });
  }
}
