import { inputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Formula } from './formula';

const render = (markup: string, text = ''): HTMLElement => {
  const fixture = TestBed.createComponent(Formula, {
    bindings: [inputBinding('markup', signal(markup)), inputBinding('text', signal(text))],
  });
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
};

describe('a formula', () => {
  it('is native MathML', () => {
    const math = render('<mi>q</mi><mo>=</mo><mfrac><mn>1</mn><mn>2</mn></mfrac>').firstElementChild;
    expect(math?.namespaceURI).toBe('http://www.w3.org/1998/Math/MathML');
    expect(math?.querySelector('mfrac')?.children).toHaveLength(2);
  });

  it('makes no element or attribute that is not mathematics', () => {
    const host = render('<mi onclick="x()" href="javascript:x()">q</mi><script>x()</script><img src="x"/>');
    expect(host.innerHTML).toBe('<math><mi>q</mi></math>');
  });

  it('falls back to its text where the markup is not well-formed', () => {
    expect(render('<mi>q', 'q = F/A').textContent).toBe('q = F/A');
  });
});
