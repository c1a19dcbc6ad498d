import * as z from 'zod';
import '../zod-setup';

/**
 * Air as it is given to the method: a named state, or temperature, pressure and humidity. Which state it is and whether
 * the rest is there and in range is the method's to say, because that may refuse one result only.
 */
export const airInputSchema = z.strictObject({
  state: z
    .string()
    .nullish()
    .describe('iso-2533-sea-level, un-gtr-15, sae-j2263, cfr-1066-as-printed or custom (as when absent)'),
  temperatureC: z.number().nullish().describe('−40 to 60 °C'),
  pressurePa: z.number().nullish().describe('Static, 30 000 to 1 000 000 Pa'),
  relativeHumidity: z.number().nullish().describe('Fraction, 0 to 1'),
});
