/** Names by id, of whatever a key can belong to; an id without a name stands for itself. */
export type KeyNames = ReadonlyMap<string, string>;

const KINDS: { readonly [kind: string]: string } = {
  repeatability: 'Repeatability of the reading',
  installation: 'Installation of the model or vehicle',
  session: 'Session in the facility',
  'facility-bias': 'Bias of the facility',
  'simulation-bias': 'Bias of the simulation set-up',
  stated: 'As stated by the source',
  'stated-area': 'Area that the source divided by',
  'frontal-area': 'Frontal area of the variant',
  'as-built-scale': 'Scale of the model as built',
  'blockage-method': 'Blockage correction of the facility',
  'yaw-ratio': 'Yaw sweep',
  'friction-share': 'Share of friction in the drag, by the policies',
  'reynolds-shape': 'How the body follows the friction line',
  'sweep-level': 'Level of the Reynolds sweep',
  sweep: 'Slope of the Reynolds sweep',
  adjustment: 'Adjustment to the reference condition',
  'correlation-level': 'Level of the correlation',
  'correlation-slope': 'Slope of the correlation',
  'correlation-scatter': 'Scatter between bodies in the correlation',
  combination: 'Scatter between the combined results that no key describes',
};

/** `correlation-scatter:<correlation>:<variant>` belongs to both. */
function ofScatter(id: string, names: KeyNames): string {
  const at = id.lastIndexOf(':');
  return [id.slice(0, at), id.slice(at + 1)].map((each) => names.get(each) ?? each).join(', ');
}

/** A key in words: `session:s4` as “Session in the facility: s4”. */
export function keyLabel(key: string, names: KeyNames = new Map()): string {
  const at = key.indexOf(':');
  const kind = at < 0 ? key : key.slice(0, at);
  const id = at < 0 ? '' : key.slice(at + 1);
  const words = KINDS[kind] ?? kind;
  if (id === '') return words;
  const named = names.get(id) ?? (kind === 'correlation-scatter' ? ofScatter(id, names) : id);
  return `${words}: ${named}`;
}
