import { DEFAULT_POLICIES } from '../constants';
import type { RankingInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';

function notAvailable(section: number, words: string): never {
  return refuse(
    'not-available',
    `section ${section}`,
    `${words} (section ${section} of the method) is not available yet.`,
  );
}

function checkFriction({ programme, results }: RankingInput): void {
  const policies = programme.policies;
  const line = policies?.frictionLine ?? DEFAULT_POLICIES.frictionLine;
  const share = policies?.frictionShare ?? DEFAULT_POLICIES.frictionShare;
  const shareU = policies?.frictionShareU ?? DEFAULT_POLICIES.frictionShareU;
  if (results.length > 0 && (line === 'on' || share !== 0 || shareU !== 0)) {
    notAvailable(6, 'The friction line: set frictionLine off, frictionShare 0 and frictionShareU 0');
  }
}

/**
 * Stops an input that asks for a part of the method that is not built, by name, rather than passing it over.
 *
 * @throws {Refused} not-available (sections 6, 8 and 10)
 */
export function checkAvailability(input: RankingInput): void {
  if ((input.sweeps ?? []).length > 0) notAvailable(6, 'A Reynolds sweep');
  if (input.results.some((result) => (result.reynoldsMethod ?? 'friction-line') !== 'friction-line')) {
    notAvailable(6, 'A result’s own or another’s Reynolds sweep');
  }
  checkFriction(input);
  if ((input.adjustments ?? []).length > 0) notAvailable(8, 'An adjustment to the reference condition');
  if ((input.correlations ?? []).length > 0) notAvailable(8, 'A correlation between facilities');
  if (input.results.some((result) => result.includedWithReason != null)) {
    notAvailable(8, 'Including a result that is not comparable, with a reason');
  }
  if (input.variants.some((variant) => variant.evidence === 'weighted-mean')) {
    notAvailable(10, 'The weighted mean of several results');
  }
}
