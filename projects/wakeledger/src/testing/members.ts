import { permissionsOf } from '#shared/access/permissions';
import type { Role } from '#shared/access/roles';
import type { SessionState } from '#shared/contracts/session';

const ORGANISATION_ID = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0001';
const SECOND_ORGANISATION_ID = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0002';

/** What the server says of a signed-in person of this role. */
export function signedInAs(role: Role, organisationId = ORGANISATION_ID): SessionState {
  return {
    member: {
      userId: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0010',
      displayName: 'Ines Farrow',
      email: 'ines.farrow@aldermere.example',
      organisationId,
      role,
      permissions: [...permissionsOf(role)],
      memberships: [
        {
          organisationId: ORGANISATION_ID,
          organisationName: 'Aldermere Motors',
          organisationSlug: 'aldermere',
          kind: 'maker',
          role,
        },
        {
          organisationId: SECOND_ORGANISATION_ID,
          organisationName: 'Velthorpe Coachworks',
          organisationSlug: 'velthorpe',
          kind: 'maker',
          role: 'viewer',
        },
      ],
    },
  };
}

export const OTHER_ORGANISATION_ID = SECOND_ORGANISATION_ID;
