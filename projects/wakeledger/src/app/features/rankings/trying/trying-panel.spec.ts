import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { Store, provideStore } from '@ngrx/store';
import { NEVER, of, throwError } from 'rxjs';
import { fiveVariants } from '#shared/testing/ranking-scenario';
import { ApiProblem } from '../../../core/api/api-problem';
import { ProposalsApi } from '../../../data/proposals/proposals-api';
import { provideRankings } from '../../../data/rankings/provide-rankings';
import { RankingPageActions, RankingsApiActions } from '../../../data/rankings/rankings.actions';
import { RankingsApi } from '../../../data/rankings/rankings-api';
import { rankingsFeature } from '../../../data/rankings/rankings.feature';
import { selectRankingView } from '../../../data/rankings/rankings.selectors';
import { TryingPanel } from './trying-panel';

const PROGRAMME = '11111111-1111-4111-8111-111111111111';

function panel(make = jest.fn(() => of({ id: 'made' }))) {
  sessionStorage.clear();
  TestBed.configureTestingModule({
    providers: [
      provideStore(),
      provideEffects(),
      provideRouter([{ path: '**', children: [] }]),
      provideRankings(),
      { provide: RankingsApi, useValue: { sources: () => NEVER } },
      { provide: ProposalsApi, useValue: { make } },
    ],
  });
  const store = TestBed.inject(Store);
  store.dispatch(
    RankingPageActions.opened({ programmeId: PROGRAMME, mode: 'computes', address: { cycle: 'short' } }),
  );
  store.dispatch(RankingsApiActions.sourcesLoaded({ programmeId: PROGRAMME, sources: fiveVariants() }));
  const fixture = TestBed.createComponent(TryingPanel);
  const view = store.selectSignal(selectRankingView);
  const settle = () => {
    fixture.componentRef.setInput('view', view());
    TestBed.tick();
  };
  fixture.componentRef.setInput('programmeId', PROGRAMME);
  fixture.componentRef.setInput('address', { cycle: 'short' });
  settle();
  const element = fixture.nativeElement as HTMLElement;
  const labelled = <E extends HTMLElement>(words: string): E => {
    const label = [...element.querySelectorAll('label')].find((each) => each.textContent?.includes(words));
    const field = label?.querySelector<E>('select, input, textarea');
    if (!field) throw new Error(`Nothing is labelled ${words}.`);
    return field;
  };
  const set = (words: string, value: string) => {
    const field = labelled<HTMLInputElement>(words);
    field.value = value;
    field.dispatchEvent(new Event(field.tagName === 'SELECT' ? 'change' : 'input'));
    settle();
  };
  const press = (words: string) => {
    const button = [...element.querySelectorAll('button')].find((each) => each.textContent?.trim() === words);
    if (!button) throw new Error(`There is no button ${words}.`);
    button.click();
    settle();
  };
  const tried = store.selectSignal(rankingsFeature.selectTried);
  return { element, set, press, tried, make, view, settle, labelled };
}

describe('the panel for trying', () => {
  it('sets a result aside with a reason, lists it and what it moves, and drops it again', () => {
    const { element, set, press, tried, view } = panel();
    const before = view()?.rows.length ?? 0;
    set('Result', 'r-liftback');
    set('Why', 'A wheel cover was missing');
    press('Set it aside');
    expect(tried()).toEqual([
      { kind: 'set-aside', resultId: 'r-liftback', reason: 'A wheel cover was missing' },
    ]);
    expect(view()?.rows).toHaveLength(before - 1);
    expect(element.querySelector('h2')?.textContent).toContain('Tried, not saved');
    expect(element.querySelector('.changes')?.textContent).toContain('A wheel cover was missing');
    expect(element.querySelector('wl-ranking-moves')?.textContent).toContain('not ranked');
    press('Drop');
    expect(tried()).toEqual([]);
    expect(view()?.rows).toHaveLength(before);
  });

  it('offers to include what is not comparable, and only that', () => {
    const { element, set, view, press, tried } = panel();
    const left = view()?.stayedOut.find(({ rules }) => rules.some(({ rule }) => rule === 'not-comparable'));
    set('Result', 'r-liftback');
    expect(element.textContent).not.toContain('Include it all the same');
    set('Result', left?.resultId ?? '');
    set('Why', 'The floor is worth less than a count');
    press('Include it all the same');
    expect(tried()[0]).toMatchObject({ kind: 'include-not-comparable', resultId: left?.resultId });
    expect(view()?.stayedOut.some(({ resultId }) => resultId === left?.resultId)).toBe(false);
  });

  it('tries a limit in the unit that it is typed in, refuses what is none, and switches the friction line', () => {
    const { element, set, press, tried } = panel();
    set('Change', 'limits');
    set('Limit', 'blockageExcluded');
    set('Value', 'much');
    press('Try this limit');
    expect(element.querySelector('[role=alert]')?.textContent).toContain('A number');
    set('Value', '0,5');
    press('Try this limit');
    press('Try with the friction line');
    expect(tried()).toEqual([
      { kind: 'policies', values: { blockageExcluded: 0.005 } },
      { kind: 'friction-line', frictionLine: 'on' },
    ]);
    press('Drop all changes');
    expect(tried()).toEqual([]);
  });

  it('tries an uncertainty of a facility, and says what it was before', () => {
    const { element, set, press, tried } = panel();
    set('Change', 'facility');
    set('Facility', 'belt');
    set('Facility bias', '1');
    press('Try these corrections');
    expect(tried()).toEqual([{ kind: 'facility', facilityId: 'belt', biasURelative: 0.01 }]);
    expect(element.querySelector('.changes')?.textContent).toMatch(/facility bias 0.6\S* % → 1\S* %/);
  });

  it('tries which results a variant rests on', () => {
    const { element, set, press, tried } = panel();
    set('Change', 'evidence');
    set('Variant', 'hatch');
    element.querySelector<HTMLInputElement>('wl-try-evidence input[type=checkbox]')?.click();
    press('Try this evidence');
    expect(tried()).toEqual([
      { kind: 'evidence', variantId: 'hatch', resultIds: ['r-hatch'], rule: 'newest' },
    ]);
  });

  it('saves a proposal with what was seen, and then tries nothing any more', async () => {
    const { element, set, press, tried, make, view, settle } = panel();
    const before = view()?.rows.map(({ variantId }) => variantId);
    set('Change', 'limits');
    press('Try with the friction line');
    const save = () =>
      [...element.querySelectorAll('button')].find((each) => each.textContent?.includes('Save as'));
    expect(save()?.disabled).toBe(true);
    set('Title', 'Friction line on');
    set('Why the change is right', 'Most results lack a sweep');
    press('Save as a proposal');
    await Promise.resolve();
    await Promise.resolve();
    settle();
    expect(make).toHaveBeenCalledWith(
      PROGRAMME,
      expect.objectContaining({
        title: 'Friction line on',
        comment: 'Most results lack a sweep',
        changes: [{ kind: 'friction-line', frictionLine: 'on' }],
        query: { cycle: 'short' },
      }),
      expect.any(String),
    );
    const [, body] = make.mock.calls[0] as unknown as [string, { seen: { before: { variantId: string }[] } }];
    expect(body.seen.before.map(({ variantId }) => variantId)).toEqual(before);
    expect(tried()).toEqual([]);
  });

  it('keeps what is tried where the ranking moved meanwhile, and says so', async () => {
    const { element, set, press, tried, settle } = panel(
      jest.fn(() => throwError(() => new ApiProblem('unreadable-answer'))),
    );
    set('Change', 'limits');
    press('Try with the friction line');
    set('Title', 'Friction line on');
    set('Why the change is right', 'Most results lack a sweep');
    press('Save as a proposal');
    await Promise.resolve();
    await Promise.resolve();
    settle();
    expect(tried()).toHaveLength(1);
    expect(element.querySelector('wl-problem-banner [role=alert]')).not.toBeNull();
  });
});
