import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  ElementRef,
  effect,
  inject,
  input,
} from '@angular/core';
import { mathElement } from './math-markup';

/** A formula as native MathML, so that it can be read aloud and copied; its plain text where the markup is unusable. */
@Component({
  selector: 'wl-formula',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Formula {
  /** MathML, with or without the `math` element around it. */
  readonly markup = input.required<string>();
  readonly text = input('');

  constructor() {
    const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const document = inject(DOCUMENT);
    effect(() => host.replaceChildren(mathElement(this.markup(), document) ?? this.text()));
  }
}
