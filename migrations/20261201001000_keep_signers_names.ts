import type { Knex } from 'knex';

/** A signature keeps the name under which it was given, whatever the person is called later. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE signatures ADD COLUMN signed_name text, ADD COLUMN signed_initials text');
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE signatures DROP COLUMN signed_initials, DROP COLUMN signed_name');
}
