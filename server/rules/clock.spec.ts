import { dayOf, latestPastDay } from './clock';

describe('the clock', () => {
  it('names the day of a moment in UTC', () => {
    expect(dayOf(new Date('2026-12-01T23:59:59Z'))).toBe('2026-12-01');
  });

  it('does not call the morning in the far east future', () => {
    expect(latestPastDay(new Date('2026-12-01T09:00:00Z'))).toBe('2026-12-01');
    expect(latestPastDay(new Date('2026-12-01T10:00:00Z'))).toBe('2026-12-02');
  });
});
