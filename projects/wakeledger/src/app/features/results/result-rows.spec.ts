import { TestBed } from '@angular/core/testing';
import type { Result } from '#shared/contracts/results';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { DEFAULT_LIMITS, type CheckLimits } from '#shared/core/checks/limits';
import { facilityFields, resultFields } from '#shared/testing/domain-fields';
import { reducedEvidence } from '../../data/results/reduced-evidence';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { resultsCsv } from './result-export';
import { resultRows, type ResultRow } from './result-rows';

const ids = { variantId: 'hatch', facilityId: 'halmere' };
const result = (id: string, change: Partial<Result> = {}): Result =>
  ({
    ...resultFields(ids),
    id,
    name: id,
    programmeId: 'dunlin',
    entrySequence: 1,
    enteredAt: '2026-09-15T08:00:00Z',
    enteredBy: 'Ingrid Falk',
    adopted: false,
    state: 'entered',
    ...change,
  }) as Result;

const RESULTS: readonly Result[] = [
  result('good', { testDate: '2026-09-14', adopted: true, state: 'adopted' }),
  result('fast', { testDate: '2026-09-15', speedKmh: 260 }),
  result('floor', { testDate: '2026-09-16', condition: { ground: 'fixed-floor', wheels: 'rotating' } }),
  result('broken', { testDate: '2026-09-17', points: [{ yawDeg: 3, value: 0.28 }] }),
  result('gone', {
    testDate: '2026-09-18',
    withdrawn: { at: '2026-09-19T08:00:00Z', by: 'Ingrid Falk', reason: 'wrong tyres' },
  }),
  result('retired', { testDate: '2026-09-19', variantId: 'old' }),
];

function rowsOf(
  results: readonly Result[],
  limits: CheckLimits | null = DEFAULT_LIMITS,
): ReadonlyMap<string, ResultRow> {
  const inputs = {
    programme: {
      referenceSpeedKmh: 120,
      referenceAir: { state: 'un-gtr-15' },
      characteristicLengthM: 4.5,
      commonAreaM2: 2.19,
      referenceCondition: { ground: 'several-belts', wheels: 'rotating' },
      policies: { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 },
    },
    facilities: [{ ...facilityFields(), id: 'halmere' }],
    variants: [{ id: 'hatch', frontalAreaM2: 2.17, frontalAreaUM2: 0.006 }],
    results: results.filter(({ withdrawn, variantId }) => !withdrawn && variantId === 'hatch'),
  } as RankingInput;
  const rows = resultRows(
    results,
    reducedEvidence(inputs),
    { variant: (id) => id, facility: () => 'Halmere', bodyShape: () => 'hatch' },
    { format: TestBed.inject(QuantityFormat), locale: 'en-GB' },
    { unchecked: undefined, limits: limits ?? undefined },
  );
  return new Map(rows.map((row) => [row.id, row]));
}

describe('the rows of the results', () => {
  it('stand newest test first', () => {
    expect([...rowsOf(RESULTS).keys()]).toEqual(['retired', 'gone', 'broken', 'floor', 'fast', 'good']);
  });

  it('give each result its check in words', () => {
    const rows = rowsOf(RESULTS);
    expect(rows.get('good')?.check).toMatchObject({ state: 'comparable', reasons: [] });
    expect(rows.get('fast')?.check).toMatchObject({
      state: 'caution',
      reasons: ['Mach 0.21 is over 0.20: the air begins to be compressed, and the drag with it.'],
    });
    expect(rows.get('floor')?.check).toMatchObject({
      state: 'excluded',
      reasons: [
        'Not comparable with the reference condition: ground fixed floor, not several belts. It stays out of the ranking.',
      ],
    });
    expect(rows.get('broken')?.check.state).toBe('excluded');
    expect(rows.get('broken')?.check.reasons[0]).toContain('no point at zero yaw');
    expect(rows.get('gone')?.check).toEqual({
      state: 'withdrawn',
      checks: [],
      reasons: ['Withdrawn: wrong tyres'],
    });
    expect(rows.get('retired')?.check.state).toBe('unknown');
  });

  it('are not checked before the organisation’s limits have come', () => {
    const rows = rowsOf([result('good')], null);
    expect(rows.get('good')?.check).toMatchObject({ state: 'unknown', checks: [] });
  });

  it('show a figure for what is excluded, and none for what is withdrawn or refused', () => {
    const rows = rowsOf(RESULTS);
    expect(rows.get('floor')?.dragAreaM2).toBeCloseTo((0.2712 / 1.01) * 2.19, 12);
    expect(rows.get('gone')?.dragAreaM2).toBeNull();
    expect(rows.get('broken')?.dragAreaM2).toBeNull();
  });

  it('count angles once however often they were read, and average repeats at zero yaw', () => {
    const sweep = result('sweep', {
      points: [
        { yawDeg: 0, value: 0.27 },
        { yawDeg: 0, value: 0.28 },
        { yawDeg: 5, value: 0.29 },
      ],
    });
    const row = rowsOf([sweep]).get('sweep');
    expect(row?.angles).toBe(2);
    expect(row?.value).toBeCloseTo(0.275, 12);
  });

  it('leave as a file with plain numbers and no formula', () => {
    const rows = rowsOf([result('=cmd', { testDate: '2026-09-14' })]);
    const [, line = ''] = resultsCsv([...rows.values()]).split('\r\n');
    expect(line.startsWith("'=cmd,hatch,Halmere,2026-09-14,Drag coefficient,0.2712,,1,140,1,0.588")).toBe(
      true,
    );
  });
});
