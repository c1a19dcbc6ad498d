import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as programmesEffects from './programmes.effects';
import { programmesFeature } from './programmes.feature';

/** The slice and what keeps it; in the application's providers, since the shell shows the programme on every page. */
export function provideProgrammes(): EnvironmentProviders {
  return makeEnvironmentProviders([provideState(programmesFeature), provideEffects(programmesEffects)]);
}
