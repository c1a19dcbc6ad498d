import { Injectable, inject } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';

/** How long a private deed can be taken back. */
export const UNDO_MS = 10_000;

/** Says what was done and offers to take it back for ten seconds. Only for what nobody else has seen yet. */
@Injectable({ providedIn: 'root' })
export class Undo {
  private readonly bar = inject(MatSnackBar);

  offer(done: string, undo: () => void): void {
    this.bar
      .open(done, $localize`Undo`, { duration: UNDO_MS })
      .onAction()
      .subscribe(() => undo());
  }

  /** The same place, where there is nothing to take back. */
  say(done: string): void {
    this.bar.open(done, undefined, { duration: 6_000 });
  }
}
