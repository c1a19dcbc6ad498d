import fc from 'fast-check';
import { choicesOfQuery, DEFAULT_CHOICES, queryOfChoices, type RankingChoices } from './ranking-choices';

const areas = fc.oneof(
  fc.constant({ kind: 'programme' } as const),
  fc.uuid().map((variantId) => ({ kind: 'variant', variantId }) as const),
  fc
    .integer({ min: 1, max: 99999 })
    .map((thousandths) => ({ kind: 'typed', areaM2: thousandths / 1000 }) as const),
);
const airs = fc.oneof(
  fc.constant({ kind: 'programme' } as const),
  fc.constant({ kind: 'stated', air: { state: 'sae-j2263' } } as const),
  fc.integer({ min: -40, max: 60 }).map(
    (temperatureC) =>
      ({
        kind: 'stated',
        air: { state: 'custom', temperatureC, pressurePa: 98000, relativeHumidity: 0.25 },
      }) as const,
  ),
);

const choices: fc.Arbitrary<RankingChoices> = fc.record({
  order: fc.constantFrom('drag-area', 'energy'),
  area: areas,
  cycle: fc.constantFrom('wltc-class-3b', 'nedc', '1f0c9a52-6a56-4f5a-9a5c-0f8c8bcb6a11'),
  air: airs,
  evidence: fc.constantFrom('adopted', 'newest'),
  basis: fc.constantFrom('zero-yaw', 'wind-averaged'),
  configuration: fc.constantFrom(null, 'Petrol 1.5'),
  confidence: fc.constantFrom(null, 0.8, 0.999),
});

describe('choices in an address', () => {
  it('come back as they were', () => {
    fc.assert(
      fc.property(choices, (chosen) => {
        expect(choicesOfQuery(queryOfChoices(chosen))).toEqual({ choices: chosen, unreadable: [] });
      }),
    );
  });

  it('leave the address empty at their defaults', () => {
    expect(Object.values(queryOfChoices(DEFAULT_CHOICES)).every((text) => text === undefined)).toBe(true);
    expect(choicesOfQuery({})).toEqual({ choices: DEFAULT_CHOICES, unreadable: [] });
  });

  it.each([
    ['order', 'colour'],
    ['area', '0'],
    ['area', '-2.2'],
    ['area', '1e9'],
    ['area', 'variant:'],
    ['air', 'mars'],
    ['air', 'custom:20:100000'],
    ['air', 'custom:20:100000:x'],
    ['confidence', '1'],
    ['confidence', '0.4'],
    ['basis', ''],
  ] as const)('keep the default for %s=%s and name it', (name, text) => {
    expect(choicesOfQuery({ [name]: text })).toEqual({ choices: DEFAULT_CHOICES, unreadable: [name] });
  });
});
