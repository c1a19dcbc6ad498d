import { simulateProgrammes } from '../testing/simulated-programmes';

/** Does U hold what it says, and do claimed separations, where the truth is known? */
const PROGRAMMES = 1000;

describe('Over 1 000 programmes whose scatter is all in keys', () => {
  it.each(['newest', 'weighted-mean'] as const)(
    'U covers the truth in 93 to 97 %%, and at most 6 %% of claimed separations are wrong: %s',
    (evidence) => {
      const tally = simulateProgrammes(PROGRAMMES, { evidence, unkeyedM2: 0 }, 1);
      const coverage = tally.covered / tally.figures;
      expect(coverage).toBeGreaterThan(0.93);
      expect(coverage).toBeLessThan(0.97);
      expect(tally.claimed).toBeGreaterThan(PROGRAMMES);
      expect(tally.wrong / tally.claimed).toBeLessThan(0.06);
    },
  );
});

describe('Over 300 programmes with scatter that no key describes', () => {
  it('the widened mean covers about 90 %, and says in most that such scatter was found', () => {
    const tally = simulateProgrammes(300, { evidence: 'weighted-mean', unkeyedM2: 0.02 }, 2);
    const coverage = tally.covered / tally.figures;
    expect(coverage).toBeGreaterThan(0.86);
    expect(coverage).toBeLessThan(0.94);
    expect(tally.widened / tally.figures).toBeGreaterThan(0.8);
  });

  it('the newest result alone cannot know of it: its U covers far less', () => {
    const tally = simulateProgrammes(300, { evidence: 'newest', unkeyedM2: 0.02 }, 2);
    expect(tally.covered / tally.figures).toBeLessThan(0.7);
  });
});
