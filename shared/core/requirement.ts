import { refuse } from './refusal';

/** @throws {Refused} not-positive unless the number is above 0 */
export function positive(value: number, where: string): void {
  if (!(value > 0)) refuse('not-positive', where, `${where} must be above 0, not ${value}.`);
}
