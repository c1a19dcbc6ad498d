import { AIR_STATES, COOLINGS, GROUNDS, MIRRORS, WHEELS } from '#shared/contracts/condition';
import type { Reading } from '../reading/numbers';

/** Words in files, English and German, that mean a word of the contract. Normalised as `normalised` does. */
const MEANINGS: Readonly<Record<string, readonly string[]>> = {
  'fixed-floor': [
    'fixed floor',
    'fixed',
    'stationary floor',
    'static floor',
    'fester boden',
    'fest',
    'feststehend',
  ],
  'boundary-layer-control': [
    'boundary layer control',
    'blc',
    'suction',
    'boundary layer suction',
    'absaugung',
    'grenzschichtabsaugung',
  ],
  'one-belt': ['one belt', '1 belt', 'single belt', 'moving belt', 'belt', 'ein band', '1 band', 'laufband'],
  'several-belts': [
    'several belts',
    '5 belt',
    '5 belts',
    'five belt',
    'five belts',
    '3 belt',
    '3 belts',
    'three belts',
    'multi belt',
    '5 band',
    'fuenf baender',
    'mehrere baender',
  ],
  'simulated-moving-ground': ['simulated moving ground', 'moving ground', 'moving wall', 'bewegter boden'],
  road: ['road', 'track', 'strasse', 'fahrbahn'],
  stationary: ['stationary', 'not rotating', 'fixed', 'static', 'stehend', 'nicht drehend', 'still'],
  rotating: ['rotating', 'spinning', 'mrf', 'sliding mesh', 'drehend', 'rotierend'],
  open: ['open', 'offen', 'auf'],
  closed: ['closed', 'sealed', 'blanked', 'taped', 'geschlossen', 'zu', 'abgeklebt'],
  'mock-up': ['mock up', 'mockup', 'attrappe'],
  fitted: ['fitted', 'with', 'on', 'yes', 'mit', 'montiert', 'ja'],
  removed: ['removed', 'without', 'off', 'no', 'ohne', 'demontiert', 'nein'],
  model: ['model', 'model scale', 'at model scale', 'modell', 'modellmassstab'],
  full: [
    'full',
    'full scale',
    'full size',
    'at full scale',
    'original',
    'grossausfuehrung',
    'fahrzeug',
    '1 1',
  ],
  'iso-2533-sea-level': [
    'iso 2533 sea level',
    'iso 2533',
    'isa',
    'isa sea level',
    'standard atmosphere',
    'normatmosphaere',
  ],
  'un-gtr-15': ['un gtr 15', 'gtr 15', 'gtr15', 'wltp', 'un gtr no 15'],
  'sae-j2263': ['sae j2263', 'j2263'],
  'cfr-1066-as-printed': ['cfr 1066 as printed', 'cfr 1066', '40 cfr 1066', 'epa 1066'],
};

const YES = ['yes', 'y', 'true', '1', 'x', 'ja', 'j', 'wahr'];
const NO = ['no', 'n', 'false', '0', 'nein', 'falsch'];

function normalised(text: string): string {
  return text
    .trim()
    .toLowerCase()
    .replace(/ä/g, 'ae')
    .replace(/ö/g, 'oe')
    .replace(/ü/g, 'ue')
    .replace(/ß/g, 'ss')
    .replace(/[^a-z0-9]+/g, ' ')
    .trim();
}

function listed(words: readonly string[]): string {
  return words.map((word) => `“${word}”`).join(', ');
}

/** One of the contract's words, written as such or by a synonym. */
export function readWord(text: string, words: readonly string[]): Reading<string> {
  const written = normalised(text);
  const found =
    words.find((word) => normalised(word) === written) ??
    words.find((word) => (MEANINGS[word] ?? []).includes(written));
  return found === undefined
    ? { problem: `“${text}” is not known here. Accepted are ${listed(words)}.` }
    : { value: found };
}

export const readAirState = (text: string): Reading<string> => readWord(text, AIR_STATES);

export function readYesNo(text: string): Reading<boolean> {
  const written = normalised(text);
  if (YES.includes(written)) return { value: true };
  if (NO.includes(written)) return { value: false };
  return { problem: `“${text}” is neither yes nor no. Write yes or no.` };
}

/** Every word that a file may have to say, for the test that none of them means two things in one field. */
export const WORD_FIELDS = {
  ground: GROUNDS,
  wheels: WHEELS,
  cooling: COOLINGS,
  mirrors: MIRRORS,
  air: AIR_STATES,
};
export const MEANINGS_OF_WORDS = MEANINGS;
