import { readCycleCsv } from './cycle-csv.policy';

const rowsOf = (csv: string) => {
  const reading = readCycleCsv(csv);
  if (!reading.readable) throw new Error(JSON.stringify(reading.issues));
  return reading.columns.time.map((time, i) => [time, reading.columns.speed[i]]);
};
const issuesOf = (csv: string) => {
  const reading = readCycleCsv(csv);
  return reading.readable ? [] : reading.issues;
};

describe('a speed trace as CSV', () => {
  it.each([
    ['commas and points', 'time,speed\n0,0\n1,5.5\n'],
    ['semicolons and decimal commas', 'Zeit;Geschwindigkeit\r\n0;0\r\n1;5,5\r\n'],
    ['tabs, no header', '0\t0\n1\t5.5'],
    ['a byte-order mark and blank lines', '\uFEFF"t in s";"v"\n\n0;0\n\n1;5,5\n;\n'],
    ['a separator at the end of each line', 't;v;\n0;0;\n1;5,5;\n'],
  ])('is read with %s', (_words, csv) => {
    expect(rowsOf(csv)).toEqual([
      [0, 0],
      [1, 5.5],
    ]);
  });

  it('names the line and the column of a cell that is no number, and what would be accepted', () => {
    expect(issuesOf('t;v\n0;0\n1;fast\n2;')).toEqual([
      { where: 'csv line 3, speed', detail: expect.stringMatching(/“fast” is not a number.*expected/) },
      { where: 'csv line 4, speed', detail: 'The cell is empty. A number is expected.' },
    ]);
  });

  it('names the line in which time does not rise or speed is below 0', () => {
    expect(issuesOf('0,0\n2,10\n1,20\n3,-4').map((issue) => issue.where)).toEqual([
      'csv line 3, time',
      'csv line 4, speed',
    ]);
  });

  it('says what to do where a decimal comma cannot be told from the separator', () => {
    expect(issuesOf('0,0,0\n1,0,5')[0]?.detail).toContain('put a semicolon between');
  });

  it('refuses a first line with a number in one column as a faulty row, not as a header', () => {
    expect(issuesOf('0;x\n1;5')).toHaveLength(1);
  });

  it('refuses a text without rows, and one with an open quotation mark', () => {
    expect(issuesOf('time;speed\n')[0]?.detail).toContain('There is no row');
    expect(issuesOf('"0;1\n2;3')[0]?.detail).toContain('not CSV');
  });

  it('does not answer with more faults than a person can read', () => {
    const issues = issuesOf(`t;v\n${'a;b\n'.repeat(400)}`);
    expect(issues).toHaveLength(51);
    expect(issues.at(-1)?.detail).toBe('And 750 more of this kind.');
  });
});
