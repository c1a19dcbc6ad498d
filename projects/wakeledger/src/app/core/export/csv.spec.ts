import { csvText } from './csv';

const cell = (value: string | number | null): string => csvText([[value]]).slice(1, -2);

describe('csvText', () => {
  it('writes rows apart by CRLF behind a byte-order mark', () => {
    expect(
      csvText([
        ['name', 'C_D·A in m²'],
        ['VT-0231', 0.594],
      ]),
    ).toBe('\ufeffname,C_D·A in m²\r\nVT-0231,0.594\r\n');
  });

  it.each(['=1+1', '+1+1', '-2+3', '@SUM(A1)', '\t=1', '\r=1', '  =1', '＝1', '−1 count'])(
    'keeps %j from being run as a formula',
    (text) => {
      expect(cell(text).replace(/^"/, '').startsWith("'")).toBe(true);
    },
  );

  it('leaves numbers alone, negative ones too', () => {
    expect(cell(-0.0125)).toBe('-0.0125');
    expect(cell('-0.0125')).toBe('-0.0125');
    expect(cell(1e-9)).toBe('1e-9');
  });

  it('quotes what would break the row', () => {
    expect(cell('belt, "wide"\nlong')).toBe('"belt, ""wide""\nlong"');
    expect(cell('a;b')).toBe('"a;b"');
  });

  it('leaves a missing value empty, and a number that is none', () => {
    expect(cell(null)).toBe('');
    expect(cell(Number.NaN)).toBe('');
  });
});
