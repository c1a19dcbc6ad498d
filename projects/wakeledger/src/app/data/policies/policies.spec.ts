import type { Action } from '@ngrx/store';
import { policyValues, type PolicyVersion } from '#shared/contracts/policies';
import { DEFAULT_LIMITS } from '#shared/core/checks/limits';
import { ApiProblem } from '../../core/api/api-problem';
import { PoliciesApiActions, PoliciesPageActions } from './policies.actions';
import { policiesFeature, type PoliciesState } from './policies.feature';

const SUPPLIED: PolicyVersion = { number: 0, values: policyValues.parse(DEFAULT_LIMITS) };
const version = (number: number): PolicyVersion => ({
  number,
  values: { ...SUPPLIED.values, machCaution: 0.2 - number / 100 },
  comment: 'Stricter',
});

const after = (...actions: readonly Action[]): PoliciesState =>
  actions.reduce<PoliciesState>(
    (state, action) => policiesFeature.reducer(state, action),
    policiesFeature.reducer(undefined, { type: 'start' }),
  );
const limits = (state: PoliciesState) => policiesFeature.selectLimits({ policies: state });

describe('the limits’ slice', () => {
  const loaded = PoliciesApiActions.loaded({ versions: [version(1), SUPPLIED] });

  it('has no limits before they have come, and then those of the newest version', () => {
    expect(limits(after(PoliciesPageActions.opened()))).toBeUndefined();
    expect(limits(after(loaded))?.machCaution).toBeCloseTo(0.19, 12);
  });

  it('puts a changed version before the others', () => {
    const state = after(loaded, PoliciesApiActions.changed({ version: version(2) }));
    expect(state.versions.map(({ number }) => number)).toEqual([2, 1, 0]);
    expect(state.saving).toEqual({ kind: 'saved', entity: version(2) });
  });

  it('hands on what a colleague put in force meanwhile', () => {
    const state = after(
      loaded,
      PoliciesApiActions.changedMeanwhile({ versions: [version(2), version(1), SUPPLIED] }),
    );
    expect(state.saving).toEqual({ kind: 'conflict', theirs: version(2) });
    expect(limits(state)?.machCaution).toBeCloseTo(0.18, 12);
  });

  it('keeps the limits while they are loaded anew, and why that failed', () => {
    const problem = new ApiProblem('no-connection');
    const state = after(
      loaded,
      PoliciesPageActions.askedAgain(),
      PoliciesApiActions.loadingFailed({ problem }),
    );
    expect(state.loading).toEqual({ kind: 'failed', problem });
    expect(limits(state)).toBeDefined();
  });

  it('forgets the last outcome when the page is opened again', () => {
    const problem = new ApiProblem('unusable-input');
    const refused = after(loaded, PoliciesApiActions.refused({ problem }));
    expect(refused.saving.kind).toBe('refused');
    expect(policiesFeature.reducer(refused, PoliciesPageActions.opened()).saving.kind).toBe('idle');
  });
});
