import { TestBed } from '@angular/core/testing';
import { type Confirmation, askInDialog } from './confirm-dialog';

const QUESTION: Confirmation = {
  title: 'Retire it?',
  detail: 'It can be brought back.',
  confirm: 'Retire',
  cancel: 'Cancel',
};

describe('a confirmation', () => {
  const ask = (more: Partial<Confirmation> = {}): Promise<string | undefined> => {
    const answer = TestBed.runInInjectionContext(() => askInDialog({ ...QUESTION, ...more }));
    TestBed.tick();
    return answer;
  };
  const button = (words: string): HTMLButtonElement =>
    Array.from(document.querySelectorAll<HTMLButtonElement>('wl-confirm-dialog button')).find(
      (each) => each.textContent?.trim() === words,
    )!;
  afterEach(() => document.querySelector('.cdk-overlay-container')?.remove());

  it('is an alert dialog that names its question', () => {
    void ask();
    const dialog = document.querySelector('[role="alertdialog"]');
    expect(document.getElementById(dialog?.getAttribute('aria-labelledby') ?? '')?.textContent).toBe(
      'Retire it?',
    );
  });

  it('answers yes', async () => {
    const answer = ask();
    button('Retire').click();
    expect(await answer).toBe('');
  });

  it('answers no', async () => {
    const answer = ask();
    button('Cancel').click();
    expect(await answer).toBeUndefined();
  });

  it('waits for a reason where one is asked', async () => {
    const answer = ask({ reasonLabel: 'Reason' });
    expect(button('Retire').disabled).toBe(true);
    const reason = document.querySelector<HTMLTextAreaElement>('wl-confirm-dialog textarea')!;
    reason.value = ' wrong area ';
    reason.dispatchEvent(new Event('input'));
    TestBed.tick();
    button('Retire').click();
    expect(await answer).toBe('wrong area');
  });
});
