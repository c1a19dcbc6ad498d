import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideStore } from '@ngrx/store';
import { of, throwError } from 'rxjs';
import type { TestPlan } from '#shared/contracts/test-plans';
import type { Variant } from '#shared/contracts/variants';
import { testPlanFields, variantFields } from '#shared/testing/domain-fields';
import {
  CLOSED_TUNNEL,
  ONE_FIFTH,
  PLANNED_PROGRAMME,
  POLICIES_IN_FORCE,
} from '../../../testing/planning-ground';
import { ApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { FacilitiesApi } from '../../data/facilities/facilities-api';
import { provideFacilities } from '../../data/facilities/provide-facilities';
import { TestPlansApi } from '../../data/test-plans/test-plans-api';
import { VariantsApi } from '../../data/variants/variants-api';
import { provideVariants } from '../../data/variants/provide-variants';
import { ECHARTS_LOADER } from '../../ui/chart/echarts-loader';
import { PlanPage } from './plan-page';

const HATCH = { ...variantFields(), id: 'hatch', programmeId: 'dunlin', version: 3 } as Variant;
const PLAN: TestPlan = {
  ...testPlanFields({ variantId: 'hatch', facilityId: 'tunnel' }, ONE_FIFTH, 'One fifth'),
  id: 'plan',
  programmeId: 'dunlin',
  version: 2,
  createdAt: '2026-09-01T08:00:00Z',
  createdBy: 'Ingrid',
};

async function opened(api: Partial<TestPlansApi> = {}, may = true) {
  TestBed.configureTestingModule({
    providers: [
      provideZonelessChangeDetection(),
      provideRouter([{ path: '**', component: PlanPage }]),
      provideStore({}),
      provideEffects(),
      provideVariants(),
      provideFacilities(),
      { provide: VariantsApi, useValue: { list: () => of([HATCH]) } },
      { provide: FacilitiesApi, useValue: { list: () => of([CLOSED_TUNNEL]) } },
      {
        provide: TestPlansApi,
        useValue: {
          read: () => of(PLAN),
          ground: () => of({ programme: PLANNED_PROGRAMME, policies: POLICIES_IN_FORCE }),
          evidence: () => of(null),
          ...api,
        },
      },
      { provide: Session, useValue: { may: () => may, member: signal(undefined) } },
      { provide: ECHARTS_LOADER, useValue: () => new Promise(() => undefined) },
    ],
  });
  const fixture = TestBed.createComponent(PlanPage);
  fixture.componentRef.setInput('programmeId', 'dunlin');
  fixture.componentRef.setInput('testPlanId', 'plan');
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  const field = (name: string): HTMLInputElement => {
    const input = host.querySelector<HTMLInputElement>(`[formControlName="${name}"]`);
    return input?.matches('input, select, textarea') ? input : input!.querySelector('input')!;
  };
  const type = async (name: string, text: string): Promise<void> => {
    field(name).value = text;
    field(name).dispatchEvent(new Event('input'));
    field(name).dispatchEvent(new Event('blur'));
    await fixture.whenStable();
  };
  const press = async (words: string): Promise<void> => {
    const button = [...host.querySelectorAll('button')].find((each) => each.textContent?.trim() === words);
    button!.click();
    await fixture.whenStable();
  };
  const save = async (): Promise<void> => {
    host.querySelector('form')?.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  };
  const answer = (): string => host.querySelector('#plan-answer')?.textContent?.replace(/\s+/g, ' ') ?? '';
  return { page: fixture.componentInstance, host, field, type, press, save, answer };
}

describe('the page of a planned test', () => {
  it('refuses one fifth at once, with the ways out, and computes a way anew when it is tried', async () => {
    const { page, answer, press, field, host } = await opened();
    expect(answer()).toContain('It cannot be run like this');
    expect(answer()).toContain('Mach 0.49');
    expect(page.hasUnsavedChanges()).toBe(false);
    expect(host.querySelectorAll('wl-ways-out-list li')).toHaveLength(5);
    await press('Try scale 0.327');
    expect(field('scale').value).toBe('0.327');
    expect(answer()).toContain('It can be run, with a caution');
    expect(page.hasUnsavedChanges()).toBe(true);
    expect(host.querySelector('wl-ways-out-list')).toBeNull();
  });

  it('sends what was typed with the version that was opened', async () => {
    const update = jest.fn(() => of({ ...PLAN, version: 3 }));
    const { type, save, page } = await opened({ update });
    await type('scale', '0,4');
    await type('speedKmh', '290');
    await save();
    expect(update).toHaveBeenCalledWith(
      PLAN,
      expect.objectContaining({
        name: 'One fifth',
        inputs: expect.objectContaining({
          scale: 0.4,
          speedKmh: 290,
          target: { basis: 'reference' },
        }) as object,
      }),
      expect.any(String),
    );
    expect(page.hasUnsavedChanges()).toBe(false);
  });

  it('keeps a temperature typed in kelvin, says so at its field and sends nothing', async () => {
    const update = jest.fn();
    const { type, save, field, host, answer } = await opened({ update });
    await type('tunnelTemperatureC', '293');
    expect(host.textContent).toContain('is it kelvin?');
    expect(answer()).toContain('Nothing to say yet');
    await save();
    expect(update).not.toHaveBeenCalled();
    expect(field('tunnelTemperatureC').value).toBe('293');
    expect(field('tunnelTemperatureC').getAttribute('aria-invalid')).toBe('true');
  });

  it('puts a refusal of the server at its field', async () => {
    const refusal = new ApiProblem('unusable-input', {
      type: '/problems/unusable-input',
      title: 'It cannot be used as it is.',
      status: 422,
      code: 'unusable-input',
      issues: [{ where: 'inputs.scale', detail: 'The model does not fit.' }],
    });
    const { save, host, field } = await opened({ update: () => throwError(() => refusal) });
    await save();
    expect(host.textContent).toContain('The model does not fit.');
    expect(field('scale').getAttribute('aria-invalid')).toBe('true');
  });

  it('makes a plan expected as it is saved, and not while something else is typed', async () => {
    const expectResults = jest.fn((_plan: unknown, expected: boolean) =>
      of(expected ? { ...PLAN, version: 3, expectedSince: '2026-09-02T08:00:00Z' } : PLAN),
    );
    const { type, press, host } = await opened({ expect: expectResults, results: () => of([]) });
    await press('Expect results from it');
    expect(expectResults).toHaveBeenCalledWith(PLAN, true);
    expect(host.textContent).toContain('results expected');
    expect(host.textContent).toContain('Did it go as planned?');

    await press('Expect no results any more');
    expectResults.mockClear();
    await type('speedKmh', '290');
    await press('Expect results from it');
    expect(expectResults).not.toHaveBeenCalled();
  });

  it('offers those who may only read neither a change nor a trial', async () => {
    const { host, field } = await opened({}, false);
    expect(host.querySelectorAll('button[type="submit"]')).toHaveLength(0);
    expect(host.querySelectorAll('input[type="range"]')).toHaveLength(0);
    expect(host.querySelectorAll('wl-ways-out-list button')).toHaveLength(0);
    expect(field('scale').disabled).toBe(true);
    expect(host.textContent).toContain('Sheet to hand over');
  });
});
