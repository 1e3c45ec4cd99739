import knex from 'knex';
import type { TestProject } from 'vitest/node';
import { migrationSource } from '../../migrations/index';
import { ensurePostgres } from '../../src-server/setup/postgres.mjs';

declare module 'vitest' {
  interface ProvidedContext {
    /** Address of the tests' PostgreSQL server, without a database. */
    databaseServer: string;
    /** Database with all migrations, from which each test database is cloned. */
    databaseTemplate: string;
  }
}

/** Starts the tests' own PostgreSQL and makes one migrated database to clone from. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const server = process.env.WALLFLUX_TEST_DATABASE_SERVER ?? (await ensurePostgres('test'));
  const template = `template_${process.pid}_${project.name}`;
  const admin = knex({ client: 'pg', connection: `${server}/postgres`, pool: { min: 0, max: 1 } });
  await admin.raw('DROP DATABASE IF EXISTS ?? WITH (FORCE)', [template]);
  await admin.raw('CREATE DATABASE ??', [template]);
  const migrated = knex({ client: 'pg', connection: `${server}/${template}`, migrations: { migrationSource } });
  await migrated.migrate.latest();
  await migrated.destroy();
  project.provide('databaseServer', server);
  project.provide('databaseTemplate', template);
  return async () => {
    const { rows } = await admin.raw<{ rows: { datname: string }[] }>(
      'SELECT datname FROM pg_database WHERE datname LIKE ?',
      [`${template}%`],
    );
    for (const { datname } of rows) await admin.raw('DROP DATABASE IF EXISTS ?? WITH (FORCE)', [datname]);
    await admin.destroy();
  };
}
