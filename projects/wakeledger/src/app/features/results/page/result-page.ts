import { DatePipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { traceOfReduction } from '#shared/core/derivation/trace-of-figure';
import type { JudgementFields } from '#shared/contracts/judgements';
import type { ApiProblem } from '../../../core/api/api-problem';
import { Undo } from '../../../core/editing/undo';
import { Preferences } from '../../../core/preferences/preferences';
import { Session } from '../../../core/session/session';
import { facilitiesFeature } from '../../../data/facilities/facilities.feature';
import { policiesFeature } from '../../../data/policies/policies.feature';
import type { EvidenceDecision } from '../../../data/results/evidence-decision';
import { ResultPageActions } from '../../../data/results/results.actions';
import { resultsFeature } from '../../../data/results/results.feature';
import { variantsFeature } from '../../../data/variants/variants.feature';
import { Busy } from '../../../ui/busy/busy';
import { compareConditions } from '../../../ui/condition/compare-conditions';
import { DerivationOpener } from '../../../ui/derivation-sheet/derivation-sheet';
import { derivationFromTrace } from '../../../ui/derivation-sheet/from-trace';
import { ProblemBanner } from '../../../ui/problem-banner/problem-banner';
import { Checks } from '../../../ui/checks/checks';
import { machWords, reynoldsWords } from '../../../ui/checks/check-figures';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { FACILITY_KIND_WORDS } from '../../../ui/words/evidence-words';
import { CHECK_INKS, CHECK_SHAPES, CHECK_WORDS, checkOf } from '../result-check';
import type { OfferedResult } from '../adoption/adoption-dialog';
import { offeredResults } from '../adoption/offered-results';
import { doneWords } from '../done-words';
import { heldOf, judgementOrder } from '../judgement/judgement-order';
import { ReynoldsSection } from '../sweep/reynolds-section';
import { AttachmentLine } from './attachment-line';
import { pointRows, pointColumns } from './point-rows';
import { rawLines } from './raw-lines';
import { ResultDeeds } from './result-deeds';
import { ResultStory } from './result-story';
import { STATE_SHAPES, STATE_WORDS } from './state-words';
import { YawChart } from './yaw-chart';

const VERDICT_WORDS = {
  same: $localize`● the same`,
  differs: $localize`▲ differs`,
  'not-stated': $localize`▲ not stated, counts as different`,
  'not-compared': $localize`not compared`,
} as const;

/** What does this result say? Raw values, derivation, checks, attachment, adoption and withdrawal. */
@Component({
  selector: 'wl-result-page',
  imports: [
    AttachmentLine,
    Busy,
    Checks,
    DatePipe,
    ProblemBanner,
    ResultDeeds,
    ResultStory,
    ReynoldsSection,
    RouterLink,
    YawChart,
  ],
  templateUrl: './result-page.html',
  styleUrl: './result-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultPage {
  readonly programmeId = input.required<string>();
  readonly resultId = input.required<string>();

  private readonly store = inject(Store);
  private readonly undo = inject(Undo);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);
  private readonly derivations = inject(DerivationOpener);
  private readonly session = inject(Session);

  protected readonly mayJudge = computed(() => this.session.may('results.judge'));
  protected readonly loading = this.store.selectSignal(resultsFeature.selectLoading);
  private readonly results = this.store.selectSignal(resultsFeature.selectResults);
  private readonly adoptions = this.store.selectSignal(resultsFeature.selectAdoptions);
  protected readonly standing = this.store.selectSignal(resultsFeature.selectStanding);
  private readonly programme = this.store.selectSignal(resultsFeature.selectProgramme);
  private readonly reduced = this.store.selectSignal(resultsFeature.selectReduced);
  private readonly inputs = this.store.selectSignal(resultsFeature.selectInputs);
  private readonly deed = this.store.selectSignal(resultsFeature.selectDeed);
  private readonly variants = this.store.selectSignal(variantsFeature.selectById);
  private readonly facilities = this.store.selectSignal(facilitiesFeature.selectById);
  private readonly limits = this.store.selectSignal(policiesFeature.selectLimits);

  protected readonly busy = computed(() => this.deed().kind === 'under-way');
  protected readonly refusal = signal<ApiProblem | undefined>(undefined);
  protected readonly loadingProblem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  protected readonly result = computed(() => this.results().find(({ id }) => id === this.resultId()));
  protected readonly variant = computed(() => this.variants().get(this.result()?.variantId ?? ''));
  protected readonly facility = computed(() => {
    const found = this.facilities().get(this.result()?.facilityId ?? '');
    return found && { ...found, words: FACILITY_KIND_WORDS[found.kind] };
  });
  protected readonly reduction = computed(() => {
    const result = this.result();
    return result?.withdrawn ? undefined : this.reduced().reductions.get(this.resultId());
  });
  protected readonly figure = computed(() => {
    const output = this.reduction()?.output;
    if (!output) return undefined;
    const { zeroYaw } = output;
    return {
      value: this.format.value(zeroYaw.dragAreaM2, 'drag-area'),
      u: this.format.value(zeroYaw.expandedUncertaintyM2, 'drag-area'),
      reynolds: reynoldsWords(output.reynolds, this.format),
      mach: machWords(output.mach, this.format),
      blockage:
        output.blockageRatio === null
          ? undefined
          : this.format.text(output.blockageRatio * 100, 'percent', { digits: 1 }),
      windAveraged:
        output.windAveragedDragAreaM2 === null
          ? undefined
          : this.format.text(output.windAveragedDragAreaM2, 'drag-area'),
    };
  });
  protected readonly verdict = computed(() => {
    const result = this.result();
    if (!result) return undefined;
    const { context, refused, refusal } = this.reduced();
    const check = checkOf(
      result,
      {
        context,
        reduction: this.reduction(),
        refused: refused.get(result.id),
        unchecked: refusal?.detail,
        limits: this.limits(),
        bodyShape: this.variant()?.bodyShape,
      },
      { format: this.format, locale: this.preferences.numberLocale() },
    );
    return {
      ...check,
      words: CHECK_WORDS[check.state],
      shape: CHECK_SHAPES[check.state],
      ink: CHECK_INKS[check.state],
    };
  });
  protected readonly raw = computed(() => {
    const result = this.result();
    return result ? rawLines(result, this.format) : [];
  });
  protected readonly points = computed(() => {
    const result = this.result();
    return result
      ? { columns: pointColumns(result), rows: pointRows(result, this.reduction(), this.format) }
      : { columns: [], rows: [] };
  });
  /** The result as the method reads it. */
  protected readonly input = computed(() => this.inputs()?.results.find(({ id }) => id === this.resultId()));
  protected readonly held = computed(() => {
    const result = this.result();
    return result && heldOf(result, this.input());
  });
  /** What the way to the reference Reynolds number is looked for with; not for a result that counts for nothing. */
  protected readonly reynolds = computed(() => {
    const inputs = this.inputs();
    const { context } = this.reduced();
    const held = this.held();
    if (inputs === null || context === null || held === undefined || this.result()?.withdrawn)
      return undefined;
    return { inputs, context, held: held.reynolds };
  });
  protected readonly notComparable = computed(
    () => this.reduction()?.output.excludedBy.includes('not-comparable') ?? false,
  );
  protected readonly standingOf = computed(() => {
    const result = this.result();
    return result && { words: STATE_WORDS[result.state], shape: STATE_SHAPES[result.state] };
  });
  protected readonly nameOf = computed(() => {
    const names = new Map(this.results().map(({ id, name }) => [id, name]));
    return (resultId: string) => names.get(resultId) ?? '';
  });
  /** The variant’s results that stand, newest first, for a choice among them. */
  protected readonly offered = computed<readonly OfferedResult[]>(() => {
    const variantId = this.result()?.variantId;
    return offeredResults(
      this.results().filter((each) => each.variantId === variantId),
      this.reduced().reductions,
      (facilityId) => this.facilities().get(facilityId)?.name ?? '',
      this.format,
    );
  });
  protected readonly isSweep = computed(
    () => new Set(this.result()?.points.map(({ yawDeg }) => yawDeg)).size > 1,
  );
  protected readonly condition = computed(() => {
    const result = this.result();
    const programme = this.programme();
    if (!result || !programme) return [];
    return compareConditions(
      programme.referenceCondition,
      result.condition,
      this.preferences.numberLocale(),
    ).map((row) => ({
      ...row,
      says: VERDICT_WORDS[row.verdict],
      ink: row.verdict === 'same' ? 'wl-moss' : row.verdict === 'not-compared' ? '' : 'wl-rust',
    }));
  });
  /** The result that the variant rests on now, if it is another one. */
  protected readonly replaced = computed(() => {
    const result = this.result();
    const adoptedIds = (result && this.standing().get(result.variantId)?.resultIds) ?? [];
    return result === undefined || adoptedIds.includes(result.id)
      ? undefined
      : this.results().find(({ id }) => adoptedIds.includes(id));
  });
  protected readonly history = computed(() => {
    const variantId = this.result()?.variantId;
    return this.adoptions()
      .filter((each) => each.variantId === variantId)
      .map((each) => ({
        ...each,
        results: this.results().filter(({ id }) => each.resultIds.includes(id)),
      }));
  });

  constructor() {
    effect(() => {
      const programmeId = this.programmeId();
      untracked(() => this.store.dispatch(ResultPageActions.opened({ programmeId })));
    });
    effect(() => {
      const deed = this.deed();
      untracked(() => {
        if (deed.kind === 'none' || deed.kind === 'under-way') return;
        this.store.dispatch(ResultPageActions.outcomeSeen());
        if (deed.kind === 'refused') this.onRefused(deed.problem);
        if (deed.kind === 'decided') this.undo.say(doneWords(deed.done, this.result()?.name ?? ''));
      });
    });
  }

  protected openDerivation(): void {
    const reduction = this.reduction();
    const { context } = this.reduced();
    const result = this.result();
    if (!reduction || !context || !result) return;
    const names = new Map(
      [...this.variants().values(), ...this.facilities().values(), ...this.results()].map(
        ({ id, name }) => [id, name] as const,
      ),
    );
    const trace = traceOfReduction(reduction, context, 'zero-yaw', names);
    const summary = $localize`${result.name}:RESULT:, ${this.variant()?.name ?? ''}:VARIANT:, ${this.facility()?.name ?? ''}:FACILITY:, tested ${result.testDate}:DATE:. At the programme’s reference, zero yaw; k = ${this.format.value(trace.coverageFactor, 'number', { digits: 2 })}:K:.`;
    this.derivations.open(derivationFromTrace(trace, summary, this.format));
  }

  protected judge(changes: Partial<JudgementFields>): void {
    const result = this.result();
    if (result) this.decide({ kind: 'judge', judgements: [judgementOrder(result, this.input(), changes)] });
  }

  protected decide(decision: EvidenceDecision): void {
    this.refusal.set(undefined);
    this.store.dispatch(ResultPageActions.decisionConfirmed({ programmeId: this.programmeId(), decision }));
  }

  /** A colleague chose meanwhile: show what stands now, and let the person decide again. */
  private onRefused(problem: ApiProblem): void {
    this.refusal.set(problem);
    if (problem.code === 'conflict' || problem.code === 'wrong-state') {
      this.store.dispatch(ResultPageActions.opened({ programmeId: this.programmeId() }));
    }
  }
}
