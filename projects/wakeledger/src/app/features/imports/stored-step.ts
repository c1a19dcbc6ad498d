import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  inject,
  input,
  runInInjectionContext,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ImportDetail } from '#shared/contracts/imports';
import { Session } from '../../core/session/session';
import { askInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { ImportInView } from './import-in-view';

/** What became of the import, and where to look next; or its withdrawal. */
@Component({
  selector: 'wl-stored-step',
  imports: [RouterLink],
  template: `
    @switch (detail().state) {
      @case ('stored') {
        <p class="wl-notice wl-good" role="status">
          <strong i18n>Stored.</strong>
          <ng-container i18n>{{ detail().resultCount }} results are in the programme.</ng-container>
        </p>
      }
      @case ('withdrawn') {
        <p class="wl-notice" role="status">
          <strong i18n>Withdrawn.</strong> {{ detail().message }}
          <ng-container i18n>Its results stay readable and count for nothing.</ng-container>
        </p>
      }
      @default {
        <p i18n>This import was laid aside before anything was stored.</p>
      }
    }
    <div class="wl-actions">
      @if (detail().resultCount) {
        <a class="wl-button wl-main" [routerLink]="at('ranking')" i18n>See the ranking</a>
        <a class="wl-button" [routerLink]="at('results')" i18n>See the results</a>
      }
      <a class="wl-button" [routerLink]="at('import')" i18n>Bring in another file</a>
      @if (mayWithdraw()) {
        <button type="button" class="wl-button wl-severe" (click)="withdraw()" i18n>
          Withdraw this import
        </button>
      }
    </div>
  `,
  styles: `
    .wl-actions {
      margin-top: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoredStep {
  readonly detail = input.required<ImportDetail>();

  private readonly view = inject(ImportInView);
  private readonly session = inject(Session);
  private readonly injector = inject(Injector);

  protected readonly mayWithdraw = computed(
    () => this.detail().state === 'stored' && this.session.may('results.withdraw'),
  );

  protected at(page: string): readonly string[] {
    return ['/programmes', this.detail().programmeId, page];
  }

  protected async withdraw(): Promise<void> {
    const { resultCount } = this.detail();
    const reason = await runInInjectionContext(this.injector, () =>
      askInDialog({
        title: $localize`Withdraw all ${resultCount}:COUNT: results of this import?`,
        detail: $localize`They stay readable with your reason and count for nothing. This cannot be undone.`,
        confirm: $localize`Withdraw`,
        cancel: $localize`Keep them`,
        severe: true,
        reasonLabel: $localize`Reason`,
      }),
    );
    if (reason !== undefined) await this.view.withdraw(reason);
  }
}
