import { aRanking } from '../testing/ranking-builders';
import { limitsUsed } from './policy-words';
import { traceOfFigure } from './trace-of-figure';

describe('the limits that a result was judged by', () => {
  it.each([
    ['v3', ['judged by the limits of policy version 3']],
    ['v0', ['judged by the limits that the product comes with']],
    ['house rules', ['judged by the limits of “house rules”']],
    [undefined, []],
  ])('are said of %s', (policyId, words) => {
    expect(limitsUsed(policyId)).toEqual(words);
  });

  it('stand in the derivation of every figure, beside its Reynolds and Mach number', () => {
    const input = aRanking();
    const policies = { ...input.programme.policies, policyId: 'v3' };
    const trace = traceOfFigure({ ...input, programme: { ...input.programme, policies } }, 'r-a', 'zero-yaw');
    const flow = trace.steps.find(({ methodId }) => methodId === 'flow-similarity');
    expect(flow?.assumed).toContain('judged by the limits of policy version 3');
  });
});
