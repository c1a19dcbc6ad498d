import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideStore } from '@ngrx/store';
import { of, throwError } from 'rxjs';
import { policyValues, type PolicyVersion } from '#shared/contracts/policies';
import { DEFAULT_LIMITS } from '#shared/core/checks/limits';
import { ApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { PoliciesApi, type PolicyChange } from '../../data/policies/policies-api';
import { providePolicies } from '../../data/policies/provide-policies';
import { PoliciesPage } from './policies-page';

const SUPPLIED: PolicyVersion = { number: 0, values: policyValues.parse(DEFAULT_LIMITS) };
const FIRST: PolicyVersion = {
  number: 1,
  values: { ...SUPPLIED.values, blockageCaution: 0.04 },
  comment: 'The section is short',
  at: '2026-03-02T09:00:00Z',
  by: 'Ines Farrow',
};

async function opened(api: Partial<PoliciesApi> = {}, may = true) {
  TestBed.configureTestingModule({
    providers: [
      provideZonelessChangeDetection(),
      provideRouter([{ path: '**', component: PoliciesPage }]),
      provideStore({}),
      provideEffects(),
      providePolicies(),
      { provide: PoliciesApi, useValue: { list: () => of([FIRST, SUPPLIED]), ...api } },
      { provide: Session, useValue: { may: () => may, member: signal(undefined) } },
    ],
  });
  const fixture = TestBed.createComponent(PoliciesPage);
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  const group = (name: string): HTMLElement => host.querySelector<HTMLElement>(`[aria-label="${name}"]`)!;
  const inputs = (name: string): readonly HTMLInputElement[] => [...group(name).querySelectorAll('input')];
  const type = (field: HTMLInputElement | HTMLTextAreaElement, text: string): void => {
    field.value = text;
    field.dispatchEvent(new Event('input'));
  };
  const because = (text: string): void => type(host.querySelector('textarea')!, text);
  const save = async (): Promise<void> => {
    await fixture.whenStable();
    host.querySelector('form')?.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  };
  return { page: fixture.componentInstance, host, group, inputs, type, because, save };
}

describe('the page of the limits', () => {
  it('shows each limit with what it does, what was supplied, and which are one’s own', async () => {
    const { host, group, inputs } = await opened();
    expect(inputs('Mach number').map(({ value }) => value)).toEqual(['0.2', '0.3']);
    expect(inputs('Blockage, closed test section').map(({ value }) => value)).toEqual(['4', '10']);
    expect(group('Blockage, closed test section').textContent).toMatch(/your own.*supplied: 5\u202f%/s);
    expect(group('Mach number').textContent).not.toContain('your own');
    expect(host.querySelectorAll('tbody tr')).toHaveLength(9);
  });

  it('tells every version with its author, its reason and what changed', async () => {
    const { host } = await opened();
    const history = host.querySelector('wl-policy-history')?.textContent?.replace(/\s+/g, ' ');
    expect(history).toContain('2 March 2026, Ines Farrow: The section is short');
    expect(history).toMatch(/Blockage, closed test section: caution above: 5\s%\s→\s4\s%/);
    expect(history).toContain('Version 0, as the product comes');
  });

  it('puts a change in force with its reason and the version that was seen', async () => {
    const change = jest.fn((sent: PolicyChange) =>
      of({ ...FIRST, number: 2, values: sent.values, comment: sent.comment }),
    );
    const { page, host, inputs, type, because, save } = await opened({ change });
    type(inputs('Transition')[0]!, '2,5');
    because('Lessons of the spring entry');
    expect(page.hasUnsavedChanges()).toBe(true);
    await save();
    expect(change).toHaveBeenCalledWith(
      {
        expectedNumber: 1,
        values: { ...FIRST.values, minimumReynolds: 2.5e6 },
        comment: 'Lessons of the spring entry',
      },
      expect.any(String),
    );
    expect(page.hasUnsavedChanges()).toBe(false);
    expect(host.querySelector('.wl-aside')?.textContent).toBe('version 2');
  });

  it('refuses a caution beyond the exclusion at its field and keeps what was typed', async () => {
    const change = jest.fn();
    const { host, inputs, type, because, save } = await opened({ change });
    const [caution] = inputs('Mach number');
    type(caution!, '0.4');
    because('Wrong on purpose');
    await save();
    expect(change).not.toHaveBeenCalled();
    expect(caution!.value).toBe('0.4');
    expect(caution!.getAttribute('aria-invalid')).toBe('true');
    expect(host.textContent).toContain('The caution would begin only where results are excluded already.');
  });

  it('needs a reason', async () => {
    const change = jest.fn();
    const { host, inputs, type, save } = await opened({ change });
    type(inputs('Transition')[0]!, '3');
    await save();
    expect(change).not.toHaveBeenCalled();
    expect(host.querySelector('textarea')?.getAttribute('aria-invalid')).toBe('true');
  });

  it('puts what the server refuses at its field', async () => {
    const refusal = new ApiProblem('unusable-input', {
      type: '/problems/unusable-input',
      title: 'It cannot be used as it is.',
      status: 422,
      code: 'unusable-input',
      issues: [
        { where: 'values.plausible.1.dragCoefficient.to', detail: 'Choose an end above its beginning.' },
      ],
    });
    const { host, inputs, type, because, save } = await opened({ change: () => throwError(() => refusal) });
    type(inputs('Transition')[0]!, '3');
    because('A reason');
    await save();
    const row = [...host.querySelectorAll('tbody tr')][1];
    expect(row?.querySelectorAll('input')[1]?.getAttribute('aria-invalid')).toBe('true');
  });

  it('is for reading where the role does not include changes', async () => {
    const { host, inputs } = await opened({}, false);
    expect(inputs('Mach number').every(({ disabled }) => disabled)).toBe(true);
    expect(host.querySelector('button[type="submit"]')).toBeNull();
    expect(host.textContent).toContain('an aerodynamicist changes them');
  });
});
