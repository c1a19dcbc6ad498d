import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ApiProblem } from '../../core/api/api-problem';
import { problemWords } from '../../core/errors/problem-words';

/** A refusal or failure in words, where it happened, read out at once; with a way to try again where that can help. */
@Component({
  selector: 'wl-problem-banner',
  template: `
    @if (problem(); as found) {
      <div class="wl-notice wl-trouble" role="alert">
        <strong>{{ words()?.title }}</strong>
        @if (words()?.detail; as detail) {
          {{ detail }}
        }
        @if (words()?.requestId; as requestId) {
          <ng-container i18n>When you ask for help, name {{ requestId }}.</ng-container>
        }
        @if (found.issues.length > 1) {
          <ul>
            @for (issue of found.issues; track $index) {
              <li>
                <span class="where">{{ issue.where }}</span> {{ issue.detail }}
              </li>
            }
          </ul>
        }
        @if (retryable()) {
          <button type="button" class="wl-link" (click)="retry.emit()" i18n>Try again</button>
        }
      </div>
    }
  `,
  styles: `
    .where {
      font-weight: 600;
    }
    ul {
      margin: 4px 0;
      padding-left: 20px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemBanner {
  readonly problem = input.required<ApiProblem | undefined>();
  readonly retryable = input(false);
  readonly retry = output();

  protected readonly words = computed(() => {
    const found = this.problem();
    return found && problemWords(found);
  });
}
