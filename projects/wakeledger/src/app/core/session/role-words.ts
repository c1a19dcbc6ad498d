import type { Role } from '#shared/access/roles';

/** A role as a person would say it. */
export function roleWords(role: Role): string {
  const words: Readonly<Record<Role, string>> = {
    administrator: $localize`administration`,
    'programme-manager': $localize`programme management`,
    aerodynamicist: $localize`aerodynamics`,
    stylist: $localize`styling`,
    viewer: $localize`reading along`,
    'supplier-administrator': $localize`administration`,
    'supplier-engineer': $localize`engineering`,
  };
  return words[role];
}
