import { TestBed } from '@angular/core/testing';
import { LEAVE_QUESTION, keepUnsavedChanges, warnBeforeUnload } from './unsaved-changes';

describe('unsaved changes', () => {
  const leave = async (dirty: boolean, answer: boolean): Promise<{ left: unknown; asked: number }> => {
    const question = jest.fn(() => Promise.resolve(answer));
    TestBed.configureTestingModule({ providers: [{ provide: LEAVE_QUESTION, useValue: question }] });
    const left = await TestBed.runInInjectionContext(() =>
      keepUnsavedChanges({ hasUnsavedChanges: () => dirty }, {} as never, {} as never, {} as never),
    );
    return { left, asked: question.mock.calls.length };
  };

  it('are asked about before the page is left', async () => {
    expect(await leave(true, false)).toEqual({ left: false, asked: 1 });
  });

  it('can be left behind on purpose', async () => {
    expect(await leave(true, true)).toEqual({ left: true, asked: 1 });
  });

  it('ask nothing where there are none', async () => {
    expect(await leave(false, false)).toEqual({ left: true, asked: 0 });
  });

  it('make the browser ask before the window closes', () => {
    let dirty = true;
    TestBed.runInInjectionContext(() => warnBeforeUnload(() => dirty));
    const close = (): boolean => window.dispatchEvent(new Event('beforeunload', { cancelable: true }));
    expect(close()).toBe(false);
    dirty = false;
    expect(close()).toBe(true);
  });
});
