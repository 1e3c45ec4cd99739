import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE trail (
      id bigserial PRIMARY KEY,
      project_id uuid NOT NULL REFERENCES projects,
      calculation_id uuid REFERENCES calculations,
      revision_id uuid REFERENCES revisions,
      person_id uuid REFERENCES people,
      act text NOT NULL,
      sentence text NOT NULL,
      detail jsonb NOT NULL DEFAULT '{}',
      at timestamptz NOT NULL,
      previous_hash text NOT NULL,
      hash text NOT NULL
    );
    CREATE INDEX trail_project ON trail (project_id, id);
    CREATE INDEX trail_calculation ON trail (calculation_id, id);
    CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      RAISE EXCEPTION 'the trail is only added to' USING ERRCODE = 'integrity_constraint_violation';
    END $$;
    CREATE TRIGGER trail_unchanged BEFORE UPDATE OR DELETE ON trail FOR EACH ROW EXECUTE FUNCTION refuse_change();
    CREATE TRIGGER trail_not_emptied BEFORE TRUNCATE ON trail FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE trail; DROP FUNCTION refuse_change();');
}
