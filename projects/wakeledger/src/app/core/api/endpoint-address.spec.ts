import { endpointAddress } from './endpoint-address';

describe('the address of an operation', () => {
  it('takes its parameters, escaped', () => {
    expect(endpointAddress({ path: '/api/v1/cycles/:cycleKey' }, { cycleKey: 'a/b c' }, {})).toBe(
      '/api/v1/cycles/a%2Fb%20c',
    );
  });

  it('takes the query fields that are given', () => {
    expect(endpointAddress({ path: '/x' }, {}, { order: 'energy', area: undefined, tags: ['a', 'b'] })).toBe(
      '/x?order=energy&tags=a&tags=b',
    );
  });

  it('refuses to be formed without a parameter, which would name something else', () => {
    expect(() => endpointAddress({ path: '/x/:id' }, { id: '' }, {})).toThrow('lacks id');
  });
});
