import type { Check, CheckName, CheckVerdict } from '#shared/core/checks/check';
import { airSentence } from './air-sentences';
import { bodySentence } from './body-sentences';
import type { CheckLanguage } from './check-figures';
import { conditionSentence } from './condition-sentence';
import { flowSentence } from './flow-sentences';
import { readingSentence } from './reading-sentences';

const NAMES: Readonly<Record<CheckName, string>> = {
  refused: $localize`Usable input`,
  condition: $localize`Test condition`,
  mach: $localize`Mach number`,
  blockage: $localize`Blockage`,
  reynolds: $localize`Reynolds number`,
  transition: $localize`Transition`,
  'drag-coefficient': $localize`Drag coefficient`,
  'frontal-area': $localize`Frontal area`,
  'quoted-area': $localize`Quoted area`,
  repeatability: $localize`Repeatability`,
  'yaw-coverage': $localize`Yaw coverage`,
  'yaw-pairs': $localize`Left and right`,
  'hall-temperature': $localize`Air temperature`,
  'hall-pressure': $localize`Air pressure`,
  'air-formula': $localize`Air density`,
  'front-lift': $localize`Lift, front`,
  'rear-lift': $localize`Lift, rear`,
};

/** A verdict never speaks by colour alone: a word and a shape go with it. */
export const VERDICT_WORDS: Readonly<Record<CheckVerdict, string>> = {
  passes: $localize`passes`,
  caution: $localize`caution`,
  excluded: $localize`excluded`,
};
export const VERDICT_SHAPES: Readonly<Record<CheckVerdict, string>> = {
  passes: '●',
  caution: '▲',
  excluded: '■',
};
export const VERDICT_INKS: Readonly<Record<CheckVerdict, string>> = {
  passes: 'wl-moss',
  caution: 'wl-ochre',
  excluded: 'wl-rust',
};

export function checkName(name: CheckName): string {
  return NAMES[name];
}

/** One sentence that somebody understands who has never been in a wind tunnel. */
export function checkSentence(check: Check, language: CheckLanguage): string {
  switch (check.check) {
    case 'refused':
    case 'hall-temperature':
    case 'hall-pressure':
    case 'air-formula':
      return airSentence(check, language);
    case 'condition':
      return conditionSentence(check, language);
    case 'mach':
    case 'blockage':
    case 'reynolds':
    case 'transition':
      return flowSentence(check, language);
    case 'drag-coefficient':
    case 'frontal-area':
    case 'quoted-area':
    case 'front-lift':
    case 'rear-lift':
      return bodySentence(check, language);
    case 'repeatability':
    case 'yaw-coverage':
    case 'yaw-pairs':
      return readingSentence(check, language);
  }
}
