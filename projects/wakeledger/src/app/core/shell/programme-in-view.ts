import { Injectable, signal } from '@angular/core';
import type { ProgrammeSummary } from '#shared/contracts/programmes';

/** The programme that the address is about, once it is known; written by data/programmes, read by the shell. */
@Injectable({ providedIn: 'root' })
export class ProgrammeInView {
  private readonly state = signal<ProgrammeSummary | undefined>(undefined);
  readonly programme = this.state.asReadonly();

  show(programme: ProgrammeSummary | undefined): void {
    this.state.set(programme);
  }
}
