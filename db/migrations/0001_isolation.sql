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
