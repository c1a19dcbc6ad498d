import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as cyclesEffects from './cycles.effects';
import { cyclesFeature } from './cycles.feature';

/** The slice and what keeps it, for the routes whose pages read it. */
export function provideCycles(): EnvironmentProviders {
  return makeEnvironmentProviders([provideState(cyclesFeature), provideEffects(cyclesEffects)]);
}
