import { compareConditions } from './compare-conditions';

const verdicts = (...input: Parameters<typeof compareConditions>): Record<string, string> =>
  Object.fromEntries(compareConditions(...input).map((row) => [row.item, row.verdict]));

describe('compareConditions', () => {
  it('finds what differs, what is not stated and what the programme leaves open', () => {
    expect(
      verdicts(
        { ground: 'one-belt', wheels: 'rotating', cooling: 'open' },
        { ground: 'fixed-floor', wheels: 'rotating', mirrors: 'fitted' },
        'en-GB',
      ),
    ).toMatchObject({
      ground: 'differs',
      wheels: 'same',
      cooling: 'not-stated',
      mirrors: 'not-compared',
      tyres: 'not-compared',
    });
  });

  it('takes false and 0 for stated values', () => {
    expect(
      verdicts(
        { wheelVentilationInForce: false, payloadKg: 0 },
        { wheelVentilationInForce: false, payloadKg: 0 },
        'en-GB',
      ),
    ).toMatchObject({ wheelVentilationInForce: 'same', payloadKg: 'same' });
  });

  it('writes values in words, with unit and the person’s decimal mark', () => {
    const rows = compareConditions(
      { rideHeightFrontMm: 120.5 },
      { rideHeightFrontMm: 118, ground: 'several-belts' },
      'de-DE',
    );
    expect(rows.find((row) => row.item === 'rideHeightFrontMm')).toMatchObject({
      reference: '120,5\u202fmm',
      stated: '118\u202fmm',
    });
    expect(rows.find((row) => row.item === 'ground')).toMatchObject({
      reference: 'left open',
      stated: 'several belts',
    });
  });
});
