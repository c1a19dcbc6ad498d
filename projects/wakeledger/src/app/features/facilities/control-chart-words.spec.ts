import { controlChart, type ChartSession } from '#shared/core/uncertainty/control-chart';
import { markOf, verdictOf } from './control-chart-words';

const sessionsWith = (means: readonly number[]): ChartSession[] =>
  means.map((dragAreaM2, i) => ({
    id: `s${i + 1}`,
    date: `2026-01-${String(i + 1).padStart(2, '0')}`,
    measurements: [{ dragAreaM2 }],
  }));
const nameOf = (id: string): string => `Session ${id}`;
const STEADY = [0.6, 0.604, 0.598, 0.602, 0.596, 0.6];

describe('what a control chart says', () => {
  it('is that limits need three sessions while there are fewer', () => {
    const chart = controlChart(sessionsWith([0.6, 0.61]));
    expect(verdictOf(chart, nameOf)).toMatchObject({ kind: 'too-few' });
    expect(markOf(chart.points[0]!)).toMatchObject({ shape: '○' });
  });

  it('is steady where no session stands out', () => {
    expect(verdictOf(controlChart(sessionsWith(STEADY)), nameOf)).toMatchObject({
      kind: 'steady',
      lines: [],
    });
  });

  it('is a warning that names the session beyond the warning limit', () => {
    const setting = new Set(['s1', 's2', 's3', 's4', 's5', 's6']);
    const verdict = verdictOf(controlChart(sessionsWith([...STEADY, 0.607]), setting), nameOf);
    expect(verdict.kind).toBe('warning');
    expect(verdict.lines).toEqual(['Session s7 is beyond the warning limit.']);
  });

  it('is drift that names each session with its sign', () => {
    const setting = new Set(['s1', 's2', 's3', 's4', 's5', 's6']);
    const chart = controlChart(sessionsWith([...STEADY, 0.62]), setting);
    expect(verdictOf(chart, nameOf)).toMatchObject({
      kind: 'drift',
      lines: ['Session s7 is beyond the action limit.'],
    });
    expect(markOf(chart.points[6]!)).toEqual({
      shape: '◆',
      words: 'beyond the action limit',
      ink: 'wl-rust',
    });
  });
});
