import { Refused } from '../refusal';

/** Computes when first asked and keeps the answer; a refusal is kept too and thrown to everyone who asks. */
export function once<T>(compute: () => T): () => T {
  let answer: { readonly value: T } | { readonly refused: Refused } | null = null;
  return () => {
    if (answer === null) {
      try {
        answer = { value: compute() };
      } catch (error) {
        if (!(error instanceof Refused)) throw error;
        answer = { refused: error };
      }
    }
    if ('refused' in answer) throw answer.refused;
    return answer.value;
  };
}
