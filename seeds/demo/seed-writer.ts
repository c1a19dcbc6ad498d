import type pg from 'pg';
import { stableId } from './stable-id';

export type Queryable = Pick<pg.ClientBase, 'query'>;
export type Row = Readonly<Record<string, unknown>>;

const COLUMN = /^[a-z][a-z0-9_]*$/;

/** Writes rows of one organisation, which each of them names: the maintenance login bypasses row-level security. */
export class SeedWriter {
  constructor(
    private readonly client: Queryable,
    readonly organisation: { readonly id: string; readonly slug: string },
  ) {}

  id(...path: readonly string[]): string {
    return stableId(this.organisation.slug, ...path);
  }

  async insert(table: string, row: Row): Promise<void> {
    const full: Row = { organisation_id: this.organisation.id, ...row };
    const columns = Object.keys(full).filter((column) => full[column] !== undefined);
    if (![table, ...columns].every((name) => COLUMN.test(name))) throw new Error(`not a name: ${columns}`);
    await this.client.query(
      `insert into ${table} (${columns.join(', ')}) values (${columns.map((_, i) => `$${i + 1}`).join(', ')})`,
      columns.map((column) => full[column]),
    );
  }

  /** One line of the audit trail, as the product itself would have written it. */
  async audit(
    at: string,
    actorUserId: string,
    action: string,
    entity: { readonly kind: string; readonly id: string },
    summary: Readonly<Record<string, unknown>>,
  ): Promise<void> {
    await this.insert('audit_events', {
      id: this.id('audit', action, entity.id, at),
      at,
      actor_user_id: actorUserId,
      action,
      entity_kind: entity.kind,
      entity_id: entity.id,
      summary: JSON.stringify(Object.entries(summary).map(([field, after]) => ({ field, after }))),
    });
  }
}
