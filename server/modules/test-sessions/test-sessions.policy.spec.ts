import { checkMeasurementIssues, sessionIssues } from './test-sessions.policy';

const wheres = (issues: readonly { readonly where: string }[]) => issues.map(({ where }) => where);
const measured = { first: '2026-03-02', last: '2026-03-06' };

describe('a session', () => {
  it('may have no dates, a first day only, or one day', () => {
    for (const days of [
      {},
      { startDate: '2026-03-02' },
      { startDate: '2026-03-02', endDate: '2026-03-02' },
    ]) {
      expect(sessionIssues({ name: 'Spring', ...days }, undefined)).toEqual([]);
    }
  });

  it('is refused where it ends before it begins, or ends without beginning', () => {
    expect(
      wheres(sessionIssues({ name: 'S', startDate: '2026-03-02', endDate: '2026-03-01' }, measured)),
    ).toEqual(['endDate']);
    expect(wheres(sessionIssues({ name: 'S', endDate: '2026-03-01' }, undefined))).toEqual(['startDate']);
  });

  it('holds every day on which something of it was measured', () => {
    const within = { name: 'S', startDate: '2026-03-01', endDate: '2026-03-06' };
    expect(sessionIssues(within, measured)).toEqual([]);
    expect(wheres(sessionIssues({ ...within, startDate: '2026-03-03' }, measured))).toEqual(['startDate']);
    expect(wheres(sessionIssues({ ...within, endDate: '2026-03-05' }, measured))).toEqual(['endDate']);
  });
});

describe('a measurement of the check body', () => {
  const session = { name: 'Spring', startDate: '2026-03-02', endDate: '2026-03-06' };
  const fields = {
    testSessionId: '018f0000-0000-7000-8000-0000000000b1',
    measuredOn: '2026-03-03',
    dragAreaM2: 0.6,
  };
  const issuesWith = (change: Partial<typeof fields> & { s?: number; n?: number }) =>
    wheres(checkMeasurementIssues({ ...fields, ...change }, session, '2026-12-01'));

  it('passes within its session, on a day beside it, and in a session without dates', () => {
    expect(issuesWith({ s: 0.0004, n: 5 })).toEqual([]);
    expect(issuesWith({ measuredOn: '2026-03-01' })).toEqual([]);
    expect(checkMeasurementIssues(fields, { name: 'New' }, '2026-12-01')).toEqual([]);
  });

  it('is refused on a day that is still to come', () => {
    expect(issuesWith({ measuredOn: '2026-12-02' })).toEqual(['measuredOn']);
  });

  it.each(['2025-03-03', '2026-05-03'])('is refused on %s, far from its session', (measuredOn) => {
    expect(issuesWith({ measuredOn })).toEqual(['measuredOn']);
  });

  it.each([{ s: 0.001 }, { s: 0.001, n: 1 }])(
    'is refused with the scatter of a single reading, %j',
    (scatter) => {
      expect(issuesWith(scatter)).toEqual(['n']);
    },
  );
});
