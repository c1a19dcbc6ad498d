import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as facilitiesEffects from './facilities.effects';
import { facilitiesFeature } from './facilities.feature';

/** The slice and what keeps it; on every route that shows or names facilities. */
export function provideFacilities(): EnvironmentProviders {
  return makeEnvironmentProviders([provideState(facilitiesFeature), provideEffects(facilitiesEffects)]);
}
