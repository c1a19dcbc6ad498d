import { inUseOn, usedFrom, wordOn } from './use-of-versions.policy';

const FIRST = { versionNumber: 1, effectiveDate: '2026-03-01' };
const SECOND = { versionNumber: 2, effectiveDate: '2026-06-01' };
const END = { effectiveDate: '2026-09-01' };

describe('which version of a correlation is used', () => {
  it('is none before the first date, then each from its own date on, then none after the end', () => {
    const words = [FIRST, SECOND, END];
    expect(inUseOn(words, '2026-02-28')).toBeUndefined();
    expect(inUseOn(words, '2026-03-01')).toEqual({ versionNumber: 1, since: '2026-03-01' });
    expect(inUseOn(words, '2026-06-01')).toEqual({ versionNumber: 2, since: '2026-06-01' });
    expect(inUseOn(words, '2026-09-01')).toBeUndefined();
  });

  it('follows the dates and not the order of saying; of one date what was said last holds', () => {
    expect(inUseOn([SECOND, FIRST], '2026-07-01')).toEqual({ versionNumber: 2, since: '2026-06-01' });
    expect(wordOn([FIRST, { ...FIRST, versionNumber: 3 }], '2026-03-01')?.versionNumber).toBe(3);
  });

  it('counts as used from a day on where a version is planned for later', () => {
    expect(usedFrom([SECOND], '2026-01-01')).toBe(true);
    expect(usedFrom([SECOND, END], '2026-09-01')).toBe(false);
    expect(usedFrom([], '2026-01-01')).toBe(false);
  });
});
