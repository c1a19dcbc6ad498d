import type { PolicyValues } from '#shared/contracts/policies';
import { limitIssues, type LimitRule } from '#shared/core/checks/limit-issues';
import type { Issue } from '../../rules/issue';

const DETAILS: Readonly<Record<LimitRule, string>> = {
  'above-zero': 'This limit is a number above 0.',
  fraction: 'This limit is a fraction, 0 to 1.',
  'caution-above-excluded':
    'The caution would begin only where results are excluded already. Choose a value up to the limit of exclusion.',
  'from-not-below-to': 'The range ends at or below where it begins. Choose an end above its beginning.',
  twice: 'This body shape has a range already. Each has one.',
  'not-a-number': 'A number is needed here.',
};

/** What is wrong with the limits beyond the form of each, field by field. */
export function policyIssues(values: PolicyValues): readonly Issue[] {
  return limitIssues(values).map(({ where, rule }) => ({
    where: `values.${where}`,
    detail: DETAILS[rule],
    reason: rule,
  }));
}
