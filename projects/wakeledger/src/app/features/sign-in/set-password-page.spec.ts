import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { provideStore } from '@ngrx/store';
import { signedInAs } from '../../../testing/members';
import { SetPasswordPage } from './set-password-page';

@Component({ template: '' })
class Elsewhere {}

const TOKEN = 'k3nV7cQm0pT4xW1yZ8bR5sD2';
const PASSWORD = 'herons wait by the weir';

describe('the page that sets a password', () => {
  let http: HttpTestingController;
  let harness: RouterTestingHarness;

  const open = async (fragment = TOKEN): Promise<HTMLElement> => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        provideRouter([
          { path: 'set-password', component: SetPasswordPage },
          { path: '**', component: Elsewhere },
        ]),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    harness = await RouterTestingHarness.create(`/set-password#${fragment}`);
    await settle();
    return harness.fixture.nativeElement as HTMLElement;
  };
  const settle = async (): Promise<void> => {
    // Two calls follow each other here: a turn of the event loop lets the first one's answer through.
    await new Promise((resolve) => setTimeout(resolve));
    await harness.fixture.whenStable();
    harness.detectChanges();
  };
  const input = (host: HTMLElement): HTMLInputElement =>
    host.querySelector<HTMLInputElement>('[formControlName="password"]')!;
  const choose = async (host: HTMLElement, password: string): Promise<void> => {
    input(host).value = password;
    input(host).dispatchEvent(new Event('input'));
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
    await settle();
  };
  const setting = () => http.expectOne('/api/v1/session/password-setting');
  const refuse = async (code: string, status: number, more: object = {}): Promise<void> => {
    setting().flush(
      { type: `/problems/${code}`, title: 'x', status, code, ...more },
      { status, statusText: 'Refused' },
    );
    await settle();
  };
  const done = async (): Promise<void> => {
    setting().flush({ email: 'ada@northgate.example', organisationSlug: 'northgate' });
    await settle();
  };

  it('spends the token of its address on the password', async () => {
    const host = await open();
    await choose(host, PASSWORD);
    const { request } = setting();
    expect(request.body).toEqual({ token: TOKEN, password: PASSWORD });
  });

  it('signs in as whom the link was for', async () => {
    const host = await open();
    await choose(host, PASSWORD);
    await done();
    const signIn = http.expectOne('/api/v1/session/password');
    expect(signIn.request.body).toEqual({
      email: 'ada@northgate.example',
      organisationSlug: 'northgate',
      password: PASSWORD,
    });
    signIn.flush(signedInAs('administrator'));
    await settle();
    expect(TestBed.inject(Router).url).toBe('/programmes');
  });

  it('says the rule beforehand, and sends nothing that breaks it', async () => {
    const host = await open();
    expect(host.textContent).toContain('At least 12 characters');
    await choose(host, 'too short');
    http.expectNone('/api/v1/session/password-setting');
    expect(input(host).getAttribute('aria-invalid')).toBe('true');
    expect(input(host).value).toBe('too short');
  });

  it('shows what is typed only when asked to', async () => {
    const host = await open();
    expect(input(host).type).toBe('password');
    const toggle = host.querySelector<HTMLButtonElement>('button[aria-pressed]')!;
    toggle.click();
    await settle();
    expect(input(host).type).toBe('text');
    expect(toggle.getAttribute('aria-pressed')).toBe('true');
  });

  it('says that a link was used or has run out, and what to do then', async () => {
    const host = await open();
    await choose(host, PASSWORD);
    await refuse('sign-in-refused', 401);
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('has been used or has run out');
    expect(host.querySelector('form')).toBeNull();
  });

  it('keeps what was typed when it has to wait', async () => {
    const host = await open();
    await choose(host, PASSWORD);
    await refuse('too-many-attempts', 429, { retryAfterS: 40 });
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('Try again in 40 seconds.');
    expect(input(host).value).toBe(PASSWORD);
  });

  it('asks for the whole link where the token is missing', async () => {
    const host = await open('abc');
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('not complete');
    expect(host.querySelector('form')).toBeNull();
  });

  it('says that the password stands when only signing in failed', async () => {
    const host = await open();
    await choose(host, PASSWORD);
    await done();
    http.expectOne('/api/v1/session/password').error(new ProgressEvent('error'));
    await settle();
    expect(host.querySelector('[role="status"]')?.textContent).toContain('has been set');
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('cannot be reached');
  });
});
