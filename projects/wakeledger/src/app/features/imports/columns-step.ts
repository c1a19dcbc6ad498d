import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { IMPORT_FIELD_NAMES, importFieldRule, type ImportField } from '#shared/contracts/import-fields';
import { DATE_ORDERS, DECIMALS, type ImportDetail } from '#shared/contracts/imports';
import { AIR_STATES } from '#shared/contracts/condition';
import {
  askedConstants,
  draftOf,
  freeConstants,
  mappingOf,
  withColumn,
  withConstant,
  withUnit,
} from './column-draft';
import { ImportInView } from './import-in-view';
import { DATE_ORDER_WORDS, DECIMAL_WORDS, FIELD_WORDS, sheetWords } from './import-words';

/** Which column holds what, in which unit, and what holds for all rows. */
@Component({
  selector: 'wl-columns-step',
  templateUrl: './columns-step.html',
  styleUrl: './columns-step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnsStep {
  readonly detail = input.required<ImportDetail>();
  readonly checked = output();

  protected readonly view = inject(ImportInView);
  protected readonly words = FIELD_WORDS;
  protected readonly decimals = DECIMALS.map((value) => ({ value, words: DECIMAL_WORDS[value] }));
  protected readonly dateOrders = DATE_ORDERS.map((value) => ({ value, words: DATE_ORDER_WORDS[value] }));
  protected readonly fields = IMPORT_FIELD_NAMES.map((field) => ({ field, words: FIELD_WORDS[field] }));

  protected readonly draft = linkedSignal(() => draftOf(this.detail()));
  /** Fields whose value for all rows a person asked to give. */
  protected readonly constants = computed(() => {
    const draft = this.draft();
    return askedConstants(draft).map((field) => {
      const given = draft.constants.find((constant) => constant.field === field);
      return {
        field,
        words: FIELD_WORDS[field],
        text: given?.text ?? '',
        unit: given?.unit ?? '',
        units: this.unitsOf(field),
        choices: choicesOf(field),
        date: importFieldRule(field).kind === 'date',
      };
    });
  });
  protected readonly free = computed(() =>
    freeConstants(this.draft()).map((field) => ({ field, words: FIELD_WORDS[field] })),
  );
  /** Problems of this step, by where they point. */
  protected readonly issues = computed(
    () => new Map(this.view.problem()?.issues.map(({ where, detail }) => [where, detail]) ?? []),
  );

  protected readonly sheets = computed(() =>
    (this.detail().sheets ?? []).map((sheet, place) => ({
      place,
      hasTable: sheet.hasTable,
      words: sheetWords(sheet),
    })),
  );

  protected async chooseSheet(place: string): Promise<void> {
    if (!this.view.busy()) await this.view.chooseSheet(Number(place));
  }

  protected unitsOf(field: ImportField | ''): readonly string[] {
    return field === '' ? [] : (importFieldRule(field).units?.map(({ unit }) => unit) ?? []);
  }

  protected isTaken(field: ImportField, index: number): boolean {
    return this.draft().columns.some((column, place) => place !== index && column.field === field);
  }

  protected choose(index: number, field: string): void {
    const chosen = IMPORT_FIELD_NAMES.find((known) => known === field) ?? '';
    this.draft.update((draft) => withColumn(draft, index, chosen));
  }

  protected chooseUnit(index: number, unit: string): void {
    this.draft.update((draft) => withUnit(draft, index, unit));
  }

  protected setConstant(
    field: ImportField,
    change: { readonly text?: string; readonly unit?: string },
  ): void {
    this.draft.update((draft) => withConstant(draft, field, change));
  }

  protected addConstant(field: string): void {
    const chosen = IMPORT_FIELD_NAMES.find((known) => known === field);
    if (chosen) this.setConstant(chosen, {});
  }

  protected setDecimal(text: string): void {
    this.draft.update((draft) => ({ ...draft, decimal: DECIMALS.find((value) => value === text) }));
  }

  protected setDateOrder(text: string): void {
    this.draft.update((draft) => ({ ...draft, dateOrder: DATE_ORDERS.find((value) => value === text) }));
  }

  protected async check(): Promise<void> {
    if (this.view.busy()) return;
    if (await this.view.map(mappingOf(this.draft(), this.detail().mapping))) this.checked.emit();
  }
}

function choicesOf(field: ImportField): readonly string[] {
  const { kind, words } = importFieldRule(field);
  if (kind === 'yes-no') return ['yes', 'no'];
  if (kind === 'air-state') return AIR_STATES;
  return words ?? [];
}
