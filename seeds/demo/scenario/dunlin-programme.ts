import { REFERENCE_CONDITION } from './conditions';
import type { ScenarioProgramme } from './scenario-types';

/** A compact car, electric and petrol, with five bodies on one platform. */
export const DUNLIN: ScenarioProgramme = {
  name: 'Dunlin',
  referenceSpeedKmh: 120,
  referenceAir: { state: 'un-gtr-15' },
  referenceCondition: REFERENCE_CONDITION,
  characteristicLengthM: 4.5,
  characteristicLengthName: 'overall length, Liftback',
  commonAreaOf: 'liftback',
  confidence: 0.95,
  windSpeedMs: 3.12928,
  referenceFacility: 'halmere',
  milestones: [
    { name: 'Concept chosen', date: '2025-02-28' },
    { name: 'Proportions fixed', date: '2025-12-12' },
    { name: 'Clay freeze', date: '2027-03-14' },
    { name: 'Tooling release', date: '2027-10-01' },
    { name: 'Start of production', date: '2028-06-05' },
  ],
  remark: 'Five bodies, two powertrains. Belts and turning wheels are the reference.',
};
