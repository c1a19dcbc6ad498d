import type { Routes } from '@angular/router';
import { LOWEST_WORKER, LowestProbabilities } from '../../data/rankings/lowest-probabilities';
import { provideRankings } from '../../data/rankings/provide-rankings';
import { RankingPage } from './ranking-page';

export const routes: Routes = [
  {
    path: '',
    component: RankingPage,
    providers: [
      provideRankings(),
      LowestProbabilities,
      {
        provide: LOWEST_WORKER,
        useValue: () =>
          new Worker(new URL('../../data/rankings/lowest.worker', import.meta.url), { type: 'module' }),
      },
    ],
  },
];
