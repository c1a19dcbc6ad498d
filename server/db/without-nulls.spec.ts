import { withNulls, withoutNulls } from './without-nulls';

describe('the border between rows and contracts', () => {
  it('turns NULL into an absent property and keeps 0, false and the empty text', () => {
    expect(withoutNulls({ a: null, b: 0, c: false, d: '' })).toEqual({ b: 0, c: false, d: '' });
  });

  it('turns an absent property into NULL, for the named columns only', () => {
    const fields: { a?: number; b: string; c: boolean } = { b: 'x', c: true };
    expect(withNulls(fields, ['a', 'b'])).toEqual({ a: null, b: 'x' });
  });
});
