import { DOCUMENT, Injectable, inject, signal } from '@angular/core';

/** Whether the server can be reached, as far as the latest call or the browser knows. */
@Injectable({ providedIn: 'root' })
export class Connection {
  private readonly state = signal(true);
  readonly there = this.state.asReadonly();

  constructor() {
    const view = inject(DOCUMENT).defaultView;
    view?.addEventListener('offline', () => this.state.set(false));
    view?.addEventListener('online', () => this.state.set(true));
  }

  report(there: boolean): void {
    this.state.set(there);
  }
}
