import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Router, type UrlTree, provideRouter } from '@angular/router';
import { Store, createAction, createReducer, createSelector, on, props, provideStore } from '@ngrx/store';
import type { Permission } from '#shared/access/permissions';
import { OTHER_ORGANISATION_ID, signedInAs } from '../../../testing/members';
import { forgetOnMemberChange } from './forget-on-member-change';
import { Session } from './session';
import { needs, signedIn } from './session-guards';

const learnt = createAction('[Test] Learnt', props<{ secret: string }>());
const secrets = createReducer<readonly string[]>(
  [],
  on(learnt, (state, { secret }): readonly string[] => [...state, secret]),
);
const selectSecrets = createSelector(
  (state: { secrets: readonly string[] }) => state.secrets,
  (list) => list,
);

describe('the session', () => {
  let session: Session;
  let http: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([]),
        provideStore({ secrets }, { metaReducers: [forgetOnMemberChange] }),
      ],
    });
    session = TestBed.inject(Session);
    http = TestBed.inject(HttpTestingController);
  });

  const answer = (body: object): void =>
    http.expectOne((request) => request.url.startsWith('/api/v1/session')).flush(body);
  const load = async (body: object): Promise<void> => {
    const loaded = session.load();
    answer(body);
    await loaded;
  };
  const guard = (url: string): Promise<unknown> =>
    TestBed.runInInjectionContext(() => Promise.resolve(signedIn({} as never, { url } as never)));

  it('is asked for once', async () => {
    await load(signedInAs('stylist'));
    await session.load();
    http.expectNone('/api/v1/session');
    expect(session.member()?.displayName).toBe('Ines Farrow');
  });

  it('knows what the person may do', async () => {
    await load(signedInAs('stylist'));
    expect(session.may('ranking-view.read')).toBe(true);
    expect(session.may('results.read')).toBe(false);
  });

  it('forgets what the store holds when the organisation changes', async () => {
    await load(signedInAs('aerodynamicist'));
    const store = TestBed.inject(Store);
    const held = store.selectSignal(selectSecrets);
    store.dispatch(learnt({ secret: 'Dunlin' }));
    const switched = session.switchTo(OTHER_ORGANISATION_ID);
    answer(signedInAs('viewer', OTHER_ORGANISATION_ID));
    await switched;
    expect(held()).toEqual([]);
  });

  it('sends a stranger to sign-in and keeps the address asked for', async () => {
    const outcome = guard('/cycles?cycle=nedc');
    answer({});
    const tree = (await outcome) as UrlTree;
    expect(TestBed.inject(Router).serializeUrl(tree)).toBe('/sign-in?return=%2Fcycles%3Fcycle%3Dnedc');
  });

  it('does not keep the front door as an address', async () => {
    const outcome = guard('/programmes');
    answer({});
    expect(TestBed.inject(Router).serializeUrl((await outcome) as UrlTree)).toBe('/sign-in');
  });

  it('says so when the server cannot be reached', async () => {
    const outcome = guard('/cycles');
    http.expectOne('/api/v1/session').error(new ProgressEvent('error'));
    expect(await outcome).toMatchObject({ navigationBehaviorOptions: { skipLocationChange: true } });
  });

  it('opens a page to those who hold any of its permissions', async () => {
    await load(signedInAs('stylist'));
    const open = (...permissions: readonly Permission[]): unknown =>
      TestBed.runInInjectionContext(() => needs(...permissions)({} as never, {} as never));
    expect(open('ranking-inputs.read', 'ranking-view.read')).toBe(true);
    expect(open('results.read')).not.toBe(true);
  });
});
