import type { Role } from './roles';

/**
 * What a person may do, named `<thing>.<deed>`. The one map below is read by the server (which refuses) and by the
 * client (which does not offer what would be refused).
 */
export const PERMISSIONS = [
  'organisation.read',
  'members.read',
  'audit.read',
  'programmes.read',
  'programmes.edit',
  'variants.read',
  'variants.edit',
  'facilities.read',
  'facilities.edit',
  'adjustments.edit',
  'correlations.edit',
  'correlations.adopt',
  'policies.read',
  'policies.edit',
  'cycles.read',
  'cycles.edit',
  'results.read',
  'results.enter',
  'results.check',
  'results.judge',
  'results.adopt',
  'results.withdraw',
  'plans.read',
  'plans.edit',
  'proposals.read',
  'proposals.make',
  'proposals.decide',
  'imports.run',
  'ranking-inputs.read',
  'ranking-view.read',
] as const;
export type Permission = (typeof PERMISSIONS)[number];

const READER: readonly Permission[] = [
  'organisation.read',
  'programmes.read',
  'variants.read',
  'facilities.read',
  'policies.read',
  'cycles.read',
  'plans.read',
  'ranking-view.read',
];

const MANAGER: readonly Permission[] = [
  ...READER,
  'programmes.edit',
  'variants.edit',
  'cycles.edit',
  'results.read',
  'plans.edit',
  'proposals.read',
  'proposals.make',
  'ranking-inputs.read',
];

const BY_ROLE: Readonly<Record<Role, readonly Permission[]>> = {
  administrator: [...READER, 'members.read', 'audit.read'],
  'programme-manager': MANAGER,
  aerodynamicist: [
    ...MANAGER,
    'facilities.edit',
    'adjustments.edit',
    'correlations.edit',
    'correlations.adopt',
    'policies.edit',
    'results.enter',
    'results.check',
    'results.judge',
    'results.adopt',
    'results.withdraw',
    'proposals.decide',
    'imports.run',
  ],
  stylist: READER,
  viewer: READER,
  'supplier-administrator': ['organisation.read', 'members.read', 'audit.read'],
  'supplier-engineer': ['organisation.read'],
};

export function permissionsOf(role: Role): readonly Permission[] {
  return BY_ROLE[role];
}

export function may(role: Role, permission: Permission): boolean {
  return BY_ROLE[role].includes(permission);
}
