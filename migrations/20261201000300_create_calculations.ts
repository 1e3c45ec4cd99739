import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE calculations (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      project_id uuid NOT NULL REFERENCES projects,
      number text NOT NULL,
      title text NOT NULL,
      "group" text NOT NULL DEFAULT '',
      created_by uuid REFERENCES people,
      created_at timestamptz NOT NULL DEFAULT now(),
      CONSTRAINT calculations_number_unique UNIQUE (project_id, number)
    );
    CREATE TABLE revisions (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      calculation_id uuid NOT NULL REFERENCES calculations,
      letter text NOT NULL,
      state text NOT NULL DEFAULT 'draft'
        CHECK (state IN ('draft', 'for check', 'checked', 'locked', 'superseded', 'withdrawn')),
      change_note text NOT NULL DEFAULT '',
      begun_at timestamptz NOT NULL DEFAULT now(),
      begun_by uuid REFERENCES people,
      checker_id uuid REFERENCES people,
      locked_at timestamptz,
      content jsonb,
      results jsonb,
      versions jsonb,
      reasons jsonb NOT NULL DEFAULT '[]',
      canonical text,
      fingerprint text,
      CONSTRAINT revisions_letter_unique UNIQUE (calculation_id, letter),
      CONSTRAINT revisions_locked_whole CHECK (
        state NOT IN ('locked', 'superseded', 'withdrawn')
        OR (content IS NOT NULL AND canonical IS NOT NULL AND fingerprint IS NOT NULL AND locked_at IS NOT NULL)
      )
    );
    CREATE UNIQUE INDEX revisions_one_open ON revisions (calculation_id) WHERE state IN ('draft', 'for check', 'checked');
    CREATE UNIQUE INDEX revisions_one_in_force ON revisions (calculation_id) WHERE state = 'locked';
    CREATE TABLE revision_writers (
      revision_id uuid NOT NULL REFERENCES revisions,
      person_id uuid NOT NULL REFERENCES people,
      first_at timestamptz NOT NULL DEFAULT now(),
      last_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (revision_id, person_id)
    );
    CREATE INDEX revision_writers_person ON revision_writers (person_id);
    CREATE TABLE revision_summaries (
      revision_id uuid PRIMARY KEY REFERENCES revisions,
      cells integer NOT NULL DEFAULT 0,
      ticked integer NOT NULL DEFAULT 0,
      changed integer NOT NULL DEFAULT 0,
      open_remarks integer NOT NULL DEFAULT 0,
      tbv integer NOT NULL DEFAULT 0,
      outside_range integer NOT NULL DEFAULT 0,
      changed_at timestamptz NOT NULL DEFAULT now(),
      changed_by uuid REFERENCES people
    );
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(
    'DROP TABLE revision_summaries; DROP TABLE revision_writers; DROP TABLE revisions; DROP TABLE calculations;',
  );
}
