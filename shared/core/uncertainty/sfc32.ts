import { GENERATOR_WARM_UP } from '../constants';

const TWO_TO_32 = 4294967296;

/**
 * Uniform numbers in 0 < u < 1, (n + ½)/2³², from the generator sfc32 (Doty-Humphrey, PractRand): state (0, seed, 0, 1), twelve
 * outputs dropped. The same seed gives the same numbers on every machine.
 */
export function uniformNumbers(seed: number): () => number {
  let a = 0;
  let b = seed | 0;
  let c = 0;
  let d = 1;
  const next = (): number => {
    const t = (((a + b) | 0) + d) | 0;
    d = (d + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (((c << 21) | (c >>> 11)) + t) | 0;
    return ((t >>> 0) + 0.5) / TWO_TO_32;
  };
  for (let i = 0; i < GENERATOR_WARM_UP; i++) next();
  return next;
}
