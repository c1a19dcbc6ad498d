/** The named reference states of air; `custom` (or no state at all) means moist air by CIPM-2007. */
export const AIR_STATES = [
  'iso-2533-sea-level',
  'un-gtr-15',
  'sae-j2263',
  'cfr-1066-as-printed',
  'custom',
] as const;
export type AirState = (typeof AIR_STATES)[number];

/**
 * Air as it is given: a named reference state, or temperature [°C], static pressure [Pa] and relative humidity
 * [fraction]. The state is open text here, because an unknown one refuses a single result, not the whole input.
 */
export interface AirInput {
  readonly state?: string | null | undefined;
  readonly temperatureC?: number | null | undefined;
  readonly pressurePa?: number | null | undefined;
  readonly relativeHumidity?: number | null | undefined;
}
