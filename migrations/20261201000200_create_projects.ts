import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE projects (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      number text NOT NULL CONSTRAINT projects_number_unique UNIQUE,
      title text NOT NULL,
      firm text NOT NULL DEFAULT '',
      client text NOT NULL DEFAULT '',
      place text NOT NULL DEFAULT '',
      begun date NOT NULL DEFAULT CURRENT_DATE
    );
    CREATE TABLE project_members (
      project_id uuid NOT NULL REFERENCES projects ON DELETE CASCADE,
      person_id uuid NOT NULL REFERENCES people,
      role text NOT NULL CHECK (role IN ('engineer', 'checker', 'lead', 'reader')),
      PRIMARY KEY (project_id, person_id)
    );
    CREATE INDEX project_members_person ON project_members (person_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE project_members; DROP TABLE projects;');
}
