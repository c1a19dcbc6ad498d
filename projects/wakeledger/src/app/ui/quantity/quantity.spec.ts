import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Preferences } from '../../core/preferences/preferences';
import { Quantity } from './quantity';
import type { QuantityKind } from './quantity-kinds';

const render = (kind: QuantityKind, value: number | undefined, expandedU?: number): HTMLElement => {
  const fixture = TestBed.createComponent(Quantity, {
    bindings: [
      inputBinding('kind', signal(kind)),
      inputBinding('value', signal(value)),
      inputBinding('expandedU', signal(expandedU)),
    ],
  });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
};

describe('a quantity', () => {
  beforeEach(() => localStorage.clear());

  it('is value ± U unit, the uncertainty set smaller', () => {
    const host = render('drag-area', 0.5942, 0.0081);
    expect(host.textContent).toBe('0.594\u00a0±\u00a00.008\u202fm²');
    expect(host.querySelector('.u')?.textContent).toContain('0.008');
  });

  it('shows what is missing as a dash, never as 0', () => {
    const host = render('coefficient', undefined);
    expect(host.textContent).toContain('–');
    expect(host.textContent).toContain('no figure');
  });

  it('applies the person’s units and locale', () => {
    const preferences = TestBed.inject(Preferences);
    preferences.speed.set('mph');
    preferences.energy.set('kWh/100 km');
    preferences.numberLocale.set('de-DE');
    expect(render('speed', 160.9344).textContent).toBe('100,0\u202fmph');
    expect(render('energy-per-distance', 124.9).textContent).toBe('12,49\u202fkWh/100\u00a0km');
  });
});
