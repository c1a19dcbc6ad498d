import fc from 'fast-check';
import { type Refused } from '../refusal';
import { dragAreaOfF2, f2OfDragArea, roadLoadOf, type RoadLoadReference } from './road-load';

const REFERENCE: RoadLoadReference = {
  f0N: 118.4,
  f1NPerKmh: 0.512,
  f2NPerKmh2: 0.02871,
  massKg: 1430,
  dragAreaM2: 0.598,
  airDensityKgM3: 1.189,
};

describe('f2 and drag area', () => {
  test('C_D·A 0.65 m² in 1.189 kg/m³ makes f2 0.029 816 744 N/(km/h)² (computed: ρ·C_D·A/(2·3.6²))', () => {
    expect(Math.abs(f2OfDragArea(0.65, 1.189) / 0.029816744 - 1)).toBeLessThanOrEqual(1e-7);
  });

  test('f2 0.03 N/(km/h)² in 1.189 kg/m³ stands for at most 0.653 995 m² (computed, the inverse)', () => {
    expect(Math.abs(dragAreaOfF2(0.03, 1.189) / 0.653995 - 1)).toBeLessThanOrEqual(1e-6);
  });

  test('One is the inverse of the other', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 2, noNaN: true }),
        fc.double({ min: 0.9, max: 1.4, noNaN: true }),
        (area, density) => {
          expect(dragAreaOfF2(f2OfDragArea(area, density), density) / area).toBeCloseTo(1, 13);
        },
      ),
    );
  });
});

// UN GTR No. 15, Annex 4, paragraph 4.5.5.1 (memory of the form, figures computed): f2 goes with (T/293)·(100 kPa/p), T = t + 273.
describe('A measured f2 moved to the reference air of UN GTR No. 15', () => {
  test.each([
    [10, 98, 0.0295675, 0.985582],
    [30, 102, 0.0304156, 1.013853],
  ])('From %i °C and %i kPa, 0.03 becomes %f N/(km/h)², K2 %f', (celsius, kilopascals, f2, k2) => {
    const measuredDensity = (1.189 * (kilopascals / 100) * 293) / (celsius + 273);
    const moved = f2OfDragArea(dragAreaOfF2(0.03, measuredDensity), 1.189);
    expect(Math.abs(moved / f2 - 1)).toBeLessThanOrEqual(1e-5);
    expect(Math.abs(moved / 0.03 / k2 - 1)).toBeLessThanOrEqual(1e-5);
  });
});

describe('roadLoadOf', () => {
  test('Without a measured road load f0 is m·g·C_rr and f1 is 0', () => {
    const load = roadLoadOf({ massKg: 1780, rollingResistance: 0.0083 }, 0.64, 1.189);
    expect(load.f0N).toBeCloseTo(1780 * 9.80665 * 0.0083, 10);
    expect(load.f1NPerKmh).toBe(0);
    expect(load.f2NPerKmh2).toBe(f2OfDragArea(0.64, 1.189));
  });

  test('At the reference itself the measured road load comes back unchanged', () => {
    const { f0N, f1NPerKmh, f2NPerKmh2 } = REFERENCE;
    const vehicle = { massKg: 1430, roadLoadReference: REFERENCE };
    expect(roadLoadOf(vehicle, 0.598, 1.189)).toEqual({ f0N, f1NPerKmh, f2NPerKmh2 });
    expect(roadLoadOf({ ...vehicle, rollingResistance: 0.009 }, 0.598, 1.189)).toEqual({
      f0N,
      f1NPerKmh,
      f2NPerKmh2,
    });
  });

  test('Another mass moves f0 by Δm·g·C_rr where C_rr is known, and in proportion to the mass where it is not', () => {
    const vehicle = { massKg: 1500, roadLoadReference: REFERENCE };
    expect(roadLoadOf(vehicle, 0.598, 1.189).f0N).toBeCloseTo((118.4 * 1500) / 1430, 12);
    expect(roadLoadOf({ ...vehicle, rollingResistance: 0.009 }, 0.598, 1.189).f0N).toBeCloseTo(
      118.4 + 70 * 9.80665 * 0.009,
      12,
    );
  });

  test('The measured f2 keeps what is not drag area: another area and density move it by the difference alone', () => {
    const load = roadLoadOf({ massKg: 1430, roadLoadReference: REFERENCE }, 0.65, 1.1671);
    const excess = REFERENCE.f2NPerKmh2 - f2OfDragArea(0.598, 1.189);
    expect(load.f2NPerKmh2 - f2OfDragArea(0.65, 1.1671)).toBeCloseTo(excess, 15);
  });

  test('Null stands for absent', () => {
    const vehicle = { massKg: 1500, rollingResistance: null, roadLoadReference: REFERENCE };
    expect(roadLoadOf(vehicle, 0.6, 1.189)).toEqual(
      roadLoadOf({ massKg: 1500, roadLoadReference: REFERENCE }, 0.6, 1.189),
    );
  });

  test('A rolling resistance of 0 is a figure, not a gap', () => {
    expect(roadLoadOf({ massKg: 1500, rollingResistance: 0 }, 0.6, 1.189).f0N).toBe(0);
  });

  test('With neither of both there is no road load', () => {
    expect(() => roadLoadOf({ massKg: 1500, roadLoadReference: null }, 0.6, 1.189)).toThrow(
      expect.objectContaining({ code: 'missing-input', where: 'rollingResistance' }) as Refused,
    );
  });
});
