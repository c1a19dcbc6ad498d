import type { OrganisationKind, Role } from '#shared/access/roles';

export interface DemoOrganisation {
  readonly id: string;
  readonly kind: OrganisationKind;
  readonly name: string;
  readonly slug: string;
}

export interface DemoPerson {
  readonly id: string;
  readonly displayName: string;
  readonly email: string;
  /** What this person is there to do, shown beside "continue as". */
  readonly task: string;
  readonly places: readonly { readonly organisation: DemoOrganisation; readonly role: Role }[];
}

// Fixed ids, so that a scenario can refer to them. Everybody and everything here is invented.
export const ALDERMERE: DemoOrganisation = {
  id: '0a1d0000-0000-4000-8000-000000000001',
  kind: 'maker',
  name: 'Aldermere Motors',
  slug: 'aldermere',
};
/** A second maker, there to show that tenants cannot see each other. */
export const VELTHORPE: DemoOrganisation = {
  id: '0a1d0000-0000-4000-8000-000000000002',
  kind: 'maker',
  name: 'Velthorpe Coachworks',
  slug: 'velthorpe',
};
export const CORVANE: DemoOrganisation = {
  id: '0a1d0000-0000-4000-8000-000000000003',
  kind: 'supplier',
  name: 'Corvane Optics',
  slug: 'corvane',
};

export const FENWICK: DemoOrganisation = {
  id: '0a1d0000-0000-4000-8000-000000000004',
  kind: 'supplier',
  name: 'Fenwick & Rye Wheels',
  slug: 'fenwick',
};
export const STOWMARCH: DemoOrganisation = {
  id: '0a1d0000-0000-4000-8000-000000000005',
  kind: 'supplier',
  name: 'Stowmarch Plastics',
  slug: 'stowmarch',
};

export const DEMO_ORGANISATIONS: readonly DemoOrganisation[] = [
  ALDERMERE,
  VELTHORPE,
  CORVANE,
  FENWICK,
  STOWMARCH,
];

const person = (
  number: number,
  displayName: string,
  organisation: DemoOrganisation,
  role: Role,
  task: string,
): DemoPerson => ({
  id: `0a1d0000-0000-4000-8000-0000000001${String(number).padStart(2, '0')}`,
  displayName,
  email: `${displayName.toLowerCase().replace(/\W+/g, '.')}@${organisation.slug}.example`,
  task,
  places: [{ organisation, role }],
});

const INGRID = person(
  2,
  'Ingrid Falk',
  ALDERMERE,
  'aerodynamicist',
  'Bring results in, see each of them reduced to the reference, adopt evidence.',
);

export const AERODYNAMICIST_ID = INGRID.id;
export const PROGRAMME_MANAGER_ID = '0a1d0000-0000-4000-8000-000000000101';

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  person(
    1,
    'Maren Holt',
    ALDERMERE,
    'programme-manager',
    'See which variant drags most, how sure that is, and open any figure.',
  ),
  // Belongs to both makers: the one person who can show what switching the organisation does.
  { ...INGRID, places: [...INGRID.places, { organisation: VELTHORPE, role: 'viewer' }] },
  person(
    3,
    'Tomas Lindqvist',
    ALDERMERE,
    'stylist',
    'See at once what a shape costs beside the alternatives.',
  ),
  person(4, 'Priya Raman', ALDERMERE, 'viewer', 'Read the standing without being able to change it.'),
  person(5, 'Owen Carrick', ALDERMERE, 'administrator', 'See who works here and who changed what.'),
  person(
    6,
    'Beatriz Sousa',
    VELTHORPE,
    'aerodynamicist',
    'Work at the other maker: none of Aldermere’s data is here.',
  ),
  person(
    7,
    'Hanne Brekke',
    CORVANE,
    'supplier-engineer',
    'Work at a supplier: nothing of a maker’s is here.',
  ),
  person(
    8,
    'Jonas Ekwall',
    FENWICK,
    'supplier-engineer',
    'Work at the wheel supplier: nothing of a maker’s is here.',
  ),
  person(
    9,
    'Alys Penrose',
    STOWMARCH,
    'supplier-engineer',
    'Work at the underbody supplier: nothing of a maker’s is here.',
  ),
];
