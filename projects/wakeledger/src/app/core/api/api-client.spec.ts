import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { firstValueFrom } from 'rxjs';
import { cycleList } from '#shared/contracts/cycles';
import { facilityRetire } from '#shared/contracts/facilities';
import { importUpload } from '#shared/contracts/import-endpoints';
import { ApiClient } from './api-client';
import type { ApiProblem } from './api-problem';
import { Connection } from './connection';

const FACILITY_ID = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0020';
const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;

describe('a call to the server', () => {
  let api: ApiClient;
  let http: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
    api = TestBed.inject(ApiClient);
    http = TestBed.inject(HttpTestingController);
  });
  afterEach(() => http.verify());

  const retire = (commandKey?: string): Promise<unknown> =>
    firstValueFrom(
      api.call(facilityRetire, {
        params: { facilityId: FACILITY_ID },
        body: { retired: true },
        ifMatch: 3,
        commandKey,
      }),
    );
  const refused = (call: Promise<unknown>): Promise<ApiProblem> =>
    call.then(
      () => Promise.reject(new Error('it should have been refused')),
      (problem: ApiProblem) => problem,
    );

  it('gives the parsed answer', async () => {
    const answer = firstValueFrom(api.call(cycleList, {}));
    http.expectOne({ method: 'GET', url: '/api/v1/cycles' }).flush({ cycles: [] });
    expect(await answer).toEqual({ cycles: [] });
  });

  it('does not pass on an answer that is not what the contract says', async () => {
    const problem = refused(firstValueFrom(api.call(cycleList, {})));
    http.expectOne('/api/v1/cycles').flush({ cycles: 'many' });
    expect((await problem).code).toBe('unreadable-answer');
  });

  it('carries a command’s key and the version that was edited', () => {
    void retire('my-own-key').catch(() => undefined);
    const { request } = http.expectOne(`/api/v1/facilities/${FACILITY_ID}/retirement`);
    expect(request.headers.get('Idempotency-Key')).toBe('my-own-key');
    expect(request.headers.get('If-Match')).toBe('"3"');
    expect(request.body).toEqual({ retired: true });
  });

  it('makes a new key for each command that names none', () => {
    void retire().catch(() => undefined);
    void retire().catch(() => undefined);
    const keys = http.match(() => true).map(({ request }) => request.headers.get('Idempotency-Key'));
    expect(keys[0]).toMatch(UUID);
    expect(keys[1]).toMatch(UUID);
    expect(keys[0]).not.toBe(keys[1]);
  });

  it('sends an upload as a form with the file in it', () => {
    const file = new File(['a,b'], 'runs.csv', { type: 'text/csv' });
    api
      .call(importUpload, { params: { programmeId: FACILITY_ID }, file })
      .subscribe({ error: () => undefined });
    const { request } = http.expectOne(`/api/v1/programmes/${FACILITY_ID}/imports`);
    expect((request.body as FormData).get('file')).toMatchObject({ name: 'runs.csv' });
  });

  it('turns a Problem object into its code and the fields it names', async () => {
    const problem = refused(retire());
    http
      .expectOne(() => true)
      .flush(
        {
          type: '/problems/unusable-input',
          title: 'The content cannot be used as it is.',
          status: 422,
          code: 'unusable-input',
          issues: [{ where: 'areaM2', detail: 'An open jet needs its nozzle area.' }],
        },
        { status: 422, statusText: 'Unprocessable' },
      );
    expect(await problem).toMatchObject({
      code: 'unusable-input',
      issues: [{ where: 'areaM2', detail: 'An open jet needs its nozzle area.' }],
    });
  });

  it('calls a broken answer of the server an error on our side', async () => {
    const problem = refused(retire());
    http.expectOne(() => true).flush('<html>', { status: 502, statusText: 'Bad Gateway' });
    expect((await problem).code).toBe('internal-error');
  });

  it('notices that the server cannot be reached, and that it can again', async () => {
    const connection = TestBed.inject(Connection);
    const problem = refused(firstValueFrom(api.call(cycleList, {})));
    http.expectOne('/api/v1/cycles').error(new ProgressEvent('error'));
    expect((await problem).code).toBe('no-connection');
    expect(connection.there()).toBe(false);

    const answer = firstValueFrom(api.call(cycleList, {}));
    http.expectOne('/api/v1/cycles').flush({ cycles: [] });
    await answer;
    expect(connection.there()).toBe(true);
  });

  it('says when the session has ended', async () => {
    const ended = jest.fn();
    api.sessionEnded.subscribe(ended);
    const problem = refused(firstValueFrom(api.call(cycleList, {})));
    http
      .expectOne('/api/v1/cycles')
      .flush(
        { type: '/problems/not-signed-in', title: 'x', status: 401, code: 'not-signed-in' },
        { status: 401, statusText: 'Unauthorized' },
      );
    await problem;
    expect(ended).toHaveBeenCalledTimes(1);
  });
});
