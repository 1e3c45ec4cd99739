import type { Knex } from 'knex';

/**
 * What belongs to a revision in force or before it: nothing is added, changed, taken out or moved to
 * another revision; and content is written only while a revision is open. Signatures stay for good,
 * also those that became void.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE OR REPLACE FUNCTION keep_locked_parts() RETURNS trigger LANGUAGE plpgsql AS $$
    DECLARE
      locked_letter text;
    BEGIN
      -- Waits for a lock that is on its way: what it froze, nothing may be added to afterwards.
      -- Both sides of a change count, so that a part cannot be moved out of a locked revision either.
      PERFORM 1 FROM revisions WHERE id IN (NEW.revision_id, OLD.revision_id) FOR SHARE;
      SELECT letter INTO locked_letter FROM revisions
        WHERE id IN (NEW.revision_id, OLD.revision_id) AND state IN ('locked', 'superseded', 'withdrawn') LIMIT 1;
      IF FOUND THEN
        RAISE EXCEPTION 'revision % is locked', locked_letter USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN COALESCE(NEW, OLD);
    END $$;

    CREATE OR REPLACE FUNCTION keep_locked_answers() RETURNS trigger LANGUAGE plpgsql AS $$
    DECLARE
      locked_letter text;
    BEGIN
      PERFORM 1 FROM revisions r JOIN remarks m ON m.revision_id = r.id
        WHERE m.id IN (NEW.remark_id, OLD.remark_id) FOR SHARE OF r;
      SELECT r.letter INTO locked_letter FROM revisions r JOIN remarks m ON m.revision_id = r.id
        WHERE m.id IN (NEW.remark_id, OLD.remark_id) AND r.state IN ('locked', 'superseded', 'withdrawn') LIMIT 1;
      IF FOUND THEN
        RAISE EXCEPTION 'revision % is locked', locked_letter USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN COALESCE(NEW, OLD);
    END $$;

    CREATE FUNCTION keep_content_checked() RETURNS trigger LANGUAGE plpgsql AS $$
    DECLARE
      current_state text;
    BEGIN
      SELECT state INTO current_state FROM revisions WHERE id = NEW.revision_id FOR SHARE;
      IF current_state NOT IN ('draft', 'for check') THEN
        RAISE EXCEPTION 'the revision is %: its content is not written', current_state
          USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN NEW;
    END $$;

    CREATE FUNCTION keep_signatures() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF TG_OP = 'DELETE' OR OLD.voided_at IS NOT NULL OR (to_jsonb(NEW) - 'voided_at') <> (to_jsonb(OLD) - 'voided_at') THEN
        RAISE EXCEPTION 'a signature is only made void' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN NEW;
    END $$;

    CREATE FUNCTION refuse_emptying() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      RAISE EXCEPTION 'records of revisions are not emptied' USING ERRCODE = 'integrity_constraint_violation';
    END $$;

    DROP TRIGGER document_updates_locked ON document_updates;
    CREATE TRIGGER document_updates_locked BEFORE INSERT OR UPDATE OR DELETE ON document_updates FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    CREATE TRIGGER document_updates_open BEFORE INSERT OR UPDATE ON document_updates FOR EACH ROW EXECUTE FUNCTION keep_content_checked();
    CREATE TRIGGER document_states_locked BEFORE INSERT OR UPDATE OR DELETE ON document_states FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    CREATE TRIGGER revision_writers_locked BEFORE INSERT OR UPDATE OR DELETE ON revision_writers FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    CREATE TRIGGER signatures_kept BEFORE UPDATE OR DELETE ON signatures FOR EACH ROW EXECUTE FUNCTION keep_signatures();

    CREATE TRIGGER revisions_not_emptied BEFORE TRUNCATE ON revisions FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER document_updates_not_emptied BEFORE TRUNCATE ON document_updates FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER document_states_not_emptied BEFORE TRUNCATE ON document_states FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER revision_writers_not_emptied BEFORE TRUNCATE ON revision_writers FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER remarks_not_emptied BEFORE TRUNCATE ON remarks FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER remark_answers_not_emptied BEFORE TRUNCATE ON remark_answers FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER ticks_not_emptied BEFORE TRUNCATE ON ticks FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
    CREATE TRIGGER signatures_not_emptied BEFORE TRUNCATE ON signatures FOR EACH STATEMENT EXECUTE FUNCTION refuse_emptying();
  `);
}

/** The two functions that were made stricter stay as they are: their earlier form let parts be moved away. */
export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER signatures_not_emptied ON signatures;
    DROP TRIGGER ticks_not_emptied ON ticks;
    DROP TRIGGER remark_answers_not_emptied ON remark_answers;
    DROP TRIGGER remarks_not_emptied ON remarks;
    DROP TRIGGER revision_writers_not_emptied ON revision_writers;
    DROP TRIGGER document_states_not_emptied ON document_states;
    DROP TRIGGER document_updates_not_emptied ON document_updates;
    DROP TRIGGER revisions_not_emptied ON revisions;
    DROP TRIGGER signatures_kept ON signatures;
    DROP TRIGGER revision_writers_locked ON revision_writers;
    DROP TRIGGER document_states_locked ON document_states;
    DROP TRIGGER document_updates_open ON document_updates;
    DROP TRIGGER document_updates_locked ON document_updates;
    CREATE TRIGGER document_updates_locked BEFORE INSERT OR UPDATE ON document_updates FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    DROP FUNCTION refuse_emptying();
    DROP FUNCTION keep_signatures();
    DROP FUNCTION keep_content_checked();
  `);
}
