import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as resultsEffects from './results.effects';
import { resultsFeature } from './results.feature';

/** The slice and what keeps it; on the routes of the results. */
export function provideResults(): EnvironmentProviders {
  return makeEnvironmentProviders([provideState(resultsFeature), provideEffects(resultsEffects)]);
}
