import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import type { Result, ResultEvent } from '#shared/contracts/results';
import { ResultsApi } from '../../../data/results/results-api';
import { judgementWords } from '../judgement/judgement-words';
import { EVENT_WORDS } from './state-words';

/** What happened to a result: who, when and why; and what its adoptions came to, then and now. */
@Component({
  selector: 'wl-result-story',
  imports: [DatePipe],
  template: `
    @if (events.hasValue()) {
      <ol class="story" reversed>
        @for (event of events.value(); track event.at + event.kind) {
          <li>
            <strong>{{ words[event.kind] }}</strong>
            <span class="small">, {{ event.at | date: 'd MMM y' }}, {{ event.by }}</span>
            @if (event.comment; as comment) {
              <span class="said">{{ comment }}</span>
            }
            @for (line of lines(event); track line) {
              <span class="said">{{ line }}</span>
            }
          </li>
        }
      </ol>
    }
    @if (evaluations.hasValue()) {
      @for (stored of adopting(evaluations.value()); track stored.id) {
        <p class="small">
          @if (stored.recomputed.refusal; as code) {
            <span class="wl-rust"
              ><span aria-hidden="true">■ </span
              ><ng-container i18n
                >What was adopted on {{ stored.at | date: 'd MMMM y' }} is refused now ({{
                  code
                }}).</ng-container
              ></span
            >
          } @else if (stored.recomputed.differences.length > 0) {
            <span class="wl-rust"
              ><span aria-hidden="true">■ </span
              ><ng-container i18n
                >What was adopted on {{ stored.at | date: 'd MMMM y' }} computes to another figure
                now.</ng-container
              ></span
            >
          } @else {
            <span class="wl-moss"
              ><span aria-hidden="true">● </span
              ><ng-container i18n
                >What was adopted on {{ stored.at | date: 'd MMMM y' }} is stored with its inputs and computes
                to the same figure now.</ng-container
              ></span
            >
          }
        </p>
      }
    }
  `,
  styles: `
    .story {
      margin: 0 0 8px;
      padding-left: 28px;
    }
    .said {
      display: block;
    }
    .small {
      margin: 0;
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultStory {
  readonly programmeId = input.required<string>();
  /** Changes with every deed, so that the story is asked for anew. */
  readonly result = input.required<Result>();
  readonly nameOf = input.required<(resultId: string) => string>();

  private readonly api = inject(ResultsApi);
  protected readonly words = EVENT_WORDS;
  private readonly asked = () => ({ programmeId: this.programmeId(), result: this.result() });
  protected readonly events = rxResource({
    params: this.asked,
    stream: ({ params: { programmeId, result } }) => this.api.history(programmeId, result.id),
  });
  protected readonly evaluations = rxResource({
    params: this.asked,
    stream: ({ params: { programmeId, result } }) => this.api.evaluations(programmeId, result.variantId),
  });

  protected lines(event: ResultEvent): readonly string[] {
    return event.judgement === undefined ? [] : judgementWords(event.judgement, this.nameOf());
  }

  /** The newest evaluation that rests on this result. */
  protected adopting<E extends { readonly output: { readonly usedResultIds: readonly string[] } }>(
    evaluations: readonly E[],
  ): readonly E[] {
    return evaluations.filter(({ output }) => output.usedResultIds.includes(this.result().id)).slice(0, 1);
  }
}
