/**
 * The one row that INSERT or UPDATE … RETURNING must give back. None means that row-level security hid it or that it
 * was not locked beforehand: a fault of ours, not an expected failure.
 */
export function present<Row>(row: Row | undefined): Row {
  if (row === undefined) throw new Error('The statement returned no row.');
  return row;
}
