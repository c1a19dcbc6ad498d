import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { provideStore } from '@ngrx/store';
import { OTHER_ORGANISATION_ID, signedInAs } from '../../../testing/members';
import { Session } from '../session/session';
import { PersonMenu } from './person-menu';

@Component({ imports: [PersonMenu], template: '<wl-person-menu />' })
class AnyPage {}

describe('the person’s menu', () => {
  let http: HttpTestingController;
  let harness: RouterTestingHarness;
  let mayLeave: boolean;

  const settle = async (): Promise<void> => {
    await new Promise((resolve) => setTimeout(resolve));
    await harness.fixture.whenStable();
    harness.detectChanges();
  };
  const openAt = async (address: string): Promise<void> => {
    mayLeave = true;
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        provideRouter([
          { path: 'programmes', component: AnyPage },
          { path: '**', component: AnyPage, canDeactivate: [() => mayLeave] },
        ]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    const loaded = TestBed.inject(Session).load();
    http.expectOne('/api/v1/session').flush(signedInAs('aerodynamicist'));
    await loaded;
    harness = await RouterTestingHarness.create(address);
  };
  const press = async (words: string): Promise<void> => {
    const host = harness.fixture.nativeElement as HTMLElement;
    [...host.querySelectorAll('button')].find((each) => each.textContent?.trim() === words)?.click();
    await settle();
  };

  it.each(['/programmes', '/facilities'])(
    'switches the organisation from %s, and leads to the other one’s programmes',
    async (address) => {
      await openAt(address);
      await press('Velthorpe Coachworks');
      const { request } = http.expectOne('/api/v1/session/organisation');
      expect(request.body).toEqual({ organisationId: OTHER_ORGANISATION_ID });
      expect(TestBed.inject(Router).url).toBe('/programmes');
    },
  );

  it('stays where it is when the page objects to being left', async () => {
    await openAt('/facilities');
    mayLeave = false;
    await press('Velthorpe Coachworks');
    http.expectNone('/api/v1/session/organisation');
    expect(TestBed.inject(Router).url).toBe('/facilities');
  });

  it('signs out and leads to sign-in', async () => {
    await openAt('/programmes');
    await press('Sign out');
    const signedOut = http.expectOne('/api/v1/session');
    expect(signedOut.request.method).toBe('DELETE');
    signedOut.flush({});
    await settle();
    expect(TestBed.inject(Router).url).toBe('/sign-in');
  });
});
