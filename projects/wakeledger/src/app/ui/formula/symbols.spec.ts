import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Symbols } from './symbols';

const render = (text: string): HTMLElement => {
  const fixture = TestBed.createComponent(Symbols, { bindings: [inputBinding('text', signal(text))] });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
};

describe('text with symbols', () => {
  it('lowers what stands behind an underscore, and adds no space', () => {
    const host = render('ν_k = 1.5 m²/s, C_D·A, f_0');
    expect([...host.querySelectorAll('sub')].map((sub) => sub.textContent)).toEqual(['k', 'D', '0']);
    expect(host.textContent).toBe('νk = 1.5 m²/s, CD·A, f0');
  });

  it('leaves other text as it is', () => {
    expect(render('3 _ 4').textContent).toBe('3 _ 4');
  });
});
