import { DOCUMENT, DestroyRef, InjectionToken, Injector, inject, runInInjectionContext } from '@angular/core';
import type { CanDeactivateFn } from '@angular/router';

/** A page that holds what a person typed and has not saved. */
export interface HoldsChanges {
  hasUnsavedChanges(): boolean;
}

/** Asks whether to leave; answers true to leave. A token, so that a test can answer. */
export const LEAVE_QUESTION = new InjectionToken<() => Promise<boolean>>('leave question', {
  providedIn: 'root',
  factory: () => {
    const injector = inject(Injector);
    return async () => {
      const { confirmInDialog } = await import('../../ui/confirm-dialog/confirm-dialog');
      return runInInjectionContext(injector, () =>
        confirmInDialog({
          title: $localize`Leave without saving?`,
          detail: $localize`What you changed on this page has not been saved.`,
          confirm: $localize`Leave`,
          cancel: $localize`Stay here`,
          severe: true,
        }),
      );
    };
  },
});

/** For the route: asks before leaving a page with unsaved changes. The dialog is loaded when it is first needed. */
export const keepUnsavedChanges: CanDeactivateFn<HoldsChanges> = async (page) => {
  if (!page.hasUnsavedChanges()) return true;
  const ask = inject(LEAVE_QUESTION);
  return ask();
};

/** For the page's constructor: lets the browser ask before the window is closed or reloaded. */
export function warnBeforeUnload(hasUnsavedChanges: () => boolean): void {
  const view = inject(DOCUMENT).defaultView;
  const warn = (event: BeforeUnloadEvent): void => {
    if (hasUnsavedChanges()) event.preventDefault();
  };
  view?.addEventListener('beforeunload', warn);
  inject(DestroyRef).onDestroy(() => view?.removeEventListener('beforeunload', warn));
}
