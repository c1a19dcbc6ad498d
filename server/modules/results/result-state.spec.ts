import { stateOf, type StateFacts } from './result-state';

const NOTHING: StateFacts = {
  withdrawn: false,
  checked: false,
  adopted: false,
  wasAdopted: false,
  othersAdopted: false,
};

describe('where a result stands', () => {
  it.each([
    ['entered', {}],
    ['checked', { checked: true }],
    ['adopted', { checked: true, adopted: true, wasAdopted: true }],
    ['superseded', { checked: true, wasAdopted: true, othersAdopted: true }],
    ['withdrawn', { checked: true, wasAdopted: true, othersAdopted: true, withdrawn: true }],
  ] as const)('is %s by what was done with it', (state, facts) => {
    expect(stateOf({ ...NOTHING, ...facts })).toBe(state);
  });

  it('is checked again once the adoption is released and nothing else is adopted', () => {
    expect(stateOf({ ...NOTHING, checked: true, wasAdopted: true })).toBe('checked');
  });

  it('is not superseded where its variant rests on others and never rested on it', () => {
    expect(stateOf({ ...NOTHING, checked: true, othersAdopted: true })).toBe('checked');
  });
});
