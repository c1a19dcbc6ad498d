import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { CandidatePair, Correlation } from '#shared/contracts/correlations';
import { facilityFields } from '#shared/testing/domain-fields';
import { ECHARTS_LOADER } from '../../ui/chart/echarts-loader';
import { CorrelationFormPage } from './correlation-form-page';

// Forms of this size take their time on busy cores.
jest.setTimeout(30_000);

const idOf = (n: number): string => `7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a01${String(n).padStart(2, '0')}`;
const [SMALL, LARGE, ID] = [idOf(1), idOf(2), idOf(3)];

const candidate = (n: number): CandidatePair => ({
  programmeId: idOf(9),
  programmeName: 'Dunlin',
  variantId: idOf(10 + n),
  geometry: `Body ${n}`,
  resultId: idOf(20 + n),
  resultName: `S-${n}`,
  testDate: '2026-05-01',
  referenceResultId: idOf(40 + n),
  referenceResultName: `L-${n}`,
  referenceTestDate: '2026-06-01',
  dragAreaM2: 0.5 + 0.05 * n,
  uM2: 0.004,
  referenceDragAreaM2: 0.49 + 0.05 * n,
  referenceUM2: 0.003,
  newest: true,
  cautions: [],
  excludedBy: [],
});
const PAIRS = [0, 1, 2, 3, 4].map(candidate);

const SAVED: Correlation = {
  id: ID,
  name: 'Small to large',
  facilityId: SMALL,
  referenceFacilityId: LARGE,
  latestNumber: 2,
  adoptions: [],
  versions: [
    {
      id: idOf(60),
      number: 2,
      replaces: ['blockage'],
      comment: 'Second',
      at: '2026-06-01T10:00:00Z',
      by: 'Ingrid',
      pairs: [],
    },
  ],
};

describe('the form of a correlation', () => {
  const init = () => ({
    setOption: jest.fn(),
    on: jest.fn(),
    off: jest.fn(),
    resize: jest.fn(),
    dispose: jest.fn(),
    isDisposed: () => false,
    getWidth: () => 400,
    getHeight: () => 300,
  });
  /** Not until it is stable: what was answered makes the form ask for more. */
  const settled = async () => {
    for (let i = 0; i < 3; i++) {
      TestBed.tick();
      await Promise.resolve();
    }
  };
  const open = async (address: string) => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter(
          [
            { path: 'correlations/new', component: CorrelationFormPage },
            { path: 'correlations/:correlationId/new-version', component: CorrelationFormPage },
            { path: 'correlations/:correlationId', children: [] },
          ],
          withComponentInputBinding(),
        ),
        { provide: ECHARTS_LOADER, useValue: () => Promise.resolve({ init }) },
      ],
    });
    const harness = await RouterTestingHarness.create(address);
    const http = TestBed.inject(HttpTestingController);
    const facility = (id: string, name: string) => ({
      ...facilityFields({ name }),
      id,
      version: 1,
      versionNumber: 1,
    });
    http
      .expectOne('/api/v1/facilities')
      .flush({ facilities: [facility(SMALL, 'Burnholt'), facility(LARGE, 'Halmere')] });
    await settled();
    return { host: harness.routeNativeElement!, http, harness };
  };
  const set = (host: Element, name: string, value: string): void => {
    const field = host.querySelector<HTMLInputElement>(`[formControlName="${name}"]`)!;
    field.value = value;
    field.dispatchEvent(new Event('input'));
    field.dispatchEvent(new Event('change'));
  };
  const answerPairs = (http: HttpTestingController, replaces: string | null) => {
    const asked = http.expectOne(({ url }) => url.startsWith('/api/v1/correlation-pairs'));
    const address = new URL(asked.request.urlWithParams, 'http://here');
    expect(address.searchParams.get('replaces')).toBe(replaces);
    asked.flush({ pairs: PAIRS, refused: [] });
  };

  it('proposes pairs once both facilities are chosen, and saves them with the comment', async () => {
    const { host, http, harness } = await open('/correlations/new');
    set(host, 'name', 'Small to large');
    set(host, 'facilityId', SMALL);
    set(host, 'referenceFacilityId', LARGE);
    set(host, 'comment', 'Five bodies');
    TestBed.tick();
    answerPairs(http, null);
    await harness.fixture.whenStable();
    expect(host.querySelectorAll('wl-pair-table input[type="checkbox"]')).toHaveLength(5);
    expect(host.querySelector('wl-fit-panel')?.textContent).toContain('5, 3 degrees of freedom');
    host.querySelector('form#correlation')?.dispatchEvent(new Event('submit'));
    const sent = http.expectOne({ method: 'POST', url: '/api/v1/correlations' });
    expect(sent.request.body).toMatchObject({ name: 'Small to large', comment: 'Five bodies', replaces: [] });
    expect((sent.request.body as { readonly pairs: readonly unknown[] }).pairs).toHaveLength(5);
  });

  it('begins the next version with what the last one stood for, on the number that was seen', async () => {
    const { host, http, harness } = await open(`/correlations/${ID}/new-version`);
    http.expectOne(`/api/v1/correlations/${ID}`).flush(SAVED);
    await settled();
    answerPairs(http, 'blockage');
    await harness.fixture.whenStable();
    expect(host.querySelector<HTMLInputElement>('[formControlName="name"]')?.disabled).toBe(true);
    set(host, 'comment', 'Third');
    host.querySelector('form#correlation')?.dispatchEvent(new Event('submit'));
    const sent = http.expectOne({ method: 'POST', url: `/api/v1/correlations/${ID}/versions` });
    expect(sent.request.body).toMatchObject({ basedOnNumber: 2, replaces: ['blockage'], comment: 'Third' });
  });

  it('needs no correlation from a facility to itself, and says so', async () => {
    const { host, http, harness } = await open('/correlations/new');
    set(host, 'facilityId', SMALL);
    set(host, 'referenceFacilityId', SMALL);
    harness.detectChanges();
    expect(host.textContent).toContain('A facility needs no correlation to itself');
    http.expectNone(({ url }) => url.startsWith('/api/v1/correlation-pairs'));
  });
});
