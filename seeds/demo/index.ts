import type pg from 'pg';
import { seedPeople } from './people/seed-people';

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
}
