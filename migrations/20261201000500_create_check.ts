import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE remarks (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      revision_id uuid NOT NULL REFERENCES revisions,
      number integer NOT NULL,
      cell_id text NOT NULL,
      author_id uuid NOT NULL REFERENCES people,
      content text NOT NULL,
      closed boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT remarks_number_unique UNIQUE (revision_id, number)
    );
    CREATE INDEX remarks_author ON remarks (author_id);
    CREATE TABLE remark_answers (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      remark_id uuid NOT NULL REFERENCES remarks,
      author_id uuid NOT NULL REFERENCES people,
      content text NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX remark_answers_remark ON remark_answers (remark_id);
    CREATE TABLE ticks (
      revision_id uuid NOT NULL REFERENCES revisions,
      cell_id text NOT NULL,
      person_id uuid NOT NULL REFERENCES people,
      fingerprint text NOT NULL,
      depends_on jsonb NOT NULL DEFAULT '{}',
      ticked_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (revision_id, cell_id)
    );
    CREATE INDEX ticks_person ON ticks (person_id);
    CREATE TABLE signatures (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      revision_id uuid NOT NULL REFERENCES revisions,
      person_id uuid NOT NULL REFERENCES people,
      meaning text NOT NULL CHECK (meaning IN ('prepared', 'checked', 'approved')),
      fingerprint text NOT NULL,
      signed_at timestamptz NOT NULL DEFAULT now(),
      voided_at timestamptz
    );
    CREATE INDEX signatures_revision ON signatures (revision_id);
    CREATE UNIQUE INDEX signatures_one_valid ON signatures (revision_id, meaning) WHERE voided_at IS NULL;
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE signatures; DROP TABLE ticks; DROP TABLE remark_answers; DROP TABLE remarks;');
}
