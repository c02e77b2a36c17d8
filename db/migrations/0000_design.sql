CREATE TABLE "memberships" (
	"org_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"roles" text[] NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_pk" PRIMARY KEY("org_id","person_id"),
	CONSTRAINT "memberships_roles_ck" CHECK ("memberships"."roles" <@ array['engineer','electrician','commissioning','technician','administrator','viewer']::text[] and cardinality("memberships"."roles") > 0)
);
--> statement-breakpoint
CREATE TABLE "organisations" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"refresh_hash" text NOT NULL,
	"previous_hash" text,
	"rotated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	"user_agent" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "cable_types" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"name" text NOT NULL,
	"type_version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"cross_section_mm2" double precision NOT NULL,
	"conductor_class" integer NOT NULL,
	"cores" integer NOT NULL,
	"core_marking" text NOT NULL,
	"core_colours" text[] NOT NULL,
	CONSTRAINT "cable_types_key" UNIQUE("org_id","id"),
	CONSTRAINT "cable_types_version_uq" UNIQUE("org_id","name","type_version"),
	CONSTRAINT "cable_types_ck" CHECK ("cable_types"."cross_section_mm2" > 0 and "cable_types"."conductor_class" in (2, 5) and "cable_types"."cores" > 0)
);
--> statement-breakpoint
ALTER TABLE "cable_types" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "dispenser_types" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"name" text NOT NULL,
	"type_version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"wiring" text NOT NULL,
	"cartridges_ul" integer[] NOT NULL,
	"residual_ul" integer NOT NULL,
	"dose_min_ul" integer NOT NULL,
	"dose_max_ul" integer NOT NULL,
	"dose_step_ul" integer NOT NULL,
	"run_ms_per_step" integer NOT NULL,
	"recovery_ms" integer NOT NULL,
	"trigger_ms" integer,
	"timed_months" integer[] NOT NULL,
	"load" text NOT NULL,
	"run_a" double precision NOT NULL,
	"peak_a" double precision NOT NULL,
	"idle_a" double precision NOT NULL,
	"min_v" double precision NOT NULL,
	"control_input_a" double precision,
	"control_on_v" double precision,
	"off_state_a" double precision NOT NULL,
	"control_polarity" text NOT NULL,
	"status" jsonb,
	"pins" jsonb NOT NULL,
	"protection_levels" text[] NOT NULL,
	"max_surface_c" double precision,
	CONSTRAINT "dispenser_types_key" UNIQUE("org_id","id"),
	CONSTRAINT "dispenser_types_version_uq" UNIQUE("org_id","name","type_version"),
	CONSTRAINT "dispenser_types_dose_ck" CHECK ("dispenser_types"."dose_step_ul" > 0 and "dispenser_types"."dose_min_ul" >= "dispenser_types"."dose_step_ul" and "dispenser_types"."dose_max_ul" >= "dispenser_types"."dose_min_ul" and "dispenser_types"."residual_ul" >= 0),
	CONSTRAINT "dispenser_types_electric_ck" CHECK ("dispenser_types"."run_a" > 0 and "dispenser_types"."peak_a" >= "dispenser_types"."run_a" and "dispenser_types"."idle_a" >= 0 and "dispenser_types"."min_v" > 0 and "dispenser_types"."run_ms_per_step" > 0 and "dispenser_types"."recovery_ms" >= 0)
);
--> statement-breakpoint
ALTER TABLE "dispenser_types" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "greases" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"name" text NOT NULL,
	"nlgi" text NOT NULL,
	"thickener" text NOT NULL,
	"density_g_per_cm3" double precision NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "greases_key" UNIQUE("org_id","id"),
	CONSTRAINT "greases_name_uq" UNIQUE("org_id","name"),
	CONSTRAINT "greases_density_ck" CHECK ("greases"."density_g_per_cm3" between 0.5 and 2)
);
--> statement-breakpoint
ALTER TABLE "greases" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "module_types" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"name" text NOT NULL,
	"type_version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"kind" text NOT NULL,
	"technology" text NOT NULL,
	"polarity" text NOT NULL,
	"channels" integer NOT NULL,
	"channels_per_group" integer NOT NULL,
	"channel_a" double precision,
	"group_a" double precision,
	"module_a" double precision,
	"channel_peak_a" double precision,
	"drop_v" double precision NOT NULL,
	"leakage_a" double precision NOT NULL,
	"short_circuit_a" double precision,
	"min_load_a" double precision,
	"rated_operations" bigint,
	"input_type" integer,
	"input_a" double precision,
	CONSTRAINT "module_types_key" UNIQUE("org_id","id"),
	CONSTRAINT "module_types_version_uq" UNIQUE("org_id","name","type_version"),
	CONSTRAINT "module_types_channels_ck" CHECK ("module_types"."channels" between 1 and 128 and "module_types"."channels_per_group" between 1 and "module_types"."channels"),
	CONSTRAINT "module_types_input_ck" CHECK (("module_types"."kind" = 'input') = ("module_types"."input_type" is not null) and ("module_types"."input_type" is null or "module_types"."input_type" between 1 and 3))
);
--> statement-breakpoint
ALTER TABLE "module_types" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "supply_types" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"name" text NOT NULL,
	"type_version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"rated_a" double precision NOT NULL,
	"derating_from_c" double precision NOT NULL,
	"derating_percent_per_k" double precision NOT NULL,
	"tolerance_percent" double precision,
	"short_circuit_a" double precision NOT NULL,
	"extra_low_voltage" text NOT NULL,
	CONSTRAINT "supply_types_key" UNIQUE("org_id","id"),
	CONSTRAINT "supply_types_version_uq" UNIQUE("org_id","name","type_version"),
	CONSTRAINT "supply_types_ck" CHECK ("supply_types"."rated_a" > 0 and "supply_types"."derating_percent_per_k" >= 0 and "supply_types"."short_circuit_a" > 0)
);
--> statement-breakpoint
ALTER TABLE "supply_types" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "cabinets" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"location" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"temperature_c" double precision DEFAULT 40 NOT NULL,
	CONSTRAINT "cabinets_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "cabinets_location_uq" UNIQUE("project_id","location")
);
--> statement-breakpoint
ALTER TABLE "cabinets" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "controllers" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"cabinet_id" uuid NOT NULL,
	"name" text NOT NULL,
	CONSTRAINT "controllers_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "controllers_name_uq" UNIQUE("project_id","name")
);
--> statement-breakpoint
ALTER TABLE "controllers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "module_groups" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"module_id" uuid NOT NULL,
	"group_index" integer NOT NULL,
	"circuit_id" uuid,
	CONSTRAINT "module_groups_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "module_groups_index_uq" UNIQUE("module_id","group_index"),
	CONSTRAINT "module_groups_ck" CHECK ("module_groups"."group_index" >= 0)
);
--> statement-breakpoint
ALTER TABLE "module_groups" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "modules" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"controller_id" uuid NOT NULL,
	"type_id" uuid NOT NULL,
	"name" text NOT NULL,
	"base_byte" integer NOT NULL,
	"slot" integer NOT NULL,
	CONSTRAINT "modules_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "modules_name_uq" UNIQUE("controller_id","name"),
	CONSTRAINT "modules_ck" CHECK ("modules"."base_byte" between 0 and 65535 and "modules"."slot" >= 0)
);
--> statement-breakpoint
ALTER TABLE "modules" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "imports" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"file_name" text NOT NULL,
	"bytes" "bytea" NOT NULL,
	"sha256" text NOT NULL,
	"settings" jsonb,
	"change_set_id" uuid,
	"created" integer DEFAULT 0 NOT NULL,
	"updated" integer DEFAULT 0 NOT NULL,
	"committed_at" timestamp with time zone,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "imports" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "assignments" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"dispenser_id" uuid NOT NULL,
	"module_id" uuid NOT NULL,
	"channel" integer NOT NULL,
	"purpose" text NOT NULL,
	CONSTRAINT "assignments_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "assignments_channel_uq" UNIQUE("module_id","channel"),
	CONSTRAINT "assignments_purpose_uq" UNIQUE("dispenser_id","purpose"),
	CONSTRAINT "assignments_channel_ck" CHECK ("assignments"."channel" >= 0)
);
--> statement-breakpoint
ALTER TABLE "assignments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "dispensers" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"point_id" uuid NOT NULL,
	"type_id" uuid,
	"wiring" text,
	"method" text DEFAULT 'pulse' NOT NULL,
	"cartridge_ul" integer,
	"dose_ul" integer,
	"period_months" integer,
	"controller_id" uuid,
	"circuit_id" uuid,
	"node_id" uuid,
	"cable_tag" text,
	"cable_length_m" double precision,
	"cross_section_mm2" double precision,
	"conductor_class" integer DEFAULT 5 NOT NULL,
	CONSTRAINT "dispensers_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "dispensers_point_uq" UNIQUE("point_id"),
	CONSTRAINT "dispensers_dose_ck" CHECK ("dispensers"."cartridge_ul" > 0 and "dispensers"."dose_ul" > 0 and "dispensers"."dose_ul" % 100 = 0 and "dispensers"."period_months" > 0),
	CONSTRAINT "dispensers_cable_ck" CHECK ("dispensers"."cable_length_m" > 0 and "dispensers"."cross_section_mm2" > 0 and "dispensers"."conductor_class" in (2, 5))
);
--> statement-breakpoint
ALTER TABLE "dispensers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "points" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"tag" text NOT NULL,
	"description" text,
	"function" text,
	"location" text,
	"product" text,
	"machine" text,
	"remarks" text,
	"hours_per_day" double precision,
	"days_per_week" double precision DEFAULT 7 NOT NULL,
	"demand_way" text,
	"bore_mm" double precision,
	"outside_mm" double precision,
	"width_mm" double precision,
	"speed_rpm" double precision,
	"factors" jsonb DEFAULT '{"temperature":1,"contamination":1,"moisture":1,"vibration":1,"position":1,"design":1}'::jsonb NOT NULL,
	"stated_ul" bigint,
	"stated_per" text DEFAULT '1000h' NOT NULL,
	"practice_strokes" double precision,
	"practice_grams_per_stroke" double precision,
	"practice_every_days" double precision,
	"grease_id" uuid,
	"zone" text,
	CONSTRAINT "points_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "points_tag_uq" UNIQUE("project_id","tag"),
	CONSTRAINT "points_tag_ck" CHECK (length("points"."tag") between 1 and 200 and "points"."tag" = btrim("points"."tag")),
	CONSTRAINT "points_hours_ck" CHECK (("points"."hours_per_day" is null or ("points"."hours_per_day" > 0 and "points"."hours_per_day" <= 24)) and "points"."days_per_week" > 0 and "points"."days_per_week" <= 7),
	CONSTRAINT "points_bearing_ck" CHECK ("points"."bore_mm" > 0 and "points"."outside_mm" > 0 and "points"."width_mm" > 0 and "points"."speed_rpm" > 0 and "points"."outside_mm" > "points"."bore_mm"),
	CONSTRAINT "points_demand_ck" CHECK ("points"."stated_ul" > 0 and "points"."practice_strokes" > 0 and "points"."practice_grams_per_stroke" > 0 and "points"."practice_every_days" > 0)
);
--> statement-breakpoint
ALTER TABLE "points" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "change_items" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"change_set_id" uuid NOT NULL,
	"collection" text NOT NULL,
	"row_id" uuid NOT NULL,
	"before" jsonb,
	"after" jsonb
);
--> statement-breakpoint
ALTER TABLE "change_items" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "change_sets" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"sequence" bigint NOT NULL,
	"person_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"summary" text NOT NULL,
	CONSTRAINT "change_sets_sequence_uq" UNIQUE("project_id","sequence"),
	CONSTRAINT "change_sets_key" UNIQUE("org_id","project_id","id")
);
--> statement-breakpoint
ALTER TABLE "change_sets" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "projects" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"sequence" bigint DEFAULT 0 NOT NULL,
	"name" text NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"time_zone" text DEFAULT 'UTC' NOT NULL,
	"voltage_temp_c" double precision DEFAULT 40 NOT NULL,
	"trip_temp_c" double precision DEFAULT 70 NOT NULL,
	"spare_percent" double precision DEFAULT 20 NOT NULL,
	"supply_margin_percent" double precision DEFAULT 25 NOT NULL,
	"max_cartridge_days" integer DEFAULT 365 NOT NULL,
	"min_cartridge_days" integer DEFAULT 30 NOT NULL,
	"max_over_greasing_percent" double precision DEFAULT 5 NOT NULL,
	"relay_life_years" double precision DEFAULT 10 NOT NULL,
	"slot_ms" bigint,
	"breaker_dc_factor" double precision DEFAULT 1.5 NOT NULL,
	"rank_by" text DEFAULT 'fewest-changes' NOT NULL,
	"demand_per" text DEFAULT '1000h' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "projects_key" UNIQUE("org_id","id"),
	CONSTRAINT "projects_name_uq" UNIQUE("org_id","name"),
	CONSTRAINT "projects_ranges_ck" CHECK ("projects"."spare_percent" between 0 and 100 and "projects"."supply_margin_percent" between 0 and 400 and "projects"."max_cartridge_days" > 0 and "projects"."min_cartridge_days" >= 0 and "projects"."max_over_greasing_percent" >= 0 and "projects"."relay_life_years" > 0 and "projects"."breaker_dc_factor" >= 1 and ("projects"."slot_ms" is null or "projects"."slot_ms" > 0))
);
--> statement-breakpoint
ALTER TABLE "projects" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "cable_nodes" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"circuit_id" uuid NOT NULL,
	"parent_id" uuid,
	"location" text NOT NULL,
	"cable_tag" text NOT NULL,
	"length_m" double precision NOT NULL,
	"power_mm2" double precision NOT NULL,
	"signal_mm2" double precision NOT NULL,
	"conductor_class" integer DEFAULT 5 NOT NULL,
	CONSTRAINT "cable_nodes_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "cable_nodes_location_uq" UNIQUE("circuit_id","location"),
	CONSTRAINT "cable_nodes_ck" CHECK ("cable_nodes"."length_m" > 0 and "cable_nodes"."power_mm2" > 0 and "cable_nodes"."signal_mm2" > 0 and "cable_nodes"."conductor_class" in (2, 5) and "cable_nodes"."parent_id" is distinct from "cable_nodes"."id")
);
--> statement-breakpoint
ALTER TABLE "cable_nodes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "circuits" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"supply_id" uuid NOT NULL,
	"name" text NOT NULL,
	"protection" text NOT NULL,
	"protection_a" double precision NOT NULL,
	"protection_ohm" double precision DEFAULT 0 NOT NULL,
	"concurrency_limit" integer,
	CONSTRAINT "circuits_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "circuits_name_uq" UNIQUE("project_id","name"),
	CONSTRAINT "circuits_ck" CHECK ("circuits"."protection_a" > 0 and "circuits"."protection_ohm" >= 0 and ("circuits"."concurrency_limit" is null or "circuits"."concurrency_limit" > 0))
);
--> statement-breakpoint
ALTER TABLE "circuits" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "supplies" (
	"id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"cabinet_id" uuid NOT NULL,
	"type_id" uuid NOT NULL,
	"name" text NOT NULL,
	"set_v" double precision NOT NULL,
	"internal_ohm" double precision DEFAULT 0 NOT NULL,
	"other_load_a" double precision DEFAULT 0 NOT NULL,
	"redundant" boolean DEFAULT false NOT NULL,
	CONSTRAINT "supplies_key" UNIQUE("org_id","project_id","id"),
	CONSTRAINT "supplies_name_uq" UNIQUE("project_id","cabinet_id","name"),
	CONSTRAINT "supplies_ck" CHECK ("supplies"."set_v" between 18 and 30 and "supplies"."internal_ohm" >= 0 and "supplies"."other_load_a" >= 0)
);
--> statement-breakpoint
ALTER TABLE "supplies" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_org_id_organisations_id_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_membership_fk" FOREIGN KEY ("org_id","person_id") REFERENCES "public"."memberships"("org_id","person_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cable_types" ADD CONSTRAINT "cable_types_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispenser_types" ADD CONSTRAINT "dispenser_types_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "greases" ADD CONSTRAINT "greases_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "module_types" ADD CONSTRAINT "module_types_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supply_types" ADD CONSTRAINT "supply_types_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cabinets" ADD CONSTRAINT "cabinets_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "controllers" ADD CONSTRAINT "controllers_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "controllers" ADD CONSTRAINT "controllers_cabinet_fk" FOREIGN KEY ("org_id","project_id","cabinet_id") REFERENCES "public"."cabinets"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "module_groups" ADD CONSTRAINT "module_groups_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "module_groups" ADD CONSTRAINT "module_groups_module_fk" FOREIGN KEY ("org_id","project_id","module_id") REFERENCES "public"."modules"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "module_groups" ADD CONSTRAINT "module_groups_circuit_fk" FOREIGN KEY ("org_id","project_id","circuit_id") REFERENCES "public"."circuits"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "modules" ADD CONSTRAINT "modules_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "modules" ADD CONSTRAINT "modules_controller_fk" FOREIGN KEY ("org_id","project_id","controller_id") REFERENCES "public"."controllers"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "modules" ADD CONSTRAINT "modules_type_fk" FOREIGN KEY ("org_id","type_id") REFERENCES "public"."module_types"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "assignments" ADD CONSTRAINT "assignments_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "assignments" ADD CONSTRAINT "assignments_dispenser_fk" FOREIGN KEY ("org_id","project_id","dispenser_id") REFERENCES "public"."dispensers"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "assignments" ADD CONSTRAINT "assignments_module_fk" FOREIGN KEY ("org_id","project_id","module_id") REFERENCES "public"."modules"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispensers" ADD CONSTRAINT "dispensers_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispensers" ADD CONSTRAINT "dispensers_point_fk" FOREIGN KEY ("org_id","project_id","point_id") REFERENCES "public"."points"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispensers" ADD CONSTRAINT "dispensers_type_fk" FOREIGN KEY ("org_id","type_id") REFERENCES "public"."dispenser_types"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispensers" ADD CONSTRAINT "dispensers_controller_fk" FOREIGN KEY ("org_id","project_id","controller_id") REFERENCES "public"."controllers"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispensers" ADD CONSTRAINT "dispensers_circuit_fk" FOREIGN KEY ("org_id","project_id","circuit_id") REFERENCES "public"."circuits"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispensers" ADD CONSTRAINT "dispensers_node_fk" FOREIGN KEY ("org_id","project_id","node_id") REFERENCES "public"."cable_nodes"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "points" ADD CONSTRAINT "points_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "points" ADD CONSTRAINT "points_grease_fk" FOREIGN KEY ("org_id","grease_id") REFERENCES "public"."greases"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "change_items" ADD CONSTRAINT "change_items_set_fk" FOREIGN KEY ("org_id","project_id","change_set_id") REFERENCES "public"."change_sets"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "change_sets" ADD CONSTRAINT "change_sets_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "projects" ADD CONSTRAINT "projects_org_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cable_nodes" ADD CONSTRAINT "cable_nodes_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cable_nodes" ADD CONSTRAINT "cable_nodes_circuit_fk" FOREIGN KEY ("org_id","project_id","circuit_id") REFERENCES "public"."circuits"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cable_nodes" ADD CONSTRAINT "cable_nodes_parent_fk" FOREIGN KEY ("org_id","project_id","parent_id") REFERENCES "public"."cable_nodes"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuits" ADD CONSTRAINT "circuits_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuits" ADD CONSTRAINT "circuits_supply_fk" FOREIGN KEY ("org_id","project_id","supply_id") REFERENCES "public"."supplies"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplies" ADD CONSTRAINT "supplies_project_fk" FOREIGN KEY ("org_id","project_id") REFERENCES "public"."projects"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplies" ADD CONSTRAINT "supplies_cabinet_fk" FOREIGN KEY ("org_id","project_id","cabinet_id") REFERENCES "public"."cabinets"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplies" ADD CONSTRAINT "supplies_type_fk" FOREIGN KEY ("org_id","type_id") REFERENCES "public"."supply_types"("org_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "people_email_uq" ON "people" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "sessions_refresh_ix" ON "sessions" USING btree ("refresh_hash");--> statement-breakpoint
CREATE INDEX "sessions_previous_ix" ON "sessions" USING btree ("previous_hash");--> statement-breakpoint
CREATE INDEX "cabinets_project_ix" ON "cabinets" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "controllers_project_ix" ON "controllers" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "module_groups_project_ix" ON "module_groups" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "modules_project_ix" ON "modules" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "imports_project_ix" ON "imports" USING btree ("project_id","created_at");--> statement-breakpoint
CREATE INDEX "assignments_project_ix" ON "assignments" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "dispensers_project_ix" ON "dispensers" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "points_project_ix" ON "points" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "change_items_set_ix" ON "change_items" USING btree ("change_set_id");--> statement-breakpoint
CREATE INDEX "change_items_row_ix" ON "change_items" USING btree ("project_id","row_id");--> statement-breakpoint
CREATE INDEX "cable_nodes_project_ix" ON "cable_nodes" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "circuits_project_ix" ON "circuits" USING btree ("project_id","id");--> statement-breakpoint
CREATE INDEX "supplies_project_ix" ON "supplies" USING btree ("project_id","id");