import { type Signal, computed, effect, inject, untracked } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { Store } from '@ngrx/store';
import { asApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { FacilityNamesActions } from '../../data/facilities/facilities.actions';
import { facilitiesFeature } from '../../data/facilities/facilities.feature';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { VariantNamesActions } from '../../data/variants/variants.actions';
import { variantsFeature } from '../../data/variants/variants.feature';
import { isTunnel } from './planned';
import { knownEvidence, NOTHING_KNOWN } from './swept-results';

/**
 * What a test of a programme is planned against: variants, tunnels, the reference, the limits in force and, for those who may
 * see it, what the evidence says. Needs an injection context.
 */
export function planSurroundings(programmeId: Signal<string>) {
  const api = inject(TestPlansApi);
  const session = inject(Session);
  const store = inject(Store);

  const ground = rxResource({
    params: () => programmeId(),
    stream: ({ params }) => api.ground(params),
  });
  const evidence = rxResource({
    params: () => (session.may('ranking-inputs.read') ? programmeId() : undefined),
    stream: ({ params }) => api.evidence(params),
  });
  const facilities = store.selectSignal(facilitiesFeature.selectActive);
  effect(() => {
    const id = programmeId();
    untracked(() => {
      store.dispatch(VariantNamesActions.needed({ programmeId: id }));
      store.dispatch(FacilityNamesActions.needed());
    });
  });

  return {
    ground: computed(() => (ground.hasValue() ? ground.value() : undefined)),
    problem: computed(() => {
      const error = ground.error();
      return error && asApiProblem(error.cause ?? error);
    }),
    evidence: computed(() => (evidence.hasValue() ? knownEvidence(evidence.value()) : NOTHING_KNOWN)),
    variants: store.selectSignal(variantsFeature.selectActive),
    variantsById: store.selectSignal(variantsFeature.selectById),
    facilitiesById: store.selectSignal(facilitiesFeature.selectById),
    tunnels: computed(() => facilities().filter(isTunnel)),
  };
}
