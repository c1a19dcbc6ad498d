import { normalQuantile } from './normal-quantile';
import { uniformNumbers } from './sfc32';

describe('The normal quantile (AS 241)', () => {
  it.each([
    [0.25, -0.6744897501960817],
    [0.001, -3.090232306167814],
    [1e-20, -9.262340089798408],
  ])('at %d is %d, as Wichura printed it (Appl. Stat. 37 (1988) 477)', (p, z) => {
    expect(Math.abs(normalQuantile(p) / z - 1)).toBeLessThan(1e-15);
  });

  it('is antisymmetrical', () => {
    for (const p of [0.01, 0.2, 0.49]) expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 13);
  });
});

/** sfc32 once more, in whole numbers of any length instead of 32-bit operators. */
function* reference(seed: bigint): Generator<number> {
  const word = 2n ** 32n;
  let [a, b, c, d] = [0n, seed, 0n, 1n];
  for (;;) {
    const t = (a + b + d) % word;
    d = (d + 1n) % word;
    a = b ^ (b >> 9n);
    b = (c + ((c << 3n) % word)) % word;
    c = ((((c << 21n) % word) | (c >> 11n)) + t) % word;
    yield Number(t);
  }
}

describe('The generator', () => {
  it.each([1, 2222, 0, 4294967295])('seeded with %d gives sfc32 from its thirteenth output on', (seed) => {
    const expected = reference(BigInt(seed));
    for (let i = 0; i < 12; i++) expected.next();
    const next = uniformNumbers(seed);
    for (let i = 0; i < 200; i++) expect(next()).toBe((Number(expected.next().value) + 0.5) / 2 ** 32);
  });
});
