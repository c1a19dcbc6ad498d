import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { provideEffects } from '@ngrx/effects';
import { provideStore } from '@ngrx/store';
import type { Role } from '#shared/access/roles';
import type { Facility } from '#shared/contracts/facilities';
import type { CorrelationSummary } from '#shared/contracts/correlations';
import type { CheckMeasurement, TestSession } from '#shared/contracts/test-sessions';
import { facilityFields } from '#shared/testing/domain-fields';
import { signedInAs } from '../../../testing/members';
import { Session } from '../../core/session/session';
import { provideFacilities } from '../../data/facilities/provide-facilities';
import { ECHARTS_LOADER } from '../../ui/chart/echarts-loader';
import { FacilityPage } from './facility-page';

const ID = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0060';
const idOf = (n: number): string => `7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a01${String(n).padStart(2, '0')}`;
const BASE = `/api/v1/facilities/${ID}`;

interface Known {
  readonly facility?: Partial<Facility>;
  readonly means?: readonly number[];
  readonly correlations?: readonly CorrelationSummary[];
}

const sessionsOf = (count: number): TestSession[] =>
  Array.from({ length: count }, (_each, i) => ({
    id: idOf(i),
    facilityId: ID,
    name: `Entry ${i + 1}`,
    startDate: `2026-0${i + 1}-10`,
    version: 1,
    results: 0,
    installations: [],
    checkMeasurements: 1,
  }));

const measurementOf = (dragAreaM2: number, i: number): CheckMeasurement => ({
  id: idOf(50 + i),
  testSessionId: idOf(i),
  measuredOn: `2026-0${i + 1}-10`,
  dragAreaM2,
  checkBody: 'Grey box',
  enteredAt: `2026-0${i + 1}-10T10:00:00Z`,
  enteredBy: 'Ingrid',
});

describe('the facility page', () => {
  const chart = {
    setOption: jest.fn(),
    on: jest.fn(),
    off: jest.fn(),
    resize: jest.fn(),
    dispose: jest.fn(),
  };
  const init = () => ({ ...chart, isDisposed: () => false, getWidth: () => 400, getHeight: () => 300 });

  const open = async (
    role: Role,
    { facility = {}, means = [], correlations = [] }: Known,
    address = `/facilities/${ID}`,
  ) => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        provideEffects(),
        provideFacilities(),
        provideRouter(
          [{ path: 'facilities/:facilityId', component: FacilityPage }],
          withComponentInputBinding(),
        ),
        { provide: ECHARTS_LOADER, useValue: () => Promise.resolve({ init }) },
      ],
    });
    const http = TestBed.inject(HttpTestingController);
    const loaded = TestBed.inject(Session).load();
    http.expectOne('/api/v1/session').flush(signedInAs(role));
    await loaded;
    const harness = await RouterTestingHarness.create(address);
    const known = { ...facilityFields(), id: ID, version: 1, versionNumber: 1, ...facility };
    http.expectOne('/api/v1/facilities').flush({ facilities: [known] });
    const at = '2026-01-01T10:00:00Z';
    http.expectOne(`${BASE}/versions`).flush({ versions: [{ number: 1, at, fields: facilityFields() }] });
    http.expectOne(`${BASE}/evidence`).flush({
      programmes: [{ programmeId: ID, programmeName: 'Dunlin', results: 7 }],
    });
    http.expectOne(`${BASE}/sessions`).flush({ sessions: sessionsOf(means.length).toReversed() });
    http.expectOne(`${BASE}/check-measurements`).flush({ measurements: means.map(measurementOf) });
    // Asked for once the facility itself is there.
    harness.detectChanges();
    TestBed.tick();
    http.expectOne('/api/v1/correlations').flush({ correlations });
    await harness.fixture.whenStable();
    harness.detectChanges();
    return harness.fixture.nativeElement as HTMLElement;
  };
  const text = (host: HTMLElement): string => host.textContent?.replace(/\s+/g, ' ') ?? '';
  const checkBody = { name: 'Grey box' };

  it('says what to do first where there is no check body and no session', async () => {
    const host = await open('aerodynamicist', {});
    expect(text(host)).toContain('Name a check body');
    expect(text(host)).toContain('No session yet');
    expect(host.querySelector('wl-measurement-entry')).toBeNull();
  });

  it('asks for a session before anything is measured', async () => {
    const host = await open('aerodynamicist', { facility: { checkBody } });
    expect(text(host)).toContain('Add a session below first');
  });

  it('says the version, and leads to the results of each programme', async () => {
    const host = await open('aerodynamicist', { facility: { versionNumber: 3 } });
    expect(text(host)).toContain('Corrections, version 3');
    const link = host.querySelector(`a[href^="/programmes/${ID}/results"]`);
    expect(link?.getAttribute('href')).toContain('search=Halmere');
    expect(link?.textContent).toContain('7 results');
  });

  it('counts results without a link, and offers no change, to those who may do neither', async () => {
    const host = await open('viewer', { facility: { checkBody }, means: [0.6, 0.602, 0.598] });
    expect(host.querySelector('a[href^="/programmes"]')).toBeNull();
    expect(text(host)).toContain('7 results of Dunlin');
    for (const deed of ['Change the facility', 'Add a session', 'Strike out', 'Take over']) {
      expect(text(host)).not.toContain(deed);
    }
  });

  it('names the correlations that bring it elsewhere or others here, with the version in use', async () => {
    const correlation = {
      name: 'Model to full size',
      facilityId: ID,
      referenceFacilityId: idOf(90),
      latestNumber: 3,
    };
    const host = await open('viewer', {
      correlations: [
        { ...correlation, id: idOf(91), inUse: { versionNumber: 2, since: '2026-05-04' } },
        { ...correlation, id: idOf(92), name: 'Elsewhere', facilityId: idOf(93) },
      ],
    });
    expect(text(host)).toContain('Model to full size brings it to …; version 2 in use since 4 May 2026');
    expect(text(host)).not.toContain('Elsewhere');
    expect(host.querySelector('a[href^="/correlations/"]')).toBeNull();
  });

  const DRIFTING = [0.6, 0.602, 0.598, 0.601, 0.599, 0.62];

  it('warns of the newest session by the limits that the others set, and offers their scatter', async () => {
    const host = await open('aerodynamicist', { facility: { checkBody }, means: DRIFTING });
    expect(text(host)).toContain('Entry 6 is beyond the action limit');
    const link = Array.from(host.querySelectorAll('a')).find((a) => a.textContent?.includes('Take over'));
    // s of the five means: 0.00158 m² of 0.6 m², four degrees of freedom.
    expect(decodeURIComponent(link?.getAttribute('href') ?? '')).toContain('scatter=0.00264~4~');
  });

  it('takes the sessions that set the limits from the address, and says what they cannot show', async () => {
    const host = await open(
      'aerodynamicist',
      { facility: { checkBody }, means: DRIFTING },
      `/facilities/${ID}?limits=all`,
    );
    expect(text(host)).toContain('Fewer than eleven sessions set the limits');
    expect(text(host)).not.toContain('Entry 6 is beyond the action limit');
  });

  it('leaves out measurements of a body that the facility no longer names, and says so', async () => {
    const host = await open('viewer', {
      facility: { checkBody: { name: 'White estate' } },
      means: [0.6, 0.602],
    });
    expect(text(host)).toContain('2 measurements are of a body that the facility no longer names');
  });
});
