import { ErrorHandler, Injectable, signal } from '@angular/core';

/** Whether something failed that no page has shown. The shell says so; the default handler keeps the details. */
@Injectable({ providedIn: 'root' })
export class UnexpectedErrors extends ErrorHandler {
  private readonly state = signal(false);
  readonly happened = this.state.asReadonly();

  override handleError(error: unknown): void {
    super.handleError(error);
    this.state.set(true);
  }

  dismiss(): void {
    this.state.set(false);
  }
}
