import { simulateProgrammes, type CoverageTally } from '#shared/core/testing/simulated-programmes';
import type { BenchLine, BenchPart } from './bench-part';

const PROGRAMMES = 1000;
const SEED = 20310501;
/** Scatter of single results that no key describes [m²], beside keys of about 0.005 m². */
const UNKEYED_M2 = [0.004, 0.008, 0.02] as const;

const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;

const separations = ({ wrong, claimed, pairs }: CoverageTally): string =>
  `${percent(wrong / claimed)} of ${claimed} claimed separations wrong (of ${pairs} pairs)`;

function keyed(evidence: 'newest' | 'weighted-mean', words: string): BenchLine {
  const tally = simulateProgrammes(PROGRAMMES, { evidence, unkeyedM2: 0 }, SEED);
  const coverage = tally.covered / tally.figures;
  return {
    what: `${PROGRAMMES} programmes, all scatter in keys, ${words}`,
    measured: `U covers ${percent(coverage)} of ${tally.figures} true drag areas, ${separations(tally)}`,
    goal: {
      words: '93 to 97 %, at most 6 % wrong',
      met: coverage >= 0.93 && coverage <= 0.97 && tally.wrong / tally.claimed <= 0.06,
    },
  };
}

function unkeyed(unkeyedM2: number): BenchLine {
  const tally = simulateProgrammes(PROGRAMMES, { evidence: 'weighted-mean', unkeyedM2 }, SEED);
  return {
    what: `${PROGRAMMES} programmes, ${unkeyedM2} m² of scatter in each result that no key describes, weighted mean of three`,
    measured:
      `U covers ${percent(tally.covered / tally.figures)}, Birge’s ratio above 1 in ` +
      `${percent(tally.widened / tally.figures)}, ${separations(tally)}`,
  };
}

/** Whether U holds what it says: programmes of known truth, measured with drawn errors and judged by the product. */
export const coverage: BenchPart = {
  name: 'coverage',
  run: () =>
    Promise.resolve([
      keyed('newest', 'newest result'),
      keyed('weighted-mean', 'weighted mean of three'),
      ...UNKEYED_M2.map(unkeyed),
    ]),
};
