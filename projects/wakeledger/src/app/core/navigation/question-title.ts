import { Injectable, inject } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';

/** The window's title is the page's question, then the product. */
@Injectable({ providedIn: 'root' })
export class QuestionTitle extends TitleStrategy {
  private readonly title = inject(Title);

  override updateTitle(snapshot: RouterStateSnapshot): void {
    const question = this.buildTitle(snapshot);
    this.title.setTitle(question ? `${question} · Wakeledger` : 'Wakeledger');
  }
}
