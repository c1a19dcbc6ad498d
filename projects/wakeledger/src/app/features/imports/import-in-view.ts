import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { type Observable, firstValueFrom } from 'rxjs';
import type { ImportDetail, ImportFix, ImportMapping, RowFilter } from '#shared/contracts/imports';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { ImportsApi, type RowPage } from '../../data/imports/imports-api';

const LOOK_AGAIN_MS = 500;

/** The import that a page is about, and everything that can be done with it. While work runs, it is looked at again and again. */
@Injectable()
export class ImportInView {
  private readonly api = inject(ImportsApi);
  private timer: ReturnType<typeof setTimeout> | undefined;
  private gone = false;

  private readonly known = signal<ImportDetail | undefined>(undefined);
  readonly detail = this.known.asReadonly();
  readonly problem = signal<ApiProblem | undefined>(undefined);
  readonly busy = signal(false);
  /** Rises when rows may have changed, so that a grid fetches them anew. */
  readonly rowsChanged = signal(0);
  readonly runs = computed(() => {
    const state = this.known()?.state;
    return state === 'checking' || state === 'storing';
  });

  constructor() {
    inject(DestroyRef).onDestroy(() => {
      this.gone = true;
      clearTimeout(this.timer);
    });
  }

  async open(programmeId: string, importId: string): Promise<void> {
    await this.settle(() => this.api.read(programmeId, importId));
  }

  async chooseSheet(sheet: number): Promise<boolean> {
    return this.attempt((known) => this.api.chooseSheet(known, sheet));
  }

  async map(mapping: ImportMapping): Promise<boolean> {
    return this.attempt((known) => this.api.map(known, mapping));
  }

  async confirm(): Promise<boolean> {
    return this.attempt((known) => this.api.confirm(known, known.counts.refused));
  }

  async stop(): Promise<void> {
    await this.attempt((known) => this.api.stop(known));
  }

  async discard(): Promise<boolean> {
    return this.attempt((known) => this.api.discard(known));
  }

  async withdraw(reason: string): Promise<boolean> {
    return this.attempt((known) => this.api.withdraw(known, reason));
  }

  /** Returns how many rows were changed; undefined when it was refused. */
  async fix(fix: ImportFix): Promise<number | undefined> {
    let changed: number | undefined;
    await this.attempt((known) => this.fixed(known, fix, (rows) => (changed = rows)));
    this.rowsChanged.update((times) => times + 1);
    return changed;
  }

  async rows(filter: RowFilter, offset: number, limit: number): Promise<RowPage | undefined> {
    const known = this.known();
    if (!known) return undefined;
    return firstValueFrom(this.api.rows(known, filter, offset, limit));
  }

  private async fixed(
    known: ImportDetail,
    fix: ImportFix,
    told: (rows: number) => void,
  ): Promise<ImportDetail> {
    const reply = await firstValueFrom(this.api.fix(known, fix));
    told(reply.changedRows);
    return reply.import;
  }

  private async attempt(
    deed: (known: ImportDetail) => Observable<ImportDetail> | Promise<ImportDetail>,
  ): Promise<boolean> {
    const known = this.known();
    return known ? this.settle(() => deed(known)) : false;
  }

  private async settle(deed: () => Observable<ImportDetail> | Promise<ImportDetail>): Promise<boolean> {
    this.busy.set(true);
    this.problem.set(undefined);
    try {
      const answer = deed();
      this.take(await (answer instanceof Promise ? answer : firstValueFrom(answer)));
      return true;
    } catch (error) {
      this.problem.set(asApiProblem(error));
      return false;
    } finally {
      this.busy.set(false);
    }
  }

  private take(detail: ImportDetail): void {
    if (this.gone) return;
    const before = this.known();
    this.known.set(detail);
    if (before?.state !== detail.state) this.rowsChanged.update((times) => times + 1);
    clearTimeout(this.timer);
    if (this.runs()) this.timer = setTimeout(() => void this.lookAgain(detail), LOOK_AGAIN_MS);
  }

  /** A look that fails is only put off: the work runs on without being watched. */
  private async lookAgain({ programmeId, id }: ImportDetail): Promise<void> {
    try {
      this.take(await firstValueFrom(this.api.read(programmeId, id)));
    } catch (error) {
      this.problem.set(asApiProblem(error));
      if (!this.gone) this.timer = setTimeout(() => void this.open(programmeId, id), 4 * LOOK_AGAIN_MS);
    }
  }
}
