import type { Signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import type { AbstractControl } from '@angular/forms';
import { map, scan, switchMap } from 'rxjs';

/**
 * Beats with everything that happens in a form: values, states, what the server said about a field. A page that reads it
 * in its template is checked again then, without watching controls one by one. Needs an injection context.
 */
export function formPulse(form: Signal<AbstractControl>): Signal<number> {
  const beats = toObservable(form).pipe(
    switchMap((control) => control.events),
    map(() => 1),
    scan((sum, one) => sum + one, 0),
  );
  return toSignal(beats, { initialValue: 0 });
}
