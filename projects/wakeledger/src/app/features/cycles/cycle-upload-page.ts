import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { firstValueFrom } from 'rxjs';
import { type CycleDetail, SPEED_UNITS, TIME_UNITS } from '#shared/contracts/cycles';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { newCommandKey } from '../../core/api/command-key';
import { Undo } from '../../core/editing/undo';
import { type HoldsChanges, warnBeforeUnload } from '../../core/editing/unsaved-changes';
import { type CycleFile, CyclesApi } from '../../data/cycles/cycles-api';
import { CycleUploadPageActions } from '../../data/cycles/cycles.actions';
import { Busy } from '../../ui/busy/busy';
import { controlError, showIssues } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { CycleFigures } from './cycle-figures';

/** The server takes a little less than 2 MB of text. */
const MOST_CHARACTERS = 1_900_000;

/** Bring in an own trace: choose the file and its units, look at what was read, then store it. */
@Component({
  selector: 'wl-cycle-upload-page',
  imports: [Busy, CycleFigures, Field, ProblemBanner, ReactiveFormsModule, RouterLink, WlInput],
  templateUrl: './cycle-upload-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CycleUploadPage implements HoldsChanges {
  private readonly api = inject(CyclesApi);
  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly undo = inject(Undo);

  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    csv: ['', [Validators.required, Validators.maxLength(MOST_CHARACTERS)]],
    timeUnit: 's' as (typeof TIME_UNITS)[number],
    speedUnit: 'km/h' as (typeof SPEED_UNITS)[number],
    remark: ['', Validators.maxLength(4000)],
  });
  protected readonly timeUnits = TIME_UNITS;
  protected readonly speedUnits = SPEED_UNITS;
  protected readonly error = controlError;
  protected readonly fileName = signal<string | undefined>(undefined);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly busy = signal<'no' | 'checking' | 'storing'>('no');
  /** What the server read, and from which content: a change of the form makes it stale. */
  protected readonly checked = signal<CycleDetail | undefined>(undefined);
  private commandKey = newCommandKey();

  constructor() {
    warnBeforeUnload(() => this.hasUnsavedChanges());
    this.form.valueChanges.subscribe(() => this.checked.set(undefined));
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty;
  }

  protected async take(files: FileList | null): Promise<void> {
    const file = files?.item(0);
    if (!file) return;
    const csv = await readText(file);
    this.fileName.set(file.name);
    this.form.controls.csv.setValue(csv);
    this.form.controls.csv.markAsTouched();
    if (!this.form.controls.name.value) this.form.controls.name.setValue(file.name.replace(/\.[^.]+$/, ''));
    this.form.markAsDirty();
  }

  protected async check(): Promise<void> {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy() !== 'no') return;
    await this.attempt('checking', async () => {
      this.checked.set(await firstValueFrom(this.api.check(this.file())));
      this.commandKey = newCommandKey();
    });
  }

  protected async save(): Promise<void> {
    if (!this.checked() || this.busy() !== 'no') return;
    await this.attempt('storing', async () => {
      const cycle = await firstValueFrom(this.api.store(this.file(), this.commandKey));
      const { timeS: _t, speedKmh: _v, ...summary } = cycle;
      this.store.dispatch(CycleUploadPageActions.stored({ cycle: summary }));
      this.form.markAsPristine();
      this.undo.say($localize`${cycle.name}:NAME: is stored.`);
      await this.router.navigate(['/cycles'], { queryParams: { cycle: cycle.key } });
    });
  }

  private async attempt(what: 'checking' | 'storing', deed: () => Promise<void>): Promise<void> {
    this.busy.set(what);
    this.problem.set(undefined);
    try {
      await deed();
    } catch (error) {
      const problem = asApiProblem(error);
      showIssues(this.form, problem.issues);
      this.problem.set(problem);
    } finally {
      this.busy.set('no');
    }
  }

  private file(): CycleFile {
    const { remark, ...rest } = this.form.getRawValue();
    return { ...rest, name: rest.name.trim(), remark: remark.trim() || undefined };
  }
}

/** The file's text, in UTF-8 or, where a byte-order mark says so, UTF-16. */
async function readText(file: File): Promise<string> {
  const bytes = new Uint8Array(await file.arrayBuffer());
  const encoding =
    bytes[0] === 0xff && bytes[1] === 0xfe
      ? 'utf-16le'
      : bytes[0] === 0xfe && bytes[1] === 0xff
        ? 'utf-16be'
        : 'utf-8';
  return new TextDecoder(encoding).decode(bytes);
}
