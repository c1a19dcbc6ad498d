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
};

/** A key in words: `session:s4` as “Session in the facility: s4”. */
export function keyLabel(key: string, names: KeyNames = new Map()): string {
  const at = key.indexOf(':');
  const kind = at < 0 ? key : key.slice(0, at);
  const id = at < 0 ? '' : key.slice(at + 1);
  const words = KINDS[kind] ?? kind;
  return id === '' ? words : `${words}: ${names.get(id) ?? id}`;
}
