CREATE TABLE "import_headings" (
	"org_id" uuid NOT NULL,
	"heading" text NOT NULL,
	"field" text,
	"used_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "import_headings_org_id_heading_pk" PRIMARY KEY("org_id","heading")
);
--> statement-breakpoint
ALTER TABLE "import_headings" ENABLE ROW LEVEL SECURITY;
--> statement-breakpoint
CREATE TABLE "import_texts" (
	"org_id" uuid NOT NULL,
	"field" text NOT NULL,
	"text" text NOT NULL,
	"value" text,
	"used_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "import_texts_org_id_field_text_pk" PRIMARY KEY("org_id","field","text")
);
--> statement-breakpoint
ALTER TABLE "import_texts" ENABLE ROW LEVEL SECURITY;
--> statement-breakpoint
CREATE TABLE "import_work" (
	"import_id" uuid PRIMARY KEY NOT NULL,
	"org_id" uuid NOT NULL,
	"project_id" uuid NOT NULL,
	"stage" text NOT NULL,
	"done" integer DEFAULT 0 NOT NULL,
	"total" integer,
	"cancelled" boolean DEFAULT false NOT NULL,
	"started_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "import_work" ENABLE ROW LEVEL SECURITY;
--> statement-breakpoint
ALTER TABLE "change_sets" ADD COLUMN "undoes" uuid;
--> statement-breakpoint
ALTER TABLE "import_headings" ADD CONSTRAINT "import_headings_org_id_organisations_id_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;
--> statement-breakpoint
ALTER TABLE "import_texts" ADD CONSTRAINT "import_texts_org_id_organisations_id_fk" FOREIGN KEY ("org_id") REFERENCES "public"."organisations"("id") ON DELETE no action ON UPDATE no action;
--> statement-breakpoint
ALTER TABLE "imports" ADD CONSTRAINT "imports_key" UNIQUE("org_id","project_id","id");
--> statement-breakpoint
ALTER TABLE "import_work" ADD CONSTRAINT "import_work_import_fk" FOREIGN KEY ("org_id","project_id","import_id") REFERENCES "public"."imports"("org_id","project_id","id") ON DELETE cascade ON UPDATE no action;
--> statement-breakpoint
ALTER TABLE "change_sets" ADD CONSTRAINT "change_sets_undoes_fk" FOREIGN KEY ("org_id","project_id","undoes") REFERENCES "public"."change_sets"("org_id","project_id","id") ON DELETE no action ON UPDATE no action;
--> statement-breakpoint
CREATE INDEX "change_sets_undoes_ix" ON "change_sets" USING btree ("undoes");
--> statement-breakpoint
-- Confined to the organisation, as every table of a customer's data.
DO $$
DECLARE t text;
BEGIN
  FOREACH t IN ARRAY ARRAY['import_headings', 'import_texts', 'import_work'] LOOP
    EXECUTE format('ALTER TABLE %I FORCE ROW LEVEL SECURITY', t);
    EXECUTE format('CREATE POLICY own_organisation ON %I USING (org_id = current_org()) WITH CHECK (org_id = current_org())', t);
  END LOOP;
END $$;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON import_headings, import_texts, import_work TO lanewright_app;
