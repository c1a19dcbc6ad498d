import { scatterFromAddress, scatterToAddress } from './scatter-address';

describe('a session scatter in the address', () => {
  it('arrives as it left, whatever the comment holds', () => {
    const scatter = {
      uRelative: 0.00213,
      degreesOfFreedom: 4.2,
      comment: 'From 6 sessions ~ of the grey box',
    };
    expect(scatterFromAddress(scatterToAddress(scatter))).toEqual(scatter);
  });

  it.each([
    undefined,
    '',
    'x~4~words',
    '-0.1~4~words',
    '0.002~0~words',
    '1.2~4~words',
    '0.002~Infinity~words',
    '0.002~4~ ',
  ])('is none where it reads %j', (text) => {
    expect(scatterFromAddress(text)).toBeUndefined();
  });
});
