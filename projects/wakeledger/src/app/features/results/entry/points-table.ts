import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { type FormArray, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { formPulse } from '../../../core/editing/form-pulse';
import { NumberField } from '../../../ui/field/number-field';
import {
  type DecimalMark,
  POINT_COLUMNS,
  type TypedPoint,
  decimalMarkOf,
  isTable,
  pastedPoints,
  readCell,
} from './pasted-points';
import { pointForm, type PointForm } from './result-form';

interface Waiting {
  readonly points: readonly TypedPoint[];
  readonly from: number;
  readonly example: string;
}

/** The readings of a result, one row each; a table copied from a spreadsheet can be pasted into any of its cells. */
@Component({
  selector: 'wl-points-table',
  imports: [NumberField, ReactiveFormsModule],
  templateUrl: './points-table.html',
  styleUrl: './points-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PointsTable {
  readonly points = input.required<FormArray<PointForm>>();
  readonly valueWords = input.required<string>();
  readonly unit = input.required<string>();
  readonly speedUnit = input.required<string>();
  /** Whether a tare still is in the force and may differ from point to point. */
  readonly withTare = input(false);

  private readonly builder = inject(NonNullableFormBuilder);
  private readonly pulse = formPulse(this.points);
  protected readonly detailed = signal(false);
  /** A pasted table whose decimal mark cannot be told. */
  protected readonly waiting = signal<Waiting | undefined>(undefined);
  /** How many pasted cells were no numbers. */
  protected readonly unread = signal(0);

  protected rows(): readonly PointForm[] {
    this.pulse();
    return this.points().controls;
  }

  protected groupError(): string | undefined {
    this.pulse();
    return this.points().errors?.['server'] as string | undefined;
  }

  protected add(): void {
    this.points().push(pointForm(this.builder));
    this.points().markAsDirty();
  }

  protected remove(position: number): void {
    this.points().removeAt(position);
    this.points().markAsDirty();
  }

  /** One figure goes into its field as usual; a table fills rows from this one on. */
  protected paste(event: ClipboardEvent, from: number): void {
    const text = event.clipboardData?.getData('text/plain') ?? '';
    if (!isTable(text)) return;
    event.preventDefault();
    const points = pastedPoints(text);
    const mark = decimalMarkOf(points);
    if (mark !== 'unclear') {
      this.fill(points, from, mark);
      return;
    }
    const example = points.flatMap((point) => Object.values(point)).find((cell) => /[.,]/.test(cell)) ?? '';
    this.waiting.set({ points, from, example });
  }

  protected settle(mark: DecimalMark): void {
    const waiting = this.waiting();
    if (waiting) this.fill(waiting.points, waiting.from, mark);
  }

  /** The other reading of the example: its mark sets off thousands. */
  protected otherMark(example: string): DecimalMark {
    return example.includes('.') ? ',' : '.';
  }

  protected ownMark(example: string): DecimalMark {
    return example.includes('.') ? '.' : ',';
  }

  protected readAs(example: string, mark: DecimalMark): string {
    return String(readCell(example, mark) ?? example);
  }

  private fill(pasted: readonly TypedPoint[], from: number, mark: DecimalMark | 'either'): void {
    const points = this.points();
    let unread = 0;
    pasted.forEach((typed, offset) => {
      while (points.length <= from + offset) points.push(pointForm(this.builder));
      const row = points.at(from + offset);
      for (const column of POINT_COLUMNS) {
        const text = typed[column];
        if (text === undefined) continue;
        const value = readCell(text, mark);
        if (value === null) unread += 1;
        row.controls[column].setValue(value);
      }
    });
    if (pasted.some((typed) => typed.speedKmh !== undefined || typed.tareN !== undefined)) {
      this.detailed.set(true);
    }
    this.unread.set(unread);
    this.waiting.set(undefined);
    points.markAsDirty();
  }
}
