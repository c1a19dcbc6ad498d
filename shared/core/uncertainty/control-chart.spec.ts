import { controlChart, withinReach, type ChartSession } from './control-chart';

/** One session a month, its readings around the given mean by ±0.001 m². */
const sessionsWith = (means: readonly number[]): ChartSession[] =>
  means.map((mean, i) => ({
    id: `s${i + 1}`,
    date: `2026-${String(i + 1).padStart(2, '0')}-10`,
    measurements: [{ dragAreaM2: mean - 0.001 }, { dragAreaM2: mean + 0.001 }],
  }));
const first = (count: number): ReadonlySet<string> =>
  new Set(Array.from({ length: count }, (_each, i) => `s${i + 1}`));
const signsOf = (means: readonly number[], setting?: ReadonlySet<string>) =>
  controlChart(sessionsWith(means), setting).points.map(({ limits }) => limits?.signs);

const STEADY = [0.6, 0.604, 0.598, 0.602, 0.596, 0.6];

describe('the control chart of a check body', () => {
  it('has its centre line at the mean of the session means and limits at two and three deviations', () => {
    const chart = controlChart(sessionsWith(STEADY));
    expect(chart.scatter?.centreM2).toBeCloseTo(0.6, 12);
    // Balanced: s_between² + s_within²/n is the variance of the session means, 4·10⁻⁵/5 = 8·10⁻⁶.
    const [, second] = chart.points;
    expect(second?.limits?.deviationM2).toBeCloseTo(Math.sqrt(8e-6), 12);
    expect(second?.limits?.distance).toBeCloseTo(0.004 / Math.sqrt(8e-6), 9);
    expect(chart.points.every(({ limits }) => limits?.place === 'within')).toBe(true);
    expect(signsOf(STEADY).flat()).toEqual([]);
  });

  it('reads sessions by date, whatever their order, and leaves out those without a measurement', () => {
    const [a, b, c, d] = sessionsWith([0.6, 0.601, 0.602, 0.603]);
    const empty: ChartSession = { id: 'e', date: '2026-02-01', measurements: [] };
    const chart = controlChart([d!, empty, b!, a!, c!]);
    expect(chart.points.map(({ sessionId }) => sessionId)).toEqual(['s1', 's2', 's3', 's4']);
  });

  it('sets no limits from fewer than three sessions, but shows them', () => {
    const chart = controlChart(sessionsWith([0.6, 0.7]));
    expect(chart).toMatchObject({ settingSessions: 2 });
    expect(chart.scatter).toBeUndefined();
    expect(chart.points.map(({ limits }) => limits)).toEqual([undefined, undefined]);
    expect(controlChart([])).toEqual({ points: [], settingSessions: 0 });
  });

  it('warns of a session beyond the action limit that the others set', () => {
    const signs = signsOf([...STEADY, 0.612], first(6));
    expect(signs.at(-1)).toEqual(['beyond-action-limit']);
    expect(signs.slice(0, -1).flat()).toEqual([]);
  });

  it('cannot see such a session among six that set the limits themselves, and knows it', () => {
    expect(signsOf([...STEADY.slice(1), 0.9]).flat()).toEqual([]);
    expect([10, 11].map(withinReach)).toEqual([false, true]);
  });

  it('warns of the second of three sessions beyond one warning limit, not of one on each side', () => {
    const above = 0.6 + 2.5 * Math.sqrt(8e-6);
    const below = 0.6 - 2.5 * Math.sqrt(8e-6);
    expect(signsOf([...STEADY, above, 0.6, above], first(6)).slice(6)).toEqual([
      [],
      [],
      ['two-of-three-beyond-warning-limit'],
    ]);
    expect(signsOf([...STEADY, above, 0.6, below], first(6)).slice(6)).toEqual([[], [], []]);
    expect(
      signsOf([...STEADY, above, 0.6, 0.599, above], first(6))
        .slice(6)
        .flat(),
    ).toEqual([]);
  });

  it('warns of the seventh in a row on one side, not of the sixth', () => {
    const seven = [0.602, 0.601, 0.602, 0.601, 0.602, 0.601, 0.602];
    const signs = signsOf([0.604, 0.596, 0.598, ...seven], first(3));
    expect(signs.slice(3, 9).flat()).toEqual([]);
    expect(signs.at(-1)).toEqual(['seven-on-one-side']);
  });

  it('warns of seven rising or falling sessions, and not of six', () => {
    const rising = [0.594, 0.596, 0.598, 0.6, 0.602, 0.604, 0.606];
    expect(signsOf(rising).at(-1)).toEqual(['seven-rising']);
    expect(signsOf(rising.slice(1)).flat()).toEqual([]);
    expect(signsOf([...rising].reverse()).at(-1)).toEqual(['seven-falling']);
    expect(signsOf([0.594, 0.596, 0.596, 0.598, 0.6, 0.602, 0.604]).flat()).toEqual([]);
  });

  it('holds a session of many readings closer than one of few', () => {
    const sessions = sessionsWith(STEADY).map((session, i) =>
      i === 0 ? { ...session, measurements: [{ dragAreaM2: 0.6, n: 50, s: 0.001 }] } : session,
    );
    const [many, few] = controlChart(sessions).points;
    expect(many?.limits?.deviationM2).toBeLessThan(few?.limits?.deviationM2 ?? 0);
  });

  it('puts any difference beyond the limits where nothing scatters, and none on the centre line', () => {
    const flat = [0.6, 0.6, 0.6].map((dragAreaM2, i) => ({
      id: `s${i + 1}`,
      date: `2026-01-0${i + 1}`,
      measurements: [{ dragAreaM2 }],
    }));
    const other = { id: 's4', date: '2026-01-04', measurements: [{ dragAreaM2: 0.601 }] };
    const chart = controlChart([...flat, other], first(3));
    expect(chart.points.map(({ limits }) => limits?.place)).toEqual([
      'within',
      'within',
      'within',
      'beyond-action',
    ]);
  });
});
