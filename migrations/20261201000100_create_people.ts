import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE people (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      sign_in_name text NOT NULL CHECK (sign_in_name = lower(sign_in_name)),
      name text NOT NULL,
      initials text NOT NULL,
      email text NOT NULL,
      password_hash text NOT NULL,
      administrator boolean NOT NULL DEFAULT false,
      active boolean NOT NULL DEFAULT true,
      created_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT people_sign_in_name_unique UNIQUE (sign_in_name)
    );
    -- As connect-pg-simple wants it.
    CREATE TABLE session (
      sid varchar PRIMARY KEY,
      sess json NOT NULL,
      expire timestamp(6) NOT NULL
    );
    CREATE INDEX session_expire ON session (expire);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE session; DROP TABLE people;');
}
