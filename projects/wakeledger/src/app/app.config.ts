import { provideHttpClient, withFetch } from '@angular/common/http';
import {
  type ApplicationConfig,
  ErrorHandler,
  inject,
  provideAppInitializer,
  provideBrowserGlobalErrorListeners,
  provideZonelessChangeDetection,
} from '@angular/core';
import {
  TitleStrategy,
  provideRouter,
  withComponentInputBinding,
  withInMemoryScrolling,
} from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideRouterStore } from '@ngrx/router-store';
import { provideStore } from '@ngrx/store';
import { routes } from './app.routes';
import { UnexpectedErrors } from './core/errors/unexpected-errors';
import { focusOnNavigation } from './core/navigation/focus-on-navigation';
import { QuestionTitle } from './core/navigation/question-title';
import { Preferences } from './core/preferences/preferences';
import { forgetOnMemberChange } from './core/session/forget-on-member-change';
import { leadToSignIn } from './core/session/lead-to-sign-in';
import { provideProgrammes } from './data/programmes/provide-programmes';
import { provideDevelopmentTools } from './development-tools';

export const appConfig: ApplicationConfig = {
  providers: [
    provideZonelessChangeDetection(),
    provideBrowserGlobalErrorListeners(),
    { provide: ErrorHandler, useExisting: UnexpectedErrors },
    provideHttpClient(withFetch()),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled' }),
    ),
    { provide: TitleStrategy, useExisting: QuestionTitle },
    provideStore({}, { metaReducers: [forgetOnMemberChange] }),
    provideRouterStore(),
    provideEffects(),
    provideProgrammes(),
    provideDevelopmentTools(),
    provideAppInitializer(() => {
      inject(Preferences);
      focusOnNavigation();
      leadToSignIn();
    }),
  ],
};
