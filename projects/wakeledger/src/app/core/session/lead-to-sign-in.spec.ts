import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { facilityList } from '#shared/contracts/facilities';
import { ApiClient } from '../api/api-client';
import { leadToSignIn } from './lead-to-sign-in';

@Component({ template: '' })
class AnyPage {}

describe('a session that the server no longer knows', () => {
  let http: HttpTestingController;

  const open = async (address: string): Promise<RouterTestingHarness> => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: '**', component: AnyPage }]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    TestBed.runInInjectionContext(leadToSignIn);
    return RouterTestingHarness.create(address);
  };
  const refuse = (code: string, status: number): void => {
    TestBed.inject(ApiClient)
      .call(facilityList, {})
      .subscribe({ error: () => undefined });
    http
      .expectOne('/api/v1/facilities')
      .flush({ type: `/problems/${code}`, title: 'x', status, code }, { status, statusText: 'Refused' });
  };

  it('leads to sign-in, which knows the way back', async () => {
    const harness = await open('/facilities?search=hal');
    refuse('not-signed-in', 401);
    refuse('not-signed-in', 401);
    await harness.fixture.whenStable();
    const router = TestBed.inject(Router);
    expect(router.parseUrl(router.url).queryParams).toEqual({ return: '/facilities?search=hal' });
    expect(router.url).toMatch(/^\/sign-in\?/);
  });

  it('is not seen in another refusal', async () => {
    const harness = await open('/facilities');
    refuse('forbidden', 403);
    await harness.fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe('/facilities');
  });

  it('leaves alone who is at sign-in already', async () => {
    const harness = await open('/sign-in?return=%2Fcycles');
    refuse('not-signed-in', 401);
    await harness.fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe('/sign-in?return=%2Fcycles');
  });
});
