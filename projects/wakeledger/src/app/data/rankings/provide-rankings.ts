import { type EnvironmentProviders, makeEnvironmentProviders } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as effects from './rankings.effects';
import { rankingsFeature } from './rankings.feature';

/** The rankings' slice and its effects, for the routes that show one. */
export function provideRankings(): EnvironmentProviders {
  return makeEnvironmentProviders([
    provideState(rankingsFeature),
    provideEffects({
      loadSources: effects.loadSources,
      loadView: effects.loadView,
      recallTried: effects.recallTried,
      keepTried: effects.keepTried,
    }),
  ]);
}
