import { conflictRows } from './conflict-rows';

interface Thing {
  readonly name: string;
  readonly mass: number;
  readonly note: string;
}
const FIELDS = [
  { label: 'Name', read: (thing: Thing) => thing.name },
  { label: 'Mass', read: (thing: Thing) => String(thing.mass) },
  { label: 'Note', read: (thing: Thing) => thing.note },
];
const before: Thing = { name: 'Hatch', mass: 1450, note: '' };

describe('two people’s edits', () => {
  it('are shown in the fields that either of them changed', () => {
    const rows = conflictRows(FIELDS, {
      before,
      mine: { ...before, mass: 1460 },
      theirs: { ...before, note: 'weighed' },
    });
    expect(rows.map(({ label, clash }) => [label, clash])).toEqual([
      ['Mass', false],
      ['Note', false],
    ]);
  });

  it('clash where both changed the same field to different values', () => {
    const rows = conflictRows(FIELDS, {
      before,
      mine: { ...before, mass: 1460 },
      theirs: { ...before, mass: 1470 },
    });
    expect(rows).toEqual([{ label: 'Mass', before: '1450', mine: '1460', theirs: '1470', clash: true }]);
  });

  it('do not clash where both wrote the same', () => {
    const same = { ...before, name: 'Liftback' };
    expect(conflictRows(FIELDS, { before, mine: same, theirs: same })[0]?.clash).toBe(false);
  });
});
