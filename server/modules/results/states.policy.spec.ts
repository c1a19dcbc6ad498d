import { checkIssues, withdrawalIssues } from './states.policy';

const result = (state: 'entered' | 'checked' | 'adopted' | 'superseded') => ({ name: `R-${state}`, state });
const withdrawn = {
  name: 'R-gone',
  state: 'withdrawn' as const,
  withdrawn: { at: '2026-10-01T08:00:00Z', by: 'Ines', reason: 'Belt stood still' },
};

describe('checking results', () => {
  it('takes what is only entered', () => {
    expect(checkIssues([result('entered'), result('entered')], 'checked')).toEqual([]);
  });

  it('names each one that cannot be checked, by its place in the list', () => {
    const issues = checkIssues([result('entered'), result('checked'), withdrawn], 'checked');
    expect(issues.map(({ where }) => where)).toEqual(['resultIds.1', 'resultIds.2']);
    expect(issues[1]?.detail).toContain('withdrawn already, by Ines');
  });

  it('is taken back of what is checked or superseded, not of what is adopted or never was checked', () => {
    expect(checkIssues([result('checked'), result('superseded')], 'entered')).toEqual([]);
    const issues = checkIssues([result('adopted'), result('entered')], 'entered');
    expect(issues.map(({ detail }) => detail)).toEqual([
      expect.stringContaining('is adopted'),
      expect.stringContaining('nothing to take back'),
    ]);
  });
});

describe('withdrawing results', () => {
  it('takes any that stands, once', () => {
    expect(withdrawalIssues([result('adopted'), result('entered')])).toEqual([]);
    expect(withdrawalIssues([result('checked'), withdrawn]).map(({ where }) => where)).toEqual([
      'resultIds.1',
    ]);
  });
});
