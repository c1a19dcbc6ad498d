import { Injectable, inject } from '@angular/core';
import { type Observable, forkJoin } from 'rxjs';
import { rankingContextRead, rankingInputsRead, rankingViewRead } from '#shared/contracts/rankings';
import type { ChoiceQuery } from '#shared/core/ranking/ranking-choices';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { ApiClient } from '../../core/api/api-client';

/** All that a ranking is computed from, once for every choice. */
export interface RankingSources {
  readonly inputs: RankingInput;
  readonly context: RankingContext;
}

/** Inputs of the ranking, or the ranking as the server computes it. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class RankingsApi {
  private readonly api = inject(ApiClient);

  /**
   * All results, so that no choice needs another request.
   * @param area the choice in the address: it stands in where the programme has no common area
   */
  sources(programmeId: string, area: string | undefined): Observable<RankingSources> {
    const params = { programmeId };
    const own = area === undefined ? {} : { area };
    return forkJoin({
      inputs: this.api.call(rankingInputsRead, { params, query: { evidence: 'all', ...own } }),
      context: this.api.call(rankingContextRead, { params, query: own }),
    });
  }

  view(programmeId: string, query: ChoiceQuery): Observable<RankingView> {
    return this.api.call(rankingViewRead, {
      params: { programmeId },
      // The contract checks each choice again; an address typed by hand is refused in words.
      query: query as object,
    });
  }
}
