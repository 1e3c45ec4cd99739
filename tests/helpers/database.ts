import { randomBytes } from 'node:crypto';
import knex from 'knex';
import { inject } from 'vitest';

export interface TestDatabase {
  /** `postgres://…/name`, for a server under test. */
  url: string;
  drop(): Promise<void>;
}

/** A database of its own for one test file, cloned from the migrated template. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const server = inject('databaseServer');
  const template = inject('databaseTemplate');
  const name = `${template}_${randomBytes(4).toString('hex')}`;
  const admin = () => knex({ client: 'pg', connection: `${server}/postgres`, pool: { min: 0, max: 1 } });
  const create = admin();
  await create.raw('CREATE DATABASE ?? TEMPLATE ??', [name, template]);
  await create.destroy();
  return {
    url: `${server}/${name}`,
    async drop() {
      const drop = admin();
      await drop.raw('DROP DATABASE IF EXISTS ?? WITH (FORCE)', [name]);
      await drop.destroy();
    },
  };
}
