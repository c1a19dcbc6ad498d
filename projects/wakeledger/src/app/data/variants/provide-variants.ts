import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as variantsEffects from './variants.effects';
import { variantsFeature } from './variants.feature';

/** The slice and what keeps it; on every route that shows or names variants. */
export function provideVariants(): EnvironmentProviders {
  return makeEnvironmentProviders([provideState(variantsFeature), provideEffects(variantsEffects)]);
}
