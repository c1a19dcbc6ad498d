import { DOCUMENT, afterNextRender, inject, Injector } from '@angular/core';
import { NavigationEnd, Router } from '@angular/router';
import { filter, map, pairwise, startWith } from 'rxjs';

const pathOf = (address: string): string => address.split(/[?#]/, 1)[0] ?? '';

/**
 * Moves the focus to the new page's question, so that the keyboard and a screen reader begin there. A change of the
 * query alone (filters, order) is the same page and moves nothing. To be called once, at start.
 */
export function focusOnNavigation(): void {
  const router = inject(Router);
  const document = inject(DOCUMENT);
  const injector = inject(Injector);
  router.events
    .pipe(
      filter((event) => event instanceof NavigationEnd),
      map((event) => pathOf(event.urlAfterRedirects)),
      startWith(''),
      pairwise(),
      // The first page is where the browser puts the focus by itself.
      filter(([from, to]) => from !== '' && from !== to),
    )
    .subscribe(() =>
      afterNextRender(
        () => {
          const target =
            document.querySelector<HTMLElement>('main h1') ?? document.querySelector<HTMLElement>('main');
          target?.focus({ preventScroll: true });
        },
        { injector },
      ),
    );
}
