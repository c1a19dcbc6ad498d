import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideStore } from '@ngrx/store';
import { of, throwError } from 'rxjs';
import type { Variant } from '#shared/contracts/variants';
import { variantFields } from '#shared/testing/domain-fields';
import { ApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { VariantsApi } from '../../data/variants/variants-api';
import { provideVariants } from '../../data/variants/provide-variants';
import { VariantFormPage } from './variant-form-page';

const HATCH = { ...variantFields(), id: 'hatch', programmeId: 'dunlin', version: 3 } as Variant;

async function opened(api: Partial<VariantsApi>, may = true) {
  TestBed.configureTestingModule({
    providers: [
      provideZonelessChangeDetection(),
      provideRouter([{ path: '**', component: VariantFormPage }]),
      provideStore({}),
      provideEffects(),
      provideVariants(),
      { provide: VariantsApi, useValue: { list: () => of([HATCH]), ...api } },
      { provide: Session, useValue: { may: () => may, member: signal(undefined) } },
    ],
  });
  const fixture = TestBed.createComponent(VariantFormPage);
  fixture.componentRef.setInput('programmeId', 'dunlin');
  fixture.componentRef.setInput('variantId', 'hatch');
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  const field = (label: string): HTMLInputElement => {
    const found = [...host.querySelectorAll('label')].find((each) => each.textContent?.trim() === label);
    return host.querySelector<HTMLInputElement>(`#${found?.htmlFor}`)!;
  };
  const type = (label: string, text: string): void => {
    field(label).value = text;
    field(label).dispatchEvent(new Event('input'));
  };
  const save = async (): Promise<void> => {
    host.querySelector('form')?.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  };
  return { page: fixture.componentInstance, host, field, type, save };
}

describe('the variant’s page', () => {
  it('sends what was typed with the version that was opened', async () => {
    const update = jest.fn(() => of({ ...HATCH, version: 4 }));
    const { page, type, save } = await opened({ update });
    expect(page.hasUnsavedChanges()).toBe(false);
    type('Height, optional', '1 440');
    expect(page.hasUnsavedChanges()).toBe(true);
    await save();
    expect(update).toHaveBeenCalledWith(
      HATCH,
      expect.objectContaining({ heightMm: 1440, name: HATCH.name }),
      expect.any(String),
    );
    expect(page.hasUnsavedChanges()).toBe(false);
  });

  it('puts a refusal at its field and keeps what was typed', async () => {
    const refusal = new ApiProblem('unusable-input', {
      type: '/problems/unusable-input',
      title: 'It cannot be used as it is.',
      status: 422,
      code: 'unusable-input',
      issues: [{ where: 'wheelbaseMm', detail: 'The wheelbase must be shorter than the car.' }],
    });
    const { host, field, type, save } = await opened({ update: () => throwError(() => refusal) });
    type('Wheelbase, optional', '9 999');
    await save();
    expect(field('Wheelbase, optional').value).toBe('9 999');
    expect(field('Wheelbase, optional').getAttribute('aria-invalid')).toBe('true');
    expect(host.textContent).toContain('The wheelbase must be shorter than the car.');
  });

  it('sends nothing that cannot be read', async () => {
    const update = jest.fn();
    const { host, type, save } = await opened({ update });
    type('Area', 'two');
    await save();
    expect(update).not.toHaveBeenCalled();
    expect(host.textContent).toContain('“two” is not a number.');
  });

  it('is for reading where the role does not include changes', async () => {
    const { page, host, field } = await opened({}, false);
    expect(field('Name').disabled).toBe(true);
    expect(host.querySelector('button[type=submit]')).toBeNull();
    expect(page.hasUnsavedChanges()).toBe(false);
  });
});
