import type { CheckMeasurement } from '#shared/contracts/test-sessions';
import { chartSessions, countingMeasurements, limitsChoice } from './check-sessions';

const measurement = (change: Partial<CheckMeasurement>): CheckMeasurement => ({
  id: 'm1',
  testSessionId: 's1',
  measuredOn: '2026-03-03',
  dragAreaM2: 0.6,
  checkBody: 'Grey box',
  enteredAt: '2026-03-03T10:00:00Z',
  enteredBy: 'Ingrid',
  ...change,
});
const session = (id: string, date: string) => ({ id, date, measurements: [{ dragAreaM2: 0.6 }] });

describe('measurements of a check body', () => {
  it('count unless they are struck out or of another body; capital letters make no other body', () => {
    const struck = { at: '2026-03-04T10:00:00Z', by: 'Ingrid', reason: 'Tape came off' };
    const counting = countingMeasurements(
      [
        measurement({ id: 'a' }),
        measurement({ id: 'b', checkBody: 'GREY BOX ' }),
        measurement({ id: 'c', checkBody: 'White estate' }),
        measurement({ id: 'd', struck }),
      ],
      'Grey box',
    );
    expect(counting.map(({ id }) => id)).toEqual(['a', 'b']);
  });

  it('stand in their sessions by the first day that was measured; a session without any is left out', () => {
    const sessions = chartSessions(
      [{ id: 's1' }, { id: 's2' }, { id: 's3' }],
      [
        measurement({ measuredOn: '2026-05-02' }),
        measurement({ id: 'm2', measuredOn: '2026-05-01' }),
        measurement({ id: 'm3', testSessionId: 's3', measuredOn: '2026-03-03' }),
      ],
    );
    expect(sessions.map(({ id, date }) => [id, date])).toEqual([
      ['s3', '2026-03-03'],
      ['s1', '2026-05-01'],
    ]);
  });
});

describe('the sessions that set the limits', () => {
  const sessions = ['a', 'b', 'c', 'd', 'e'].map((id, i) => session(id, `2026-0${i + 1}-01`));

  it('are all but the newest from five on, before that all', () => {
    expect([...limitsChoice(sessions, undefined).ids]).toEqual(['a', 'b', 'c', 'd']);
    expect([...limitsChoice(sessions.slice(1), undefined).ids]).toEqual(['b', 'c', 'd', 'e']);
  });

  it('are those up to the one that the address names, or all', () => {
    expect([...limitsChoice(sessions, 'c').ids]).toEqual(['a', 'b', 'c']);
    expect(limitsChoice(sessions, 'all')).toMatchObject({ value: 'all', ids: new Set('abcde') });
  });

  it('are the usual ones where the address names a session that is not there', () => {
    expect(limitsChoice(sessions, 'gone')).toEqual(limitsChoice(sessions, undefined));
    expect(limitsChoice([], 'gone')).toEqual({ value: 'all', ids: new Set() });
  });
});
