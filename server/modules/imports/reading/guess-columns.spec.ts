import { guessColumns, headingParts } from './guess-columns';

const guess = (...headers: string[]) =>
  Object.fromEntries(
    guessColumns(headers.map((header) => ({ header, holdsNumbers: true, holdsDates: true }))).map(
      ({ index, field, unit }) => [headers[index], unit === undefined ? field : `${field} ${unit}`],
    ),
  );

describe('What a column holds', () => {
  it('is guessed from headings with units in every common form', () => {
    expect(guess('F [N]', 'U (km/h)', 'A_ref / m2', 'T in °C', 'p_static [mbar]', 'rH [%]')).toEqual({
      'F [N]': 'dragForce N',
      'U (km/h)': 'speed km/h',
      'A_ref / m2': 'quotedArea m²',
      'T in °C': 'temperature °C',
      'p_static [mbar]': 'pressure mbar',
      'rH [%]': 'humidity %',
    });
  });

  it('is guessed from German headings', () => {
    expect(
      guess('Messnummer', 'Fahrzeug', 'Stirnfläche [m²]', 'cw-Wert', 'Staudruck [Pa]', 'Schiebewinkel [°]'),
    ).toEqual({
      Messnummer: 'name',
      Fahrzeug: 'variant',
      'Stirnfläche [m²]': 'quotedArea m²',
      'cw-Wert': 'dragCoefficient 1',
      'Staudruck [Pa]': 'dynamicPressure Pa',
      'Schiebewinkel [°]': 'yaw °',
    });
  });

  it('tells drag area from coefficient, and both from force', () => {
    expect(guess('Cd', 'CdA [m²]', 'Fx [kN]')).toEqual({
      Cd: 'dragCoefficient 1',
      'CdA [m²]': 'dragArea m²',
      'Fx [kN]': 'dragForce kN',
    });
  });

  it('is left open where a unit contradicts the word', () => {
    expect(guess('Speed [Pa]')).toEqual({});
  });

  it('is given once: the second of two like columns stays open', () => {
    expect(guess('Remark', 'Remark (2)')).toEqual({ Remark: 'remark' });
  });

  it('is not guessed as a number where the cells are none', () => {
    expect(guessColumns([{ header: 'U', holdsNumbers: false, holdsDates: false }])).toEqual([]);
  });

  it('has a heading of a name and a unit', () => {
    expect(headingParts('v_inf [m/s]')).toEqual({ words: 'v inf', unit: 'm/s' });
    expect(headingParts('f2 (N/(km/h)²)')).toEqual({ words: 'f2', unit: 'N/(km/h)²' });
    expect(headingParts('test date')).toEqual({ words: 'test date', unit: undefined });
  });
});
