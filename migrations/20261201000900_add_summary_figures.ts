import type { Knex } from 'knex';

/** Failed requirements and cells without a result, and when the figures were computed: what is younger makes them stale. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE revision_summaries
      ADD COLUMN requirements_failed integer NOT NULL DEFAULT 0,
      ADD COLUMN errors integer NOT NULL DEFAULT 0,
      ADD COLUMN computed_at timestamptz NOT NULL DEFAULT '-infinity';
    CREATE INDEX revision_summaries_changed_by ON revision_summaries (changed_by);
    CREATE INDEX trail_revision ON trail (revision_id, at);
    CREATE INDEX signatures_person ON signatures (person_id);
    CREATE INDEX remark_answers_author ON remark_answers (author_id);
    CREATE INDEX revisions_checker ON revisions (checker_id);
    CREATE INDEX document_updates_person ON document_updates (person_id);
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP INDEX document_updates_person;
    DROP INDEX revisions_checker;
    DROP INDEX remark_answers_author;
    DROP INDEX signatures_person;
    DROP INDEX trail_revision;
    DROP INDEX revision_summaries_changed_by;
    ALTER TABLE revision_summaries DROP COLUMN computed_at, DROP COLUMN errors, DROP COLUMN requirements_failed;
  `);
}
