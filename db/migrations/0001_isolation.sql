-- Isolation: every table of a customer's data is confined to the organisation that the transaction named
-- with set_config('lanewright.org_id', …, true). Without it no row is visible and none can be written.
CREATE FUNCTION current_org() RETURNS uuid LANGUAGE sql STABLE AS
  $$ SELECT nullif(current_setting('lanewright.org_id', true), '')::uuid $$;
--> statement-breakpoint
DO $$
DECLARE t text;
BEGIN
  FOR t IN SELECT c.table_name FROM information_schema.columns c
           WHERE c.table_schema = 'public' AND c.column_name = 'org_id'
  LOOP
    EXECUTE format('ALTER TABLE %I ENABLE ROW LEVEL SECURITY', t);
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', t);
    EXECUTE format('CREATE POLICY own_organisation ON %I USING (org_id = current_org()) WITH CHECK (org_id = current_org())', t);
  END LOOP;
END $$;
--> statement-breakpoint
ALTER TABLE organisations ENABLE ROW LEVEL SECURITY;
--> statement-breakpoint
ALTER TABLE organisations FORCE ROW LEVEL SECURITY;
--> statement-breakpoint
CREATE POLICY own_organisation ON organisations USING (id = current_org()) WITH CHECK (id = current_org());
--> statement-breakpoint
-- People stand above organisations: an organisation sees those who are its members.
ALTER TABLE people ENABLE ROW LEVEL SECURITY;
--> statement-breakpoint
CREATE POLICY members_only ON people FOR SELECT
  USING (EXISTS (SELECT 1 FROM memberships m WHERE m.person_id = people.id));
--> statement-breakpoint
-- Sign-in happens before an organisation is known.
CREATE POLICY sign_in ON organisations FOR SELECT TO lanewright_auth USING (true);
--> statement-breakpoint
CREATE POLICY sign_in ON memberships FOR SELECT TO lanewright_auth USING (true);
--> statement-breakpoint
CREATE POLICY sign_in ON people TO lanewright_auth USING (true);
--> statement-breakpoint
CREATE POLICY sign_in ON sessions TO lanewright_auth USING (true) WITH CHECK (true);
--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO lanewright_app, lanewright_auth;
--> statement-breakpoint
GRANT SELECT ON organisations, memberships, people TO lanewright_auth;
--> statement-breakpoint
GRANT UPDATE (password_hash) ON people TO lanewright_auth;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON sessions TO lanewright_auth;
--> statement-breakpoint
GRANT SELECT ON organisations, memberships TO lanewright_app;
--> statement-breakpoint
GRANT SELECT (id, name, email) ON people TO lanewright_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON
  projects, points, dispensers, cabinets, controllers, modules, module_groups, supplies, circuits, cable_nodes,
  assignments, imports TO lanewright_app;
--> statement-breakpoint
-- A version of a catalogue type never changes, and history only grows.
GRANT SELECT, INSERT ON
  dispenser_types, module_types, cable_types, supply_types, greases, change_sets, change_items TO lanewright_app;
--> statement-breakpoint
-- A change set may move a row to a box that the same set creates, or swap two tags: inside it references and
-- uniqueness are checked at its end. Outside of it they are checked at once.
DO $$
DECLARE c record;
BEGIN
  FOR c IN SELECT conrelid::regclass AS t, conname, contype, pg_get_constraintdef(oid) AS def FROM pg_constraint
           WHERE connamespace = 'public'::regnamespace AND conrelid IN
             (SELECT attrelid FROM pg_attribute WHERE attname = 'project_id' AND NOT attisdropped)
             AND conrelid NOT IN ('change_sets'::regclass, 'imports'::regclass)
             AND (contype = 'f' OR (contype = 'u' AND conname NOT LIKE '%\_key'))
  LOOP
    IF c.contype = 'f' THEN
      EXECUTE format('ALTER TABLE %s ALTER CONSTRAINT %I DEFERRABLE INITIALLY IMMEDIATE', c.t, c.conname);
    ELSE
      EXECUTE format('ALTER TABLE %s DROP CONSTRAINT %I', c.t, c.conname);
      EXECUTE format('ALTER TABLE %s ADD CONSTRAINT %I %s DEFERRABLE INITIALLY IMMEDIATE', c.t, c.conname, c.def);
    END IF;
  END LOOP;
END $$;
