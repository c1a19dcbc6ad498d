import type { Action } from '@ngrx/store';
import type { CycleSummary } from '#shared/contracts/cycles';
import { ApiProblem } from '../../core/api/api-problem';
import { CycleUploadPageActions, CyclesApiActions, CyclesPageActions } from './cycles.actions';
import { type CyclesState, cyclesFeature } from './cycles.feature';

const cycle = (key: string, origin: 'built-in' | 'own', retiredAt?: string): CycleSummary => ({
  key,
  origin,
  name: key,
  source: '',
  durationS: 1,
  distanceM: 1,
  maximumSpeedKmh: 1,
  meanSpeedKmh: 1,
  maximumAccelerationMs2: 1,
  cautions: [],
  retiredAt,
});
const page = (...actions: Action[]): ReturnType<typeof cyclesFeature.selectListPage> =>
  cyclesFeature.selectListPage({
    cycles: actions.reduce<CyclesState>(
      (state, action) => cyclesFeature.reducer(state, action),
      cyclesFeature.reducer(undefined, { type: 'start' }),
    ),
  });

describe('the cycles’ slice', () => {
  const loaded = CyclesApiActions.loaded({ cycles: [cycle('nedc', 'built-in'), cycle('hill', 'own')] });

  it('keeps own, built-in and retired ones apart', () => {
    const shown = page(
      loaded,
      CyclesApiActions.retired({ cycle: cycle('hill', 'own', '2026-01-01T00:00:00Z') }),
    );
    expect(shown.builtIn.map(({ key }) => key)).toEqual(['nedc']);
    expect(shown.own).toEqual([]);
    expect(shown.retired.map(({ key }) => key)).toEqual(['hill']);
  });

  it('shows a stored one at once', () => {
    expect(page(loaded, CycleUploadPageActions.stored({ cycle: cycle('coast', 'own') })).own).toHaveLength(2);
  });

  it('keeps why a retirement was refused until the page is opened again', () => {
    const problem = new ApiProblem('wrong-state');
    expect(page(loaded, CyclesApiActions.refused({ problem })).refusal).toBe(problem);
    expect(
      page(loaded, CyclesApiActions.refused({ problem }), CyclesPageActions.opened()).refusal,
    ).toBeUndefined();
  });
});
