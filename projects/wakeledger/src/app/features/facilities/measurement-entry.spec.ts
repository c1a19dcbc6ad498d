import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { inputBinding, outputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideStore } from '@ngrx/store';
import type { TestSession } from '#shared/contracts/test-sessions';
import { MeasurementEntry } from './measurement-entry';

const FACILITY = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0060';
const SESSION = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0061';
const ADDRESS = `/api/v1/facilities/${FACILITY}/check-measurements`;

const session: TestSession = {
  id: SESSION,
  facilityId: FACILITY,
  name: 'Spring',
  startDate: '2026-03-02',
  version: 1,
  results: 0,
  installations: [],
  checkMeasurements: 0,
};

describe('entering a measurement of the check body', () => {
  const entered = jest.fn();
  const open = async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideStore({})],
    });
    const fixture = TestBed.createComponent(MeasurementEntry, {
      bindings: [
        inputBinding('facilityId', signal(FACILITY)),
        inputBinding('sessions', signal([session])),
        outputBinding('entered', entered),
      ],
    });
    const settle = async (): Promise<void> => {
      // The answer is awaited as a promise: its consequences come a turn later.
      await new Promise((resolve) => setTimeout(resolve));
      await fixture.whenStable();
    };
    await settle();
    const host = fixture.nativeElement as HTMLElement;
    const field = (label: string): HTMLInputElement => {
      const found = Array.from(host.querySelectorAll('label')).find((each) =>
        each.textContent?.includes(label),
      );
      return host.querySelector<HTMLInputElement>(`#${found?.getAttribute('for') ?? 'none'}`)!;
    };
    const type = (label: string, text: string): void => {
      field(label).value = text;
      field(label).dispatchEvent(new Event('input'));
    };
    const submit = async (): Promise<void> => {
      host.querySelector('form')?.dispatchEvent(new Event('submit'));
      await settle();
    };
    return { host, field, type, submit, settle, http: TestBed.inject(HttpTestingController) };
  };
  beforeEach(() => entered.mockClear());

  it('offers the newest session and its first day', async () => {
    const { field } = await open();
    expect(field('Session').value).toBe(SESSION);
    expect(field('Measured on').value).toBe('2026-03-02');
  });

  it('sends nothing while no drag area is typed, and says what is needed', async () => {
    const { host, submit, http } = await open();
    await submit();
    http.expectNone(ADDRESS);
    expect(host.textContent).toContain('A number is needed here');
  });

  it('sends what was typed with a comma, and clears it for the next', async () => {
    const { type, field, submit, http, settle } = await open();
    type('Drag area', '0,6123');
    type('s of one reading', '0.0004');
    type('Readings', '5');
    await submit();
    const request = http.expectOne(ADDRESS);
    expect(request.request.body).toEqual({
      testSessionId: SESSION,
      measuredOn: '2026-03-02',
      dragAreaM2: 0.6123,
      s: 0.0004,
      n: 5,
    });
    request.flush({
      ...(request.request.body as object),
      id: FACILITY,
      checkBody: 'Grey box',
      enteredAt: '2026-03-02T10:00:00Z',
      enteredBy: 'Ingrid',
    });
    await settle();
    expect(entered).toHaveBeenCalledTimes(1);
    expect(field('Drag area').value).toBe('');
    expect(field('Measured on').value).toBe('2026-03-02');
  });

  it('puts what the server refuses at its field and keeps what was typed', async () => {
    const { host, type, field, submit, http, settle } = await open();
    type('Drag area', '0.6123');
    type('s of one reading', '0.0004');
    await submit();
    const detail = 'A standard deviation comes from at least two readings.';
    http.expectOne(ADDRESS).flush(
      {
        type: '/problems/unusable-input',
        title: 'The content cannot be used as it is.',
        status: 422,
        code: 'unusable-input',
        where: 'n',
        detail,
        issues: [{ where: 'n', detail }],
      },
      { status: 422, statusText: 'Unprocessable' },
    );
    await settle();
    expect(field('Readings').getAttribute('aria-invalid')).toBe('true');
    expect(host.textContent).toContain(detail);
    expect(field('Drag area').value).toBe('0.6123');
    expect(entered).not.toHaveBeenCalled();
  });
});
