/** An organisation is a vehicle maker or a supplier of parts; each kind has its own roles. */
export const ORGANISATION_KINDS = ['maker', 'supplier'] as const;
export type OrganisationKind = (typeof ORGANISATION_KINDS)[number];

export const MAKER_ROLES = [
  'administrator',
  'programme-manager',
  'aerodynamicist',
  'stylist',
  'viewer',
] as const;
export const SUPPLIER_ROLES = ['supplier-administrator', 'supplier-engineer'] as const;

export type MakerRole = (typeof MAKER_ROLES)[number];
export type SupplierRole = (typeof SUPPLIER_ROLES)[number];
export type Role = MakerRole | SupplierRole;

export const ROLES: readonly Role[] = [...MAKER_ROLES, ...SUPPLIER_ROLES];

/** The roles that may exist in an organisation of this kind; the database holds the same rule as a constraint. */
export function rolesOfKind(kind: OrganisationKind): readonly Role[] {
  return kind === 'maker' ? MAKER_ROLES : SUPPLIER_ROLES;
}
