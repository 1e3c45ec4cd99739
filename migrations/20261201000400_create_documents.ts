import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE document_updates (
      id bigserial PRIMARY KEY,
      revision_id uuid NOT NULL REFERENCES revisions,
      person_id uuid REFERENCES people,
      content bytea NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX document_updates_revision ON document_updates (revision_id, id);
    CREATE TABLE document_states (
      revision_id uuid PRIMARY KEY REFERENCES revisions,
      content bytea NOT NULL,
      -- Every update up to this number is in the state.
      through_id bigint NOT NULL DEFAULT 0
    );
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE document_states; DROP TABLE document_updates;');
}
