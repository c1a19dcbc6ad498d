import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as policiesEffects from './policies.effects';
import { policiesFeature } from './policies.feature';

/** The slice and what keeps it, for the routes whose pages read it. */
export function providePolicies(): EnvironmentProviders {
  return makeEnvironmentProviders([provideState(policiesFeature), provideEffects(policiesEffects)]);
}
