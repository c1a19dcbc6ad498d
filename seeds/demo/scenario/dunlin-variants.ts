import type { VariantFields } from '#shared/contracts/variants';
import { PETROL, electric } from './powertrains';

/**
 * Sport has the smallest frontal area: on its own area its coefficient ranks behind Tourer’s, although it drags less.
 * It also stands on wide tyres, so that by energy it falls behind Tourer.
 */
export const DUNLIN_VARIANTS: Readonly<Record<string, VariantFields>> = {
  liftback: {
    name: 'Dunlin Liftback',
    bodyShape: 'liftback',
    description: 'five-door fastback',
    lengthMm: 4500,
    widthMm: 1815,
    heightMm: 1425,
    wheelbaseMm: 2700,
    aliases: ['D5L', 'Liftback'],
    frontalAreas: [
      { areaM2: 2.19, uM2: 0.005, method: 'laser', date: '2026-05-11' },
      { areaM2: 2.196, uM2: 0.01, method: 'projected-image', date: '2025-10-20' },
      { areaM2: 2.205, uM2: 0.02, method: 'cad', date: '2024-03-04' },
    ],
    configurations: [
      { name: 'Electric', massKg: 1690, rollingResistance: 0.0082, electric: electric(60), salesShare: 0.6 },
      { name: 'Petrol', massKg: 1405, rollingResistance: 0.0086, combustion: PETROL, salesShare: 0.4 },
    ],
  },
  hatch: {
    name: 'Dunlin Hatch',
    bodyShape: 'hatch',
    description: 'five-door hatch',
    lengthMm: 4330,
    widthMm: 1815,
    heightMm: 1440,
    wheelbaseMm: 2700,
    aliases: ['D5H', 'Hatch'],
    frontalAreas: [
      { areaM2: 2.168, uM2: 0.005, method: 'laser', date: '2026-05-12' },
      { areaM2: 2.185, uM2: 0.02, method: 'cad', date: '2024-03-04' },
    ],
    configurations: [
      { name: 'Electric', massKg: 1655, rollingResistance: 0.0084, electric: electric(60), salesShare: 0.45 },
      {
        name: 'Petrol',
        massKg: 1370,
        rollingResistance: 0.0088,
        // From the coastdown of the petrol prototype, as the road load of type approval is.
        roadLoadReference: {
          f0N: 118.4,
          f1NPerKmh: 0.21,
          f2NPerKmh2: 0.0283,
          massKg: 1385,
          dragAreaM2: 0.617,
          airDensityKgM3: 1.189,
        },
        combustion: PETROL,
        salesShare: 0.55,
      },
    ],
  },
  sport: {
    name: 'Dunlin Sport',
    bodyShape: 'coupe',
    description: 'three-door, low',
    lengthMm: 4310,
    widthMm: 1805,
    heightMm: 1375,
    wheelbaseMm: 2620,
    aliases: ['D3S', 'Sport'],
    frontalAreas: [
      {
        areaM2: 2.086,
        uM2: 0.008,
        method: 'projected-image',
        date: '2026-07-30',
        remark: '40 % model, scaled up',
      },
      { areaM2: 2.07, uM2: 0.02, method: 'cad', date: '2024-03-04' },
    ],
    configurations: [
      { name: 'Electric', massKg: 1680, rollingResistance: 0.0102, electric: electric(58), salesShare: 0.7 },
      { name: 'Petrol', massKg: 1385, rollingResistance: 0.0104, combustion: PETROL, salesShare: 0.3 },
    ],
  },
  tourer: {
    name: 'Dunlin Tourer',
    bodyShape: 'estate',
    description: 'estate',
    lengthMm: 4595,
    widthMm: 1815,
    heightMm: 1460,
    wheelbaseMm: 2700,
    aliases: ['D5T', 'Tourer'],
    frontalAreas: [
      { areaM2: 2.214, uM2: 0.005, method: 'laser', date: '2026-05-13' },
      { areaM2: 2.23, uM2: 0.02, method: 'cad', date: '2024-03-04' },
    ],
    configurations: [
      { name: 'Electric', massKg: 1725, rollingResistance: 0.0079, electric: electric(60), salesShare: 0.5 },
      { name: 'Petrol', massKg: 1440, rollingResistance: 0.0086, combustion: PETROL, salesShare: 0.5 },
    ],
  },
  crossback: {
    name: 'Dunlin Crossback',
    bodyShape: 'crossover',
    description: 'tall, five-door',
    lengthMm: 4420,
    widthMm: 1840,
    heightMm: 1580,
    wheelbaseMm: 2700,
    aliases: ['D5X', 'Crossback'],
    frontalAreas: [
      { areaM2: 2.459, uM2: 0.012, method: 'projected-image', date: '2026-06-24' },
      { areaM2: 2.48, uM2: 0.025, method: 'cad', date: '2024-04-02' },
    ],
    configurations: [
      { name: 'Electric', massKg: 1790, rollingResistance: 0.0088, electric: electric(60), salesShare: 0.55 },
      { name: 'Petrol', massKg: 1500, rollingResistance: 0.0092, combustion: PETROL, salesShare: 0.45 },
    ],
  },
};
