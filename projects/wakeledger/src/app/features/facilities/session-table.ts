import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  LOCALE_ID,
  computed,
  inject,
  input,
  output,
  runInInjectionContext,
} from '@angular/core';
import type { TestSession } from '#shared/contracts/test-sessions';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { editSession } from './session-dialog';
import { sessionDays } from './session-days';

/** When were we there? The sessions of a facility with what was done in each. */
@Component({
  selector: 'wl-session-table',
  imports: [EmptyState],
  templateUrl: './session-table.html',
  styles: `
    .small {
      display: block;
      font-size: var(--wl-small);
      font-weight: 400;
    }
    .wl-scroll {
      margin-bottom: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SessionTable {
  readonly facilityId = input.required<string>();
  readonly sessions = input.required<readonly TestSession[]>();
  readonly mayEdit = input(false);
  /** A session was added or changed. */
  readonly changed = output<TestSession>();

  private readonly injector = inject(Injector);
  private readonly locale = inject(LOCALE_ID);

  protected readonly rows = computed(() =>
    this.sessions().map((session) => ({
      session,
      days: sessionDays(session, this.locale),
      installations: session.installations.join(', '),
      change: $localize`Change ${session.name}:NAME:`,
    })),
  );

  protected async edit(session?: TestSession): Promise<void> {
    const data = { facilityId: this.facilityId(), ...(session ? { session } : {}) };
    const saved = await runInInjectionContext(this.injector, () => editSession(data));
    if (saved) this.changed.emit(saved);
  }
}
