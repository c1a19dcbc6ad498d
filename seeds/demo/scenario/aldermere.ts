import { ALDERMERE_CHECKS, ALDERMERE_FORMER_VERSIONS } from './check-bodies';
import {
  ALDERMERE_ADJUSTMENTS,
  ALDERMERE_CORRELATIONS,
  ALDERMERE_POLICIES,
  DUNLIN_CHECKED,
  DUNLIN_JUDGEMENTS,
  DUNLIN_PLANS,
} from './dunlin-judgement';
import { DUNLIN } from './dunlin-programme';
import { DUNLIN_2026_RESULTS } from './dunlin-results-2026';
import { DUNLIN_EARLY_RESULTS } from './dunlin-results-early';
import { DUNLIN_VARIANTS } from './dunlin-variants';
import { ALDERMERE_FACILITIES } from './facilities';
import type { Scenario } from './scenario-types';

/** Aldermere Motors with its programme Dunlin, as it stands late in 2026. Tourer and Crossback still go by their newest. */
export const ALDERMERE_SCENARIO: Scenario = {
  facilities: ALDERMERE_FACILITIES,
  formerVersions: ALDERMERE_FORMER_VERSIONS,
  checks: ALDERMERE_CHECKS,
  programme: DUNLIN,
  variants: DUNLIN_VARIANTS,
  results: [...DUNLIN_EARLY_RESULTS, ...DUNLIN_2026_RESULTS],
  withdrawals: [
    {
      result: 'H-2606-08',
      date: '2026-06-18',
      reason:
        'The rear ride-height sensor was unplugged: the car stood 14 mm too high. Measured again as H-2606-11.',
    },
  ],
  policies: ALDERMERE_POLICIES,
  adjustments: ALDERMERE_ADJUSTMENTS,
  correlations: ALDERMERE_CORRELATIONS,
  judgements: DUNLIN_JUDGEMENTS,
  checked: DUNLIN_CHECKED,
  plans: DUNLIN_PLANS,
  adoptions: [
    {
      results: ['H-2606-02'],
      date: '2026-06-22',
      comment: 'Second clay; repeats agree within half a count.',
    },
    {
      results: ['S-2608-04'],
      date: '2026-08-28',
      comment: 'Best that there is for Sport until a full-size body exists. Mach caution seen.',
    },
    {
      results: ['H-2609-03'],
      date: '2026-09-18',
      comment: 'Prototype on belts, with a full yaw sweep.',
    },
    {
      results: ['H-2609-06'],
      date: '2026-09-18',
      comment: 'Prototype on belts. Forces checked against the tunnel’s own coefficients.',
    },
    {
      results: ['H-2609-03', 'H-2609-12'],
      rule: 'weighted-mean',
      date: '2026-09-21',
      comment: 'The same prototype, installed twice. They differ by more than the installation explains.',
    },
  ],
};
