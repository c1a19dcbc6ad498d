import { Component, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { Preferences } from '../../core/preferences/preferences';
import { NumberField } from './number-field';

@Component({
  imports: [NumberField, ReactiveFormsModule],
  template: `<wl-number-field
    label="Mass"
    unit="kg"
    [formControl]="control"
    [minimum]="minimum()"
    [maximum]="maximum()"
  />`,
})
class Host {
  readonly control = new FormControl<number | null>(null);
  readonly minimum = signal<number | undefined>(0);
  readonly maximum = signal<number | undefined>(60000);
}

describe('a number field', () => {
  let fixture: ComponentFixture<Host>;
  let host: HTMLElement;
  beforeEach(() => {
    localStorage.clear();
    fixture = TestBed.createComponent(Host);
    host = fixture.nativeElement as HTMLElement;
    fixture.detectChanges();
  });

  const input = (): HTMLInputElement => host.querySelector('input')!;
  const type = (text: string): void => {
    input().value = text;
    input().dispatchEvent(new Event('input'));
    input().dispatchEvent(new Event('blur'));
    fixture.detectChanges();
  };
  const control = (): FormControl<number | null> => fixture.componentInstance.control;

  it('has its label, its unit and its range beside it', () => {
    expect(host.querySelector('label')?.htmlFor).toBe(input().id);
    expect(host.textContent).toContain('kg');
    expect(document.getElementById(input().getAttribute('aria-describedby') ?? '') ?? host).toBeTruthy();
    expect(host.textContent).toContain('0 to 60000\u00a0kg');
  });

  it('takes comma or point', () => {
    type('1450,5');
    expect(control().value).toBe(1450.5);
    type('1450.5');
    expect(control().value).toBe(1450.5);
  });

  it('asks which number is meant, keeps the text, and takes the answer', () => {
    type('1.450');
    expect(control().valid).toBe(false);
    const answers = Array.from(host.querySelectorAll<HTMLElement>('.asked button'));
    expect(answers.map((answer) => answer.textContent?.trim())).toEqual(['1.45', '1450']);
    answers[1]?.click();
    fixture.detectChanges();
    expect(control().value).toBe(1450);
    expect(control().valid).toBe(true);
    expect(input().value).toBe('1.450');
    expect(host.querySelector('.asked')).toBeNull();
  });

  it('keeps what cannot be read and says what would be accepted', () => {
    type('heavy');
    expect(input().value).toBe('heavy');
    expect(control().valid).toBe(false);
    expect(host.querySelector('.error')?.textContent).toContain('“heavy” is not a number');
    expect(input().getAttribute('aria-invalid')).toBe('true');
  });

  it('says the range when the number is outside it', () => {
    type('-5');
    expect(control().errors).toEqual({ range: true });
    expect(host.querySelector('.error')?.textContent).toContain('Accepted: 0 to 60000');
  });

  it('shows what the form puts on the control, as the server said it, until it is changed', () => {
    type('1450');
    control().setErrors({ server: 'The tyres carry 1400 kg at most.' });
    fixture.detectChanges();
    expect(host.querySelector('.error')?.textContent).toContain('1400 kg at most');
    type('1400');
    expect(host.querySelector('.error')?.textContent?.trim()).toBe('');
  });

  it('says that it is needed when the form is sent without it', () => {
    control().markAsTouched();
    fixture.detectChanges();
    expect(host.querySelector('.error')?.textContent).toContain('A number is needed here.');
  });

  it('shows a stored value in the person’s own way of writing', () => {
    TestBed.inject(Preferences).numberLocale.set('de-DE');
    control().setValue(1450.5);
    fixture.detectChanges();
    expect(input().value).toBe('1450,5');
  });

  it('does not ask about a value that it was given', () => {
    control().setValue(1.234);
    fixture.detectChanges();
    expect(host.querySelector('.asked')).toBeNull();
    expect(control().valid).toBe(true);
    expect(control().value).toBe(1.234);
  });
});
