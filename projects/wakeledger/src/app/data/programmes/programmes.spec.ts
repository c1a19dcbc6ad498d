import { TestBed } from '@angular/core/testing';
import { Actions } from '@ngrx/effects';
import { provideMockActions } from '@ngrx/effects/testing';
import { type Action } from '@ngrx/store';
import { type Observable, Subject, firstValueFrom, of, throwError, toArray } from 'rxjs';
import type { Programme, ProgrammeSummary } from '#shared/contracts/programmes';
import { ApiProblem } from '../../core/api/api-problem';
import { programmeIdIn } from './programme-address';
import {
  ProgrammeAddressActions,
  ProgrammeFormPageActions,
  ProgrammesApiActions,
  ProgrammesPageActions,
} from './programmes.actions';
import { ProgrammesApi } from './programmes-api';
import { changeProgramme, loadProgrammes, rememberOpened } from './programmes.effects';
import { type ProgrammesState, programmesFeature } from './programmes.feature';

const summary = (name: string, date?: string, retiredAt?: string): ProgrammeSummary => ({
  id: `id-${name}`,
  name,
  nextMilestone: date ? { id: 'm', name: 'Clay freeze', date } : undefined,
  variantCount: 1,
  resultCount: 1,
  variantsWithoutResult: 0,
  retiredAt,
});
const PROGRAMME = { id: 'id-Dunlin', name: 'Dunlin', version: 3 } as Programme;
const after = (...actions: Action[]): ProgrammesState =>
  actions.reduce<ProgrammesState>(
    (state, action) => programmesFeature.reducer(state, action),
    programmesFeature.reducer(undefined, { type: 'start' }),
  );
const listPage = (state: ProgrammesState): ReturnType<typeof programmesFeature.selectListPage> =>
  programmesFeature.selectListPage({ programmes: state });

describe('the programmes’ slice', () => {
  it('puts the soonest milestone first, those without one last, retired ones apart', () => {
    const page = listPage(
      after(
        ProgrammesApiActions.loaded({
          summaries: [
            summary('Curlew'),
            summary('Dunlin', '2027-03-14'),
            summary('Old', '2020-01-01', '2021-01-01T00:00:00Z'),
            summary('Sanderling', '2026-12-20'),
          ],
        }),
      ),
    );
    expect(page.active.map(({ name }) => name)).toEqual(['Sanderling', 'Dunlin', 'Curlew']);
    expect(page.retired.map(({ name }) => name)).toEqual(['Old']);
  });

  it('keeps the list in view while it is asked for anew', () => {
    const state = after(
      ProgrammesApiActions.loaded({ summaries: [summary('Dunlin')] }),
      ProgrammesPageActions.opened(),
    );
    expect(listPage(state).loading).toEqual({ kind: 'ready' });
  });

  it('knows which programme the address is about', () => {
    const state = after(
      ProgrammesApiActions.loaded({ summaries: [summary('Dunlin')] }),
      ProgrammeAddressActions.entered({ programmeId: 'id-Dunlin' }),
    );
    expect(programmesFeature.selectInView({ programmes: state })?.name).toBe('Dunlin');
    const left = programmesFeature.reducer(state, ProgrammeAddressActions.left());
    expect(programmesFeature.selectInView({ programmes: left })).toBeUndefined();
  });

  it.each([
    ['/programmes', undefined],
    ['/programmes/new', undefined],
    ['/programmes/7a/ranking?order=energy', '7a'],
    ['/programmes/7a#x', '7a'],
    ['/cycles', undefined],
  ])('reads the programme from %s as %s', (address, id) => {
    expect(programmeIdIn(address)).toBe(id);
  });
});

describe('the programmes’ effects', () => {
  const conflict = new ApiProblem('conflict');

  const run = (
    api: Partial<ProgrammesApi>,
    effect: () => Observable<Action>,
    actions: Observable<Action>,
  ): Promise<Action[]> => {
    TestBed.configureTestingModule({
      providers: [provideMockActions(() => actions), { provide: ProgrammesApi, useValue: api }],
    });
    return firstValueFrom(TestBed.runInInjectionContext(effect).pipe(toArray()));
  };
  const change = of(
    ProgrammeFormPageActions.changeConfirmed({ programme: PROGRAMME, fields: PROGRAMME, commandKey: 'k' }),
  );

  it('say what was loaded, and what was not', async () => {
    const effect = (): Observable<Action> =>
      loadProgrammes(TestBed.inject(Actions), TestBed.inject(ProgrammesApi));
    const opened = of(ProgrammesPageActions.opened());
    expect(await run({ list: () => of([]) }, effect, opened)).toEqual([
      ProgrammesApiActions.loaded({ summaries: [] }),
    ]);
    TestBed.resetTestingModule();
    expect(await run({ list: () => throwError(() => conflict) }, effect, opened)).toEqual([
      ProgrammesApiActions.loadingFailed({ problem: conflict }),
    ]);
  });

  it('fetch what stands now when a colleague saved first', async () => {
    const theirs = { ...PROGRAMME, version: 4 };
    const effect = (): Observable<Action> =>
      changeProgramme(TestBed.inject(Actions), TestBed.inject(ProgrammesApi));
    expect(
      await run({ update: () => throwError(() => conflict), read: () => of(theirs) }, effect, change),
    ).toEqual([ProgrammesApiActions.conflictFound({ theirs })]);
  });

  it('take a second press while saving for the same wish', () => {
    const pending = new Subject<Programme>();
    const update = jest.fn(() => pending);
    const actions = new Subject<Action>();
    TestBed.configureTestingModule({
      providers: [provideMockActions(() => actions), { provide: ProgrammesApi, useValue: { update } }],
    });
    TestBed.runInInjectionContext(() =>
      changeProgramme(TestBed.inject(Actions), TestBed.inject(ProgrammesApi)),
    ).subscribe();
    const confirmed = ProgrammeFormPageActions.changeConfirmed({
      programme: PROGRAMME,
      fields: PROGRAMME,
      commandKey: 'k',
    });
    actions.next(confirmed);
    actions.next(confirmed);
    expect(update).toHaveBeenCalledTimes(1);
  });

  it('do not trouble anybody when the latest programme could not be remembered', async () => {
    const effect = (): Observable<Action> =>
      rememberOpened(TestBed.inject(Actions), TestBed.inject(ProgrammesApi)) as Observable<never>;
    const entered = of(ProgrammeAddressActions.entered({ programmeId: 'x' }));
    expect(await run({ opened: () => throwError(() => conflict) }, effect, entered)).toEqual([]);
  });
});
