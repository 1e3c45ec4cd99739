import type { Knex } from 'knex';

/** The foreign keys to people that had no index yet. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE INDEX calculations_created_by ON calculations (created_by);
    CREATE INDEX revisions_begun_by ON revisions (begun_by);
    CREATE INDEX trail_person ON trail (person_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP INDEX trail_person; DROP INDEX revisions_begun_by; DROP INDEX calculations_created_by;');
}
