import * as z from 'zod';
import { id, notNegative, positive } from './common';

export const CORRELATION_REPLACES = ['blockage', 'reynolds', 'ground-simulation'] as const;

/** Two results of one geometry, reduced before the correlation, as they were when the version was made. */
export const correlationPair = z.strictObject({
  resultId: id,
  referenceResultId: id,
  dragAreaM2: positive,
  uM2: notNegative,
  referenceDragAreaM2: positive,
  referenceUM2: notNegative,
});
export type CorrelationPair = z.infer<typeof correlationPair>;
