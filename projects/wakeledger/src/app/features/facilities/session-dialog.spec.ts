import { DIALOG_DATA, DialogRef } from '@angular/cdk/dialog';
import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideStore } from '@ngrx/store';
import type { TestSession } from '#shared/contracts/test-sessions';
import { SessionDialog } from './session-dialog';

const FACILITY = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0060';
const BASE = `/api/v1/facilities/${FACILITY}/sessions`;
const session: TestSession = {
  id: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0061',
  facilityId: FACILITY,
  name: 'Spring',
  startDate: '2026-03-02',
  version: 4,
  results: 3,
  installations: [],
  checkMeasurements: 0,
};
const refusal = (status: number, code: string, more: object = {}) =>
  [
    { type: `/problems/${code}`, title: 'Refused.', status, code, ...more },
    { status, statusText: 'Refused' },
  ] as const;

describe('the dialog of a session', () => {
  const close = jest.fn();
  const open = async (known?: TestSession) => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideStore({}),
        { provide: DialogRef, useValue: { close } },
        { provide: DIALOG_DATA, useValue: { facilityId: FACILITY, ...(known ? { session: known } : {}) } },
      ],
    });
    const fixture = TestBed.createComponent(SessionDialog);
    const settle = async (): Promise<void> => {
      // The answer is awaited as a promise: its consequences come a turn later.
      await new Promise((resolve) => setTimeout(resolve));
      await fixture.whenStable();
    };
    await settle();
    const host = fixture.nativeElement as HTMLElement;
    const name = host.querySelector<HTMLInputElement>('input[formControlName="name"]')!;
    const save = async (typed: string): Promise<void> => {
      name.value = typed;
      name.dispatchEvent(new Event('input'));
      host.querySelector('form')?.dispatchEvent(new Event('submit'));
      await settle();
    };
    return { host, name, save, settle, http: TestBed.inject(HttpTestingController) };
  };
  beforeEach(() => close.mockClear());

  it('adds a session and hands it on', async () => {
    const { save, http, settle } = await open();
    await save('Autumn');
    const request = http.expectOne(BASE);
    expect(request.request.body).toEqual({ name: 'Autumn' });
    request.flush({ ...session, name: 'Autumn' });
    await settle();
    expect(close).toHaveBeenCalledWith(expect.objectContaining({ name: 'Autumn' }));
  });

  it('stays open with what was typed where the name is taken', async () => {
    const { host, name, save, http, settle } = await open();
    await save('Spring');
    http
      .expectOne(BASE)
      .flush(...refusal(409, 'already-exists', { where: 'name', detail: '“Spring” is taken.' }));
    await settle();
    expect(close).not.toHaveBeenCalled();
    expect(name.value).toBe('Spring');
    expect(name.getAttribute('aria-invalid')).toBe('true');
    expect(host.textContent).toContain('“Spring” is taken.');
  });

  it('changes with the version that was seen, and asks where a colleague was first', async () => {
    const { save, http, settle } = await open(session);
    await save('Spring, second week');
    const request = http.expectOne(`${BASE}/${session.id}`);
    expect(request.request.headers.get('If-Match')).toContain('4');
    request.flush(...refusal(409, 'conflict', { currentVersion: 5 }));
    await settle();
    http.expectOne(`${BASE}/${session.id}`).flush({ ...session, name: 'Spring of 2026', version: 5 });
    await settle();
    const dialog = document.querySelector('wl-conflict-dialog');
    expect(dialog?.textContent).toContain('Spring of 2026');
    expect(dialog?.textContent).toContain('Spring, second week');
    expect(close).not.toHaveBeenCalled();
  });
});
