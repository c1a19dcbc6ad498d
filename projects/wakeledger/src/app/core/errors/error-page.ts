import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';

export type ErrorPageKind = 'not-found' | 'not-yours' | 'unavailable';

interface Words {
  readonly title: string;
  readonly detail: string;
}

/** The page for an address that leads nowhere, is not open to the person, or cannot be served now. */
@Component({
  selector: 'wl-error-page',
  imports: [RouterLink],
  template: `
    <main class="page">
      <h1 tabindex="-1">{{ words().title }}</h1>
      <p>{{ words().detail }}</p>
      <p class="wl-actions">
        @if (kind() === 'unavailable') {
          <button type="button" class="wl-button wl-main" (click)="reload()" i18n>Try again</button>
        } @else {
          <a routerLink="/programmes" class="wl-button" i18n>Go to the programmes</a>
        }
      </p>
    </main>
  `,
  styles: `
    .page {
      display: grid;
      gap: 12px;
      max-width: 640px;
      padding: 15vh 24px 24px;
      margin: 0 auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ErrorPage {
  readonly kind = input<ErrorPageKind>('not-found');

  private readonly view = inject(DOCUMENT).defaultView;

  protected readonly words = computed<Words>(() => {
    switch (this.kind()) {
      case 'not-found':
        return {
          title: $localize`There is nothing at this address`,
          detail: $localize`The link may be old, or what it led to belongs to another organisation.`,
        };
      case 'not-yours':
        return {
          title: $localize`Your role does not include this page`,
          detail: $localize`An administrator of your organisation can change your role.`,
        };
      case 'unavailable':
        return {
          title: $localize`The server cannot be reached`,
          detail: $localize`It may be starting. Nothing that was saved is lost.`,
        };
    }
  });

  protected reload(): void {
    this.view?.location.reload();
  }
}
