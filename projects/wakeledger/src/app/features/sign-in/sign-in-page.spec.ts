import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { provideStore } from '@ngrx/store';
import { signedInAs } from '../../../testing/members';
import { SignInPage } from './sign-in-page';

@Component({ template: '' })
class Elsewhere {}

const DEMO_PERSON = {
  userId: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0040',
  displayName: 'Mirela Voss',
  role: 'stylist',
  organisationName: 'Aldermere Motors',
  task: 'Sees at once what a shape costs',
};

describe('the sign-in page', () => {
  let http: HttpTestingController;
  let harness: RouterTestingHarness;

  const open = async (
    address = '/sign-in',
    state: object = { demoPeople: [DEMO_PERSON] },
  ): Promise<HTMLElement> => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        provideRouter(
          [
            { path: 'sign-in', component: SignInPage },
            { path: '**', component: Elsewhere },
          ],
          withComponentInputBinding(),
        ),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    harness = await RouterTestingHarness.create(address);
    http.expectOne('/api/v1/session').flush(state);
    await settle();
    return harness.fixture.nativeElement as HTMLElement;
  };
  const settle = async (): Promise<void> => {
    await harness.fixture.whenStable();
    harness.detectChanges();
  };
  const type = (host: HTMLElement, name: string, text: string): void => {
    const input = host.querySelector<HTMLInputElement>(`[formControlName="${name}"]`)!;
    input.value = text;
    input.dispatchEvent(new Event('input'));
  };
  const signIn = (host: HTMLElement): void => {
    type(host, 'organisationSlug', 'aldermere');
    type(host, 'email', 'ines.farrow@aldermere.example');
    type(host, 'password', 'a long sentence');
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
  };

  it('keeps what was typed when it is refused, and says why without saying what was right', async () => {
    const host = await open();
    signIn(host);
    http
      .expectOne('/api/v1/session/password')
      .flush(
        { type: '/problems/sign-in-refused', title: 'x', status: 401, code: 'sign-in-refused' },
        { status: 401, statusText: 'Unauthorized' },
      );
    await settle();
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('is not right');
    expect(host.querySelector<HTMLInputElement>('[formControlName="email"]')?.value).toContain('ines.farrow');
    expect(host.querySelector<HTMLInputElement>('[formControlName="password"]')?.value).toBe(
      'a long sentence',
    );
  });

  it('says how long to wait after too many attempts', async () => {
    const host = await open();
    signIn(host);
    http.expectOne('/api/v1/session/password').flush(
      {
        type: '/problems/too-many-attempts',
        title: 'x',
        status: 429,
        code: 'too-many-attempts',
        retryAfterS: 40,
      },
      { status: 429, statusText: 'Too Many Requests' },
    );
    await settle();
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('Try again in 40 seconds.');
  });

  it('sends nothing while a field is empty, and says which', async () => {
    const host = await open();
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
    await settle();
    http.expectNone('/api/v1/session/password');
    expect(host.querySelectorAll('[aria-invalid="true"]')).toHaveLength(3);
  });

  it('leads back to the address asked for', async () => {
    const host = await open('/sign-in?return=%2Fcycles%3Fcycle%3Dnedc');
    signIn(host);
    http.expectOne('/api/v1/session/password').flush(signedInAs('aerodynamicist'));
    await settle();
    expect(TestBed.inject(Router).url).toBe('/cycles?cycle=nedc');
  });

  it.each(['//elsewhere.example/x', 'https://elsewhere.example', '/sign-in'])(
    'does not lead to %s',
    async (address) => {
      const host = await open(`/sign-in?return=${encodeURIComponent(address)}`);
      signIn(host);
      http.expectOne('/api/v1/session/password').flush(signedInAs('viewer'));
      await settle();
      expect(TestBed.inject(Router).url).toBe('/programmes');
    },
  );

  it('offers each demo person with what they do, and continues as them', async () => {
    const host = await open();
    const person = host.querySelector<HTMLElement>('.demo button')!;
    expect(person.textContent).toContain('Mirela Voss');
    expect(person.textContent).toContain('Sees at once what a shape costs');
    person.click();
    const { request } = http.expectOne('/api/v1/session/demo');
    expect(request.body).toEqual({ userId: DEMO_PERSON.userId });
  });

  it('offers nobody outside the demo', async () => {
    expect((await open('/sign-in', {})).querySelector('.demo')).toBeNull();
  });
});
