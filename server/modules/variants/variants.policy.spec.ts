import type { VariantFields } from '#shared/contracts/variants';
import { variantIssues, type VariantSurroundings } from './variants.policy';

const CONFIGURATION = '3f0f7c86-9a4e-4c5f-9f0b-3a6f3c0f8a03';
const surroundings: VariantSurroundings = {
  latestPastDay: '2026-12-01',
  takenNames: new Map([
    ['dunlin hatch', 'Dunlin Hatch'],
    ['d5h', 'Dunlin Hatch'],
  ]),
  configurationIds: new Set([CONFIGURATION]),
  pictureFound: true,
};
const fields: VariantFields = {
  name: 'Dunlin Sport',
  bodyShape: 'coupe',
  lengthMm: 4310,
  wheelbaseMm: 2620,
  aliases: ['D3S'],
  frontalAreas: [
    { areaM2: 2.09, uM2: 0.006, method: 'projected-image', date: '2026-08-20' },
    { areaM2: 2.1, uM2: 0.02, method: 'cad', date: '2025-11-02' },
  ],
  configurations: [
    { name: 'Electric', massKg: 1640, rollingResistance: 0.0085, salesShare: 0.6 },
    { name: 'Petrol', massKg: 1410, rollingResistance: 0.009, salesShare: 0.4 },
  ],
};
const issuesOf = (change: Partial<VariantFields>, around: Partial<VariantSurroundings> = {}) =>
  variantIssues({ ...fields, ...change }, { ...surroundings, ...around });
const wheresOf = (...args: Parameters<typeof issuesOf>) => issuesOf(...args).map((issue) => issue.where);

const [electric, petrol] = fields.configurations as [
  VariantFields['configurations'][number],
  VariantFields['configurations'][number],
];

describe('a variant', () => {
  it('passes as it is usually entered', () => {
    expect(issuesOf({})).toEqual([]);
  });

  it('is refused an alias that stands twice, repeats its name or means another variant', () => {
    expect(wheresOf({ aliases: ['D3S', 'd3s ', 'DUNLIN SPORT', 'D5H'] })).toEqual([
      'aliases.1',
      'aliases.2',
      'aliases.3',
    ]);
    expect(issuesOf({ aliases: ['D5H'] })[0]?.detail).toContain('Dunlin Hatch');
  });

  it('is refused a wheelbase that is longer than the car', () => {
    expect(wheresOf({ wheelbaseMm: 4310 })).toEqual(['wheelbaseMm']);
    expect(wheresOf({ wheelbaseMm: 4310, lengthMm: undefined })).toEqual([]);
  });

  it('is refused a frontal area of tomorrow, two of one day, and one less certain than itself', () => {
    const [newest] = fields.frontalAreas as [VariantFields['frontalAreas'][number]];
    expect(wheresOf({ frontalAreas: [{ ...newest, date: '2026-12-02' }] })).toEqual(['frontalAreas.0.date']);
    expect(wheresOf({ frontalAreas: [newest, { ...newest, areaM2: 2.2 }] })).toEqual(['frontalAreas.1.date']);
    expect(wheresOf({ frontalAreas: [{ ...newest, areaM2: 0.5, uM2: 0.6 }] })).toEqual([
      'frontalAreas.0.uM2',
    ]);
  });

  it('needs rolling resistance or a measured road load in each configuration', () => {
    const without = { ...electric, rollingResistance: undefined };
    const reference = {
      f0N: 130,
      f1NPerKmh: 0.4,
      f2NPerKmh2: 0.026,
      massKg: 1600,
      dragAreaM2: 0.6,
      airDensityKgM3: 1.189,
    };
    expect(wheresOf({ configurations: [without, petrol] })).toEqual(['configurations.0.rollingResistance']);
    expect(wheresOf({ configurations: [{ ...without, roadLoadReference: reference }, petrol] })).toEqual([]);
    expect(
      wheresOf({
        configurations: [{ ...without, roadLoadReference: { ...reference, f2NPerKmh2: 0 } }, petrol],
      }),
    ).toEqual(['configurations.0.roadLoadReference.f2NPerKmh2']);
  });

  it('needs sales shares that sum to 1, or none at all', () => {
    const shares = (a: number, b: number) => ({
      configurations: [
        { ...electric, salesShare: a },
        { ...petrol, salesShare: b },
      ],
    });
    expect(issuesOf(shares(0.6, 0.3))).toEqual([
      { where: 'configurations', detail: expect.stringContaining('sum to 0.9.'), reason: 'shares-not-one' },
    ]);
    expect(issuesOf(shares(0, 0))).toEqual([]);
    expect(issuesOf(shares(0.6, 0.4 + 1e-9))).toEqual([]);
    expect(issuesOf(shares(0.6, 0.40001))).toHaveLength(1);
  });

  it('is refused two configurations of one name, and ids that are not its own or stand twice', () => {
    expect(wheresOf({ configurations: [electric, { ...petrol, name: 'electric' }] })).toEqual([
      'configurations.1.name',
    ]);
    expect(
      wheresOf({
        configurations: [
          { ...electric, id: CONFIGURATION },
          { ...petrol, id: CONFIGURATION },
        ],
      }),
    ).toEqual(['configurations.1.id']);
    expect(
      wheresOf(
        { configurations: [{ ...electric, id: CONFIGURATION }, petrol] },
        { configurationIds: new Set() },
      ),
    ).toEqual(['configurations.0.id']);
  });

  it('is refused a picture that is not there', () => {
    expect(wheresOf({}, { pictureFound: false })).toEqual(['pictureAttachmentId']);
  });
});
