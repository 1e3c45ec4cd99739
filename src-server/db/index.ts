import knex, { type Knex } from 'knex';
import { migrationSource } from '../../migrations/index';

/** The database, or a transaction on it. */
export type Database = Knex;

export function createDatabase(url: string): Database {
  return knex({ client: 'pg', connection: url, pool: { min: 0, max: 20 }, migrations: { migrationSource } });
}

export async function migrate(db: Database): Promise<void> {
  await db.migrate.latest();
}
