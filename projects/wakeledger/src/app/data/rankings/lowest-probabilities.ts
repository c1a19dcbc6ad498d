import { DestroyRef, Injectable, InjectionToken, type Signal, effect, inject, signal } from '@angular/core';
import type { LowestSamplingInput } from '#shared/core/ranking/lowest-sampling';

/** What is asked of the worker: the part of `Worker` that is used. */
export interface LowestWorker {
  postMessage(message: { readonly id: number; readonly input: LowestSamplingInput }): void;
  onmessage: ((event: MessageEvent<LowestAnswer>) => void) | null;
  terminate(): void;
}

export interface LowestAnswer {
  readonly id: number;
  readonly probabilities: Readonly<Record<string, number>>;
}

/** Starts the worker; a token, because only the built application has one. */
export const LOWEST_WORKER = new InjectionToken<() => LowestWorker>('worker for P(lowest)');

/** P(lowest) of the variants shown, drawn in a worker: seeded, so that everybody gets the same. */
@Injectable()
export class LowestProbabilities {
  private readonly start = inject(LOWEST_WORKER);
  private worker: LowestWorker | undefined;
  private asked = 0;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.worker?.terminate());
  }

  /** Undefined while the worker is at it. Call where effects may be made. */
  of(input: Signal<LowestSamplingInput | null>): Signal<ReadonlyMap<string, number> | undefined> {
    const answer = signal<ReadonlyMap<string, number> | undefined>(undefined);
    effect(() => {
      const asked = input();
      answer.set(undefined);
      if (!asked) return;
      const id = ++this.asked;
      const worker = (this.worker ??= this.start());
      worker.onmessage = ({ data }) => {
        // An answer to an earlier question is no longer wanted.
        if (data.id === this.asked) answer.set(new Map(Object.entries(data.probabilities)));
      };
      worker.postMessage({ id, input: asked });
    });
    return answer.asReadonly();
  }
}
