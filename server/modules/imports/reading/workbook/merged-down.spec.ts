import { MergedDown } from './merged-down';
import type { SheetRow } from './read-sheet';

const row = (number: number, texts: Readonly<Record<number, string>>): SheetRow => ({
  row: number,
  hidden: false,
  beyond: [],
  cells: Object.entries(texts).map(([column, text]) => ({
    column: Number(column),
    text,
    kind: 'text',
    formula: false,
  })),
});
const area = (column: number, from: number, to: number, lastColumn = column) => ({
  first: { row: from, column },
  last: { row: to, column: lastColumn },
});
const texts = (merged: MergedDown, one: SheetRow) =>
  Object.fromEntries(merged.textsOf(one, ({ text }) => text));

describe('MergedDown', () => {
  it('takes the first cell’s value into every row of its area, and no further', () => {
    const merged = new MergedDown([area(0, 2, 4)]);
    expect(texts(merged, row(1, { 0: 'above', 1: 'x' }))).toEqual({ 0: 'above', 1: 'x' });
    expect(texts(merged, row(2, { 0: 'Hatch', 1: '1' }))).toEqual({ 0: 'Hatch', 1: '1' });
    expect(texts(merged, row(4, { 1: '2' }))).toEqual({ 0: 'Hatch', 1: '2' });
    expect(texts(merged, row(5, { 1: '3' }))).toEqual({ 1: '3' });
    expect(merged.taken).toBe(1);
  });

  it('takes it down the first column only: across columns a value means one of them', () => {
    const merged = new MergedDown([area(0, 2, 3, 2)]);
    texts(merged, row(2, { 0: '0.3', 3: 'x' }));
    expect(texts(merged, row(3, { 3: 'y' }))).toEqual({ 0: '0.3', 3: 'y' });
  });

  it('gives nothing where the first cell is empty or its row was left out', () => {
    const merged = new MergedDown([area(0, 2, 4), area(1, 1, 4)]);
    expect(texts(merged, row(2, { 2: 'x' }))).toEqual({ 2: 'x' });
    expect(texts(merged, row(3, { 2: 'y' }))).toEqual({ 2: 'y' });
  });

  it('follows one area after another in the same column', () => {
    const merged = new MergedDown([area(0, 4, 5), area(0, 2, 3)]);
    expect(texts(merged, row(2, { 0: 'one', 1: '1' }))[0]).toBe('one');
    expect(texts(merged, row(3, { 1: '2' }))[0]).toBe('one');
    expect(texts(merged, row(4, { 0: 'two', 1: '3' }))[0]).toBe('two');
    expect(texts(merged, row(5, { 1: '4' }))[0]).toBe('two');
  });

  it('finds the row in which headings of several rows end, and takes no column of values for one', () => {
    const merged = new MergedDown([area(0, 1, 2), area(1, 1, 900)]);
    expect(merged.headingEnd(row(1, { 0: 'Run', 1: 'all', 2: 'Drag' }))).toBe(2);
    expect(merged.headingEnd(row(3, { 0: 'Run' }))).toBe(3);
  });
});
