import { filledOrAbsent, withoutBlanks } from './without-blanks';

describe('withoutBlanks', () => {
  it('drops what is empty and keeps 0 and false', () => {
    expect(withoutBlanks({ a: null, b: '', c: '  ', d: 0, e: false, f: ' belt ', g: undefined })).toEqual({
      d: 0,
      e: false,
      f: 'belt',
    });
  });

  it('answers absent where nothing stands', () => {
    expect(filledOrAbsent({ a: null, b: '' })).toBeUndefined();
    expect(filledOrAbsent({ a: 0 })).toEqual({ a: 0 });
  });
});
