import type pg from 'pg';
import { loadScenario } from './load-scenario';
import { ALDERMERE, DEMO_PEOPLE, VELTHORPE, type DemoOrganisation } from './people/people';
import { seedPeople } from './people/seed-people';
import { ALDERMERE_SCENARIO } from './scenario/aldermere';
import type { Scenario } from './scenario/scenario-types';
import { VELTHORPE_SCENARIO } from './scenario/velthorpe';

export interface DemoOptions {
  /** Hash of the one password of all demo people, drawn per installation. */
  readonly passwordHash: string;
}

/**
 * The whole demo scenario, for the maintenance login in one transaction. That login bypasses row-level security, so every
 * insert into a tenant table names its organisation.
 */
export async function seedDemo(client: Pick<pg.ClientBase, 'query'>, options: DemoOptions): Promise<void> {
  await seedPeople(client, options.passwordHash);
  await seedScenario(client, ALDERMERE, ALDERMERE_SCENARIO);
  await seedScenario(client, VELTHORPE, VELTHORPE_SCENARIO);
}

async function seedScenario(
  client: Pick<pg.ClientBase, 'query'>,
  organisation: DemoOrganisation,
  scenario: Scenario,
): Promise<void> {
  const places = DEMO_PEOPLE.flatMap((person) =>
    person.places
      .filter((place) => place.organisation.id === organisation.id)
      .map(({ role }) => ({ id: person.id, role })),
  );
  const aerodynamicist = places.find(({ role }) => role === 'aerodynamicist');
  if (aerodynamicist === undefined) throw new Error(`${organisation.name} has no aerodynamicist`);
  await loadScenario(client, scenario, {
    organisation,
    aerodynamicistId: aerodynamicist.id,
    memberIds: places.map(({ id }) => id),
  });
}
