import { daysUntil, daysUntilWords } from './days-until';

describe('days until a milestone', () => {
  it('are calendar days, whatever the hour', () => {
    expect(daysUntil('2026-03-14', new Date(2025, 11, 1, 23, 59))).toBe(103);
    expect(daysUntil('2026-03-14', new Date(2026, 2, 14, 0, 1))).toBe(0);
    expect(daysUntil('2026-03-30', new Date(2026, 2, 28, 12))).toBe(2);
  });

  it('read as a person says them', () => {
    expect([103, 1, 0, -1, -5].map(daysUntilWords)).toEqual([
      'in 103 days',
      'tomorrow',
      'today',
      'yesterday',
      '5 days ago',
    ]);
  });
});
