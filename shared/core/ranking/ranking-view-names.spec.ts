import { fiveVariants } from '../../testing/ranking-scenario';
import { namesIn, viewContribution } from './ranking-view-names';

const bias = { key: 'facility-bias:belt', amountM2: 0.003, degreesOfFreedom: null, shareOfVariance: 1 };

describe('what a budget’s lines are called', () => {
  const ofVersion = (number: number): string => {
    const { inputs, context } = fiveVariants();
    const names = namesIn(inputs, { ...context, facilityVersions: [{ facilityId: 'belt', number }] });
    return viewContribution(names, bias).of;
  };

  it('is the facility, with the version of its corrections once there is more than one', () => {
    expect(ofVersion(1)).toBe('Halmere belt tunnel');
    expect(ofVersion(3)).toBe('Halmere belt tunnel, version 3');
  });
});
