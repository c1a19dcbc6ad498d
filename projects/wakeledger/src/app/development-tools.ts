import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideStoreDevtools } from '@ngrx/store-devtools';

declare const ngDevMode: unknown;

/** The store's time machine, in development builds only: `ngDevMode` is false in production and the import is dropped. */
export function provideDevelopmentTools(): EnvironmentProviders {
  return typeof ngDevMode === 'undefined' || ngDevMode
    ? provideStoreDevtools({ maxAge: 50, connectInZone: false })
    : makeEnvironmentProviders([]);
}
