import { inputBinding, outputBinding, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { PairDecision, PairDraft } from './pair-drafts';
import { PairTable } from './pair-table';

const DRAFT: PairDraft = {
  key: 'k',
  pair: { geometry: 'Hatch', dragAreaM2: 0.61, uM2: 0.004, referenceDragAreaM2: 0.6, referenceUM2: 0.003 },
  origin: 'results',
  about: {
    resultNames: 'S-1 (2026-05-01), L-1 (2026-06-01)',
    programme: 'Dunlin',
    excludedBy: [],
    cautions: ['transition'],
  },
  included: true,
  reason: '',
  expected: true,
};

describe('the table of pairs', () => {
  const shown = (draft: PairDraft, strict = false) => {
    const decided = jest.fn((_told: { readonly key: string; readonly decision: PairDecision }) => undefined);
    const fixture = TestBed.createComponent(PairTable, {
      bindings: [
        inputBinding('drafts', signal([draft])),
        inputBinding('from', signal('Burnholt')),
        inputBinding('to', signal('Halmere')),
        inputBinding('strict', signal(strict)),
        outputBinding('decided', decided),
      ],
    });
    fixture.detectChanges();
    return { host: fixture.nativeElement as HTMLElement, decided };
  };

  it('says where a pair comes from and what to know of it, and tells that it is left out', () => {
    const { host, decided } = shown(DRAFT);
    expect(host.textContent).toContain('Dunlin: S-1 (2026-05-01), L-1 (2026-06-01)');
    expect(host.textContent).toContain('low Reynolds number');
    const box = host.querySelector<HTMLInputElement>('[aria-label="Take Hatch in"]');
    box?.click();
    expect(decided).toHaveBeenCalledWith({ key: 'k', decision: { included: false, reason: '' } });
  });

  it('asks for the reason at the pair that lacks one once the person saves, and takes what is typed', () => {
    const { host, decided } = shown({ ...DRAFT, included: false }, true);
    const reason = host.querySelector<HTMLInputElement>('[aria-label="Why Hatch is left out"]');
    expect(reason?.getAttribute('aria-invalid')).toBe('true');
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('Say why');
    reason!.value = 'Another mirror';
    reason!.dispatchEvent(new Event('input'));
    expect(decided).toHaveBeenCalledWith({
      key: 'k',
      decision: { included: false, reason: 'Another mirror' },
    });
  });
});
