import type { ResultFields, ResultPoint } from '#shared/contracts/results';
import { resultIssues, type ResultSurroundings } from './results.policy';

const surroundings: ResultSurroundings = {
  latestPastDay: '2026-12-01',
  facility: { kind: 'open-jet', areaM2: 24, name: 'Halmere' },
  frontalAreaM2: 2.19,
};
const fields: ResultFields = {
  variantId: '3f0f7c86-9a4e-4c5f-9f0b-3a6f3c0f8a01',
  facilityId: '3f0f7c86-9a4e-4c5f-9f0b-3a6f3c0f8a02',
  name: 'H-0412',
  testDate: '2026-09-14',
  quantity: 'coefficient',
  scale: 1,
  quotedAreaM2: 2.19,
  quotedAreaScale: 'full',
  speedKmh: 140,
  air: { temperatureC: 22, pressurePa: 99_100, relativeHumidity: 0.4 },
  condition: { ground: 'several-belts', wheels: 'rotating' },
  points: [{ yawDeg: 0, value: 0.25, s: 0.001, n: 3 }],
};
const force: Partial<ResultFields> = {
  quantity: 'force',
  quotedAreaM2: undefined,
  quotedAreaScale: undefined,
  tareAlreadySubtracted: true,
  points: [{ yawDeg: 0, value: 480 }],
};
const point = (change: Partial<ResultPoint>): ResultPoint => ({ yawDeg: 0, value: 0.25, ...change });
const issuesOf = (change: Partial<ResultFields>, around: Partial<ResultSurroundings> = {}) =>
  resultIssues({ ...fields, ...change }, { ...surroundings, ...around });
const wheresOf = (...args: Parameters<typeof issuesOf>) => issuesOf(...args).map((issue) => issue.where);

describe('a result', () => {
  it('passes as a coefficient, a force, a drag area and a coastdown', () => {
    expect(issuesOf({})).toEqual([]);
    expect(issuesOf(force)).toEqual([]);
    expect(issuesOf({ quantity: 'drag-area', quotedAreaM2: undefined, quotedAreaScale: undefined })).toEqual(
      [],
    );
    expect(
      issuesOf(
        {
          quantity: 'coastdown-f2',
          quotedAreaM2: undefined,
          quotedAreaScale: undefined,
          air: { state: 'un-gtr-15' },
          condition: { ground: 'road', wheels: 'rotating' },
          points: [{ yawDeg: 0, value: 0.0257 }],
        },
        { facility: { kind: 'road', name: 'Scarmoor' } },
      ),
    ).toEqual([]);
  });

  it('of tomorrow or of another century is refused', () => {
    expect(wheresOf({ testDate: '2026-12-02' })).toEqual(['testDate']);
    expect(wheresOf({ testDate: '0026-09-14' })).toEqual(['testDate']);
    expect(wheresOf({ testDate: '2026-12-01' })).toEqual([]);
  });

  it('as a coefficient needs the area that it was formed with, and which area that is', () => {
    expect(wheresOf({ quotedAreaM2: undefined, quotedAreaScale: undefined })).toEqual([
      'quotedAreaM2',
      'quotedAreaScale',
    ]);
    expect(wheresOf({ ...force, quotedAreaM2: 2.19 })).toEqual(['quotedAreaScale']);
    expect(wheresOf({ ...force, quotedAreaUM2: 0.01 })).toEqual(['quotedAreaUM2']);
  });

  it('as a force says whether the tare is subtracted, and states it where it is not', () => {
    expect(wheresOf({ ...force, tareAlreadySubtracted: undefined })).toEqual(['tareAlreadySubtracted']);
    expect(wheresOf({ ...force, tareAlreadySubtracted: false })).toEqual(['points.0.tareN']);
    expect(wheresOf({ ...force, tareAlreadySubtracted: false, tareN: 31 })).toEqual([]);
    expect(
      wheresOf({
        ...force,
        tareAlreadySubtracted: false,
        points: [point({ value: 480, tareN: 31 }), point({ yawDeg: 5, value: 500 })],
      }),
    ).toEqual(['points.1.tareN']);
    expect(wheresOf({ ...force, tareN: 31 })).toEqual(['tareN']);
  });

  it('as anything else has no tare', () => {
    expect(wheresOf({ tareN: 31 })).toEqual(['tareN']);
    expect(wheresOf({ points: [point({ tareN: 3 })] })).toEqual(['tareN']);
  });

  it('needs drag above 0, after the tare too', () => {
    expect(issuesOf({ points: [point({ value: -0.25 })] })).toEqual([
      { where: 'points.0.value', detail: expect.stringContaining('sign'), reason: 'drag-not-positive' },
    ]);
    expect(
      issuesOf({ ...force, tareAlreadySubtracted: false, tareN: 480, points: [point({ value: 480 })] })[0]
        ?.detail,
    ).toContain('Less its tare this force is 0 N');
  });

  it('needs air, and a speed or dynamic pressure for every reading', () => {
    expect(wheresOf({ air: undefined, speedKmh: undefined })).toEqual(['air', 'points.0.speedKmh']);
    expect(wheresOf({ speedKmh: undefined, dynamicPressurePa: 900 })).toEqual([]);
    expect(wheresOf({ speedKmh: undefined, points: [point({ speedKmh: 140 })] })).toEqual([]);
    expect(wheresOf({ air: { pressurePa: 99_100, temperatureC: 22 } })).toEqual(['air.relativeHumidity']);
  });

  it('refuses a standard deviation of one reading', () => {
    for (const n of [undefined, 1]) {
      expect(issuesOf({ points: [point({ s: 0.001, n })] })).toEqual([
        expect.objectContaining({ where: 'points.0.n', reason: 'repeatability-needs-two' }),
      ]);
    }
  });

  it('needs a reading at zero yaw; repeats of an angle are welcome', () => {
    expect(issuesOf({ points: [point({ yawDeg: 5 })] })[0]?.reason).toBe('yaw-no-zero');
    expect(issuesOf({ points: [point({}), point({}), point({ yawDeg: 5 }), point({ yawDeg: 5 })] })).toEqual(
      [],
    );
  });

  it('takes zero-yaw readings at several speeds for a Reynolds sweep, with four of them that reach to 1.5 times', () => {
    const sweep = (...speeds: readonly number[]) =>
      issuesOf({ points: speeds.map((speedKmh) => point({ speedKmh })) }).map(({ reason }) => reason);
    expect(sweep(100, 120, 140, 150)).toEqual([]);
    expect(sweep(100, 150)).toEqual(['sweep-too-few-points']);
    expect(sweep(100, 110, 120, 149)).toEqual(['sweep-too-narrow']);
    expect(sweep(100, 101)).toEqual(['sweep-too-few-points', 'sweep-too-narrow']);
    expect(sweep(140, 140, 140, 140)).toEqual([]);
    expect(issuesOf({ points: [point({}), point({ yawDeg: 5, speedKmh: 100 })] })).toEqual([]);
  });

  it('compares the speeds of a sweep by dynamic pressure where that is all it states', () => {
    const sweep = (...pressures: readonly number[]) =>
      issuesOf({
        speedKmh: undefined,
        points: pressures.map((dynamicPressurePa) => point({ dynamicPressurePa })),
      }).map(({ reason }) => reason);
    expect(sweep(400, 600, 800, 900)).toEqual([]);
    expect(sweep(400, 600, 800, 890)).toEqual(['sweep-too-narrow']);
  });

  it('as a coastdown is full size, on a road, and without lift', () => {
    const coastdown: Partial<ResultFields> = {
      quantity: 'coastdown-f2',
      quotedAreaM2: undefined,
      quotedAreaScale: undefined,
      condition: {},
      points: [point({ value: 0.0257, frontLift: 0.01 })],
    };
    expect(wheresOf({ ...coastdown, scale: 0.4 })).toEqual(['facilityId', 'scale', 'points.0']);
  });

  it('stands on a ground that exists where it was tested', () => {
    expect(wheresOf({ condition: { ground: 'road' } })).toEqual(['condition.ground']);
    expect(wheresOf({ condition: { ground: 'fixed-floor', beltSpeedRatio: 1 } })).toEqual([
      'condition.beltSpeedRatio',
    ]);
  });

  it('does not fill the test section', () => {
    expect(issuesOf({}, { facility: { kind: 'closed', areaM2: 2, name: 'Small' } })).toEqual([
      expect.objectContaining({ where: 'scale', reason: 'model-larger-than-section' }),
    ]);
    expect(issuesOf({ scale: 0.4 }, { facility: { kind: 'closed', areaM2: 2, name: 'Small' } })).toEqual([]);
  });
});
