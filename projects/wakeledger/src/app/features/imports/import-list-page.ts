import { ChangeDetectionStrategy, Component, effect, inject, input, signal, untracked } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { IMPORT_LIMIT_BYTES, IMPORT_LIMIT_ROWS, type ImportSummary } from '#shared/contracts/imports';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { ImportsApi } from '../../data/imports/imports-api';
import { Busy } from '../../ui/busy/busy';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { STATE_WORDS } from './import-words';
import { WhenWords } from './when-words';

/** Choose or drop a file; below, the imports of before. */
@Component({
  selector: 'wl-import-list-page',
  imports: [Busy, ProblemBanner, RouterLink, WhenWords],
  templateUrl: './import-list-page.html',
  styleUrl: './import-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportListPage {
  readonly programmeId = input.required<string>();

  private readonly api = inject(ImportsApi);
  private readonly router = inject(Router);

  protected readonly imports = signal<readonly ImportSummary[] | undefined>(undefined);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  /** Refused here already, before anything is sent. */
  protected readonly tooLarge = signal<string | undefined>(undefined);
  protected readonly sending = signal<string | undefined>(undefined);
  protected readonly over = signal(false);
  protected readonly stateWords = STATE_WORDS;
  protected readonly mostMegabytes = IMPORT_LIMIT_BYTES / 1024 / 1024;
  protected readonly mostRows = IMPORT_LIMIT_ROWS;

  constructor() {
    effect(() => {
      const programmeId = this.programmeId();
      untracked(() => void this.load(programmeId));
    });
  }

  protected async load(programmeId = this.programmeId()): Promise<void> {
    this.problem.set(undefined);
    try {
      this.imports.set(await firstValueFrom(this.api.list(programmeId)));
    } catch (error) {
      this.problem.set(asApiProblem(error));
    }
  }

  protected dragged(event: DragEvent, over: boolean): void {
    event.preventDefault();
    this.over.set(over);
  }

  protected async dropped(event: DragEvent): Promise<void> {
    event.preventDefault();
    this.over.set(false);
    await this.take(event.dataTransfer?.files ?? null);
  }

  protected async take(files: FileList | null): Promise<void> {
    const file = files?.item(0);
    if (!file || this.sending() !== undefined) return;
    this.problem.set(undefined);
    this.tooLarge.set(undefined);
    if (file.size > IMPORT_LIMIT_BYTES) {
      const megabytes = Math.ceil(file.size / 1024 / 1024);
      this.tooLarge.set(
        $localize`${file.name}:NAME: has ${megabytes}:SIZE: MB; up to ${this.mostMegabytes}:MOST: MB can be taken. Split it, or leave columns out.`,
      );
      return;
    }
    this.sending.set(file.name);
    try {
      const { id } = await firstValueFrom(this.api.upload(this.programmeId(), file));
      await this.router.navigate(['/programmes', this.programmeId(), 'import', id]);
    } catch (error) {
      this.problem.set(asApiProblem(error));
    } finally {
      this.sending.set(undefined);
    }
  }
}
