import { sessionReadings, sessionScatter } from './session-scatter';

const sessionsOf = (groups: readonly (readonly number[])[]) =>
  groups.map((values) => sessionReadings(values.map((dragAreaM2) => ({ dragAreaM2 }))));

describe('the scatter of sessions', () => {
  it('agrees with the certified analysis of variance of NIST StRD, SiRstv (data from memory; both tables certified)', () => {
    const scatter = sessionScatter(
      sessionsOf([
        [196.3052, 196.124, 196.189, 196.2569, 196.3403],
        [196.3042, 196.3825, 196.1669, 196.3257, 196.0422],
        [196.1303, 196.2005, 196.2889, 196.0343, 196.1811],
        [196.2795, 196.1748, 196.1494, 196.1485, 195.9885],
        [196.2119, 196.1051, 196.185, 196.0052, 196.209],
      ]),
    );
    expect(scatter.meanSquareBetween * 4).toBeCloseTo(5.11462616e-2, 9);
    expect((scatter.meanSquareWithin ?? 0) * 20).toBeCloseTo(2.1663656e-1, 9);
    expect(scatter.meanSquareBetween / (scatter.meanSquareWithin ?? 0)).toBeCloseTo(1.18046237440255, 8);
    expect(scatter.withinDegreesOfFreedom).toBe(20);
  });

  it('agrees with the table printed in the NIST e-Handbook, 7.4.3.3 (memory; the sums of squares are recomputed)', () => {
    const scatter = sessionScatter(
      sessionsOf([
        [6.9, 5.4, 5.8, 4.6, 4.0],
        [8.3, 6.8, 7.8, 9.2, 6.5],
        [8.0, 10.5, 8.1, 6.9, 9.3],
      ]),
    );
    expect(scatter.meanSquareBetween * 2).toBeCloseTo(27.897, 3);
    expect((scatter.meanSquareWithin ?? 0) * 12).toBeCloseTo(17.452, 3);
    expect(scatter.meanSquareBetween / (scatter.meanSquareWithin ?? 0)).toBeCloseTo(9.59, 2);
  });

  it('gives the variance components printed for five batches in the NIST e-Handbook, 7.4.4 (memory)', () => {
    const scatter = sessionScatter(
      sessionsOf([
        [74, 76, 75],
        [68, 71, 72],
        [75, 77, 77],
        [72, 74, 73],
        [79, 81, 79],
      ]),
    );
    expect(scatter.betweenM2 ** 2).toBeCloseTo(11.71, 2);
    expect((scatter.withinM2 ?? 0) ** 2).toBeCloseTo(1.8, 2);
    expect(scatter.centreM2).toBeCloseTo(74.8667, 4);
  });

  it('gives the components of Davies’ dyestuff yields that lme4 prints: 1764.05 and 2451.25', () => {
    const scatter = sessionScatter(
      sessionsOf([
        [1545, 1440, 1440, 1520, 1580],
        [1540, 1555, 1490, 1560, 1495],
        [1595, 1550, 1605, 1510, 1560],
        [1445, 1440, 1595, 1465, 1545],
        [1595, 1630, 1515, 1635, 1625],
        [1520, 1455, 1450, 1480, 1445],
      ]),
    );
    expect(scatter.betweenM2 ** 2).toBeCloseTo(1764.05, 8);
    expect((scatter.withinM2 ?? 0) ** 2).toBeCloseTo(2451.25, 8);
    expect(scatter.centreM2).toBeCloseTo(1527.5, 10);
    // Satterthwaite by hand: (11271.5 − 2451.25)²/(11271.5²/5 + 2451.25²/24)
    expect(scatter.betweenDegreesOfFreedom).toBeCloseTo(3.0318672600207743, 10);
  });

  it('is the same from means with s and n as from their single readings', () => {
    const single = sessionsOf([
      [0.601, 0.603, 0.602],
      [0.606, 0.604],
      [0.599, 0.6, 0.598, 0.601],
    ]);
    const summed = [
      { dragAreaM2: 0.602, s: 0.001, n: 3 },
      { dragAreaM2: 0.605, s: Math.SQRT2 * 0.001, n: 2 },
      { dragAreaM2: 0.5995, s: Math.sqrt((2 * (0.0005 ** 2 + 0.0015 ** 2)) / 3), n: 4 },
    ].map((measurement) => sessionReadings([measurement]));
    const [a, b] = [sessionScatter(single), sessionScatter(summed)];
    for (const name of ['centreM2', 'withinM2', 'betweenM2', 'betweenDegreesOfFreedom'] as const) {
      expect(b[name]).toBeCloseTo(a[name] ?? NaN, 9);
    }
  });

  it('is none, with no degrees of freedom, where the readings within scatter more than the sessions', () => {
    const scatter = sessionScatter(
      sessionsOf([
        [0.6, 0.61],
        [0.601, 0.609],
        [0.604, 0.606],
      ]),
    );
    expect(scatter).toMatchObject({ betweenM2: 0, betweenDegreesOfFreedom: 0 });
  });

  it('holds the scatter within, too, where that is not known, with one degree less than sessions', () => {
    const scatter = sessionScatter(sessionsOf([[0.6], [0.602], [0.604]]));
    expect(scatter.withinM2).toBeNull();
    expect(scatter.betweenM2).toBeCloseTo(0.002, 12);
    expect(scatter.betweenDegreesOfFreedom).toBeCloseTo(2, 12);
  });
});
