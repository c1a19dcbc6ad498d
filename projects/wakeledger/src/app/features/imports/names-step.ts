import {
  ChangeDetectionStrategy,
  Component,
  effect,
  inject,
  input,
  linkedSignal,
  output,
  signal,
  untracked,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { Facility } from '#shared/contracts/facilities';
import type { ImportDetail } from '#shared/contracts/imports';
import { BODY_SHAPES, type Variant } from '#shared/contracts/variants';
import { asApiProblem } from '../../core/api/api-problem';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { VariantsApi } from '../../data/variants/variants-api';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';
import { ImportInView } from './import-in-view';
import {
  facilityDrafts,
  troubleOf,
  variantDrafts,
  withNames,
  type BodyShape,
  type FacilityDraft,
  type VariantDraft,
} from './names-draft';

/** Who is meant: names in the file that the programme does not know are matched, created or skipped. */
@Component({
  selector: 'wl-names-step',
  imports: [RouterLink],
  templateUrl: './names-step.html',
  styleUrl: './names-step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NamesStep {
  readonly detail = input.required<ImportDetail>();
  readonly checked = output();

  protected readonly view = inject(ImportInView);
  private readonly variantsApi = inject(VariantsApi);
  private readonly facilitiesApi = inject(FacilitiesApi);

  protected readonly variants = signal<readonly Variant[]>([]);
  protected readonly facilities = signal<readonly Facility[]>([]);
  protected readonly drafts = linkedSignal(() => variantDrafts(this.detail()));
  protected readonly places = linkedSignal(() => facilityDrafts(this.detail()));
  protected readonly shapes = BODY_SHAPES.map((shape) => ({ shape, words: BODY_SHAPE_NAMES[shape] }));
  /** Set once the person tried to go on: only then are gaps named. */
  protected readonly tried = signal(false);
  protected readonly trouble = troubleOf;

  constructor() {
    effect(() => {
      const { programmeId } = this.detail();
      untracked(() => void this.load(programmeId));
    });
  }

  protected change(text: string, change: Partial<VariantDraft>): void {
    this.drafts.update((drafts) =>
      drafts.map((draft) => (draft.text === text ? { ...draft, ...change } : draft)),
    );
  }

  protected act(text: string, action: string): void {
    const known = (['open', 'match', 'create', 'skip'] as const).find((each) => each === action);
    if (known) this.change(text, { action: known });
  }

  protected shape(text: string, shape: string): void {
    const bodyShape: BodyShape | undefined = BODY_SHAPES.find((each) => each === shape);
    if (bodyShape) this.change(text, { bodyShape });
  }

  protected place(text: string, facilityId: string): void {
    this.places.update((places: readonly FacilityDraft[]) =>
      places.map((place) => (place.text === text ? { ...place, facilityId } : place)),
    );
  }

  protected async check(): Promise<void> {
    this.tried.set(true);
    if (this.view.busy() || this.drafts().some((draft) => troubleOf(draft) !== undefined)) return;
    if (await this.view.map(withNames(this.detail().mapping, this.drafts(), this.places())))
      this.checked.emit();
  }

  private async load(programmeId: string): Promise<void> {
    try {
      const variants = await firstValueFrom(this.variantsApi.list(programmeId));
      this.variants.set(variants.filter(({ retiredAt }) => retiredAt === undefined));
      const facilities = await firstValueFrom(this.facilitiesApi.list());
      this.facilities.set(facilities.filter(({ retiredAt }) => retiredAt === undefined));
    } catch (error) {
      this.view.problem.set(asApiProblem(error));
    }
  }
}
