import type { Knex } from 'knex';

/** What is locked stays as it is, whoever asks: the application's own role too. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE FUNCTION keep_locked_revision() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.state IN ('locked', 'superseded', 'withdrawn') THEN
        IF TG_OP = 'DELETE' THEN
          RAISE EXCEPTION 'revision % is locked', OLD.letter USING ERRCODE = 'integrity_constraint_violation';
        END IF;
        IF NOT (OLD.state = 'locked' AND NEW.state IN ('superseded', 'withdrawn') OR NEW.state = OLD.state)
          OR (to_jsonb(NEW) - 'state') <> (to_jsonb(OLD) - 'state') THEN
          RAISE EXCEPTION 'revision % is locked', OLD.letter USING ERRCODE = 'integrity_constraint_violation';
        END IF;
      END IF;
      RETURN COALESCE(NEW, OLD);
    END $$;
    CREATE TRIGGER revisions_locked BEFORE UPDATE OR DELETE ON revisions FOR EACH ROW EXECUTE FUNCTION keep_locked_revision();

    CREATE FUNCTION keep_locked_parts() RETURNS trigger LANGUAGE plpgsql AS $$
    DECLARE
      row_state text;
      of_revision uuid := COALESCE(NEW.revision_id, OLD.revision_id);
    BEGIN
      -- Waits for a lock that is on its way: what it froze, nothing may be added to afterwards.
      SELECT state INTO row_state FROM revisions WHERE id = of_revision FOR SHARE;
      IF row_state IN ('locked', 'superseded', 'withdrawn') THEN
        RAISE EXCEPTION 'the revision is locked' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN COALESCE(NEW, OLD);
    END $$;
    CREATE TRIGGER document_updates_locked BEFORE INSERT OR UPDATE ON document_updates FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    CREATE TRIGGER remarks_locked BEFORE INSERT OR UPDATE OR DELETE ON remarks FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    CREATE TRIGGER ticks_locked BEFORE INSERT OR UPDATE OR DELETE ON ticks FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();
    CREATE TRIGGER signatures_locked BEFORE INSERT OR UPDATE OR DELETE ON signatures FOR EACH ROW EXECUTE FUNCTION keep_locked_parts();

    CREATE FUNCTION keep_locked_answers() RETURNS trigger LANGUAGE plpgsql AS $$
    DECLARE
      row_state text;
    BEGIN
      SELECT r.state INTO row_state FROM remarks m JOIN revisions r ON r.id = m.revision_id
        WHERE m.id = COALESCE(NEW.remark_id, OLD.remark_id) FOR SHARE OF r;
      IF row_state IN ('locked', 'superseded', 'withdrawn') THEN
        RAISE EXCEPTION 'the revision is locked' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN COALESCE(NEW, OLD);
    END $$;
    CREATE TRIGGER remark_answers_locked BEFORE INSERT OR UPDATE OR DELETE ON remark_answers FOR EACH ROW EXECUTE FUNCTION keep_locked_answers();
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DROP TRIGGER remark_answers_locked ON remark_answers;
    DROP TRIGGER signatures_locked ON signatures;
    DROP TRIGGER ticks_locked ON ticks;
    DROP TRIGGER remarks_locked ON remarks;
    DROP TRIGGER document_updates_locked ON document_updates;
    DROP TRIGGER revisions_locked ON revisions;
    DROP FUNCTION keep_locked_answers(); DROP FUNCTION keep_locked_parts(); DROP FUNCTION keep_locked_revision();
  `);
}
