import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { adjustmentFields } from '#shared/testing/domain-fields';
import { AdjustmentFormPage } from './adjustment-form-page';

const ID = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0099';

describe('the form of an adjustment', () => {
  const open = async (address: string) => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter(
          [
            { path: 'adjustments/new', component: AdjustmentFormPage },
            { path: 'adjustments/:adjustmentId', component: AdjustmentFormPage },
          ],
          withComponentInputBinding(),
        ),
      ],
    });
    const harness = await RouterTestingHarness.create(address);
    return { host: harness.routeNativeElement!, http: TestBed.inject(HttpTestingController), harness };
  };
  const control = (host: Element, label: string): HTMLInputElement => {
    const labels = [...host.querySelectorAll<HTMLLabelElement>('label')];
    const found = labels.find((each) => each.textContent?.trim() === label);
    return host.querySelector<HTMLInputElement>(`#${found?.htmlFor}`)!;
  };
  const type = (field: HTMLInputElement, text: string): void => {
    field.value = text;
    field.dispatchEvent(new Event('input'));
    field.dispatchEvent(new Event('change'));
  };

  it('begins with the difference that a result stayed out for', async () => {
    const { host } = await open('/adjustments/new?item=ground&from=fixed-floor&to=several-belts');
    expect(control(host, 'Item of the test condition').value).toBe('ground');
    expect(control(host, 'Measured with').value).toBe('fixed-floor');
    expect(control(host, 'Brought to').value).toBe('several-belts');
  });

  it('says what counts come to before anything is saved', async () => {
    const { host, harness } = await open('/adjustments/new');
    type(control(host, 'Typed in'), 'counts');
    harness.detectChanges();
    type(control(host, 'On the area'), '2.19');
    type(control(host, 'Added to the result'), '12');
    harness.detectChanges();
    expect(host.querySelector('[role="status"].note')?.textContent).toContain('Kept as 0.02628');
    expect(host.textContent).toContain('the aeronautical 0.0001 is never meant');
  });

  it('puts what the server says of an uncertainty of zero at that field, and keeps what was typed', async () => {
    const { host, http, harness } = await open(`/adjustments/${ID}`);
    const at = '2026-03-01T10:00:00Z';
    const known = { ...adjustmentFields(), id: ID, version: 3, addedAt: at, addedBy: 'Ingrid' };
    http.expectOne(`/api/v1/adjustments/${ID}`).flush(known);
    harness.detectChanges();
    type(control(host, 'Standard uncertainty u'), '0');
    host.querySelector('form')?.dispatchEvent(new Event('submit'));
    const sent = http.expectOne({ method: 'PUT', url: `/api/v1/adjustments/${ID}` });
    expect(sent.request.body).toMatchObject({ uM2: 0, item: 'ground' });
    expect(sent.request.headers.get('If-Match')).toBe('"3"');
    const issue = { where: 'uM2', detail: 'An uncertainty of zero is never known.' };
    sent.flush(
      {
        type: '/problems/unusable-input',
        title: 'The content cannot be used as it is.',
        status: 422,
        code: 'unusable-input',
        issues: [issue],
      },
      { status: 422, statusText: 'Unprocessable' },
    );
    harness.detectChanges();
    const field = control(host, 'Standard uncertainty u');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    expect(field.value).toBe('0');
    expect(field.closest('wl-number-field')?.textContent).toContain('never known');
  });
});
