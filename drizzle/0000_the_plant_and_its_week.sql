CREATE TABLE "memberships" (
	"person_id" text NOT NULL,
	"plant_id" text NOT NULL,
	"role" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_person_id_plant_id_role_pk" PRIMARY KEY("person_id","plant_id","role")
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" text PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text,
	"active" boolean DEFAULT true NOT NULL,
	"settings" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"last_seen_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "people_email_unique" UNIQUE("email")
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"count" integer NOT NULL,
	"window_ends_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"user_id" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"plant_id" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "floor_events" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"issue_id" text NOT NULL,
	"activity_id" text NOT NULL,
	"event" text NOT NULL,
	"happened_at" timestamp with time zone NOT NULL,
	"author_id" text NOT NULL,
	"taken_back_by_id" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "cleaning_rules" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"unit_kind" text NOT NULL,
	"from_family_id" text NOT NULL,
	"to_family_id" text NOT NULL,
	"minutes" integer NOT NULL,
	"kind" text NOT NULL,
	"phases" jsonb NOT NULL,
	"uses" jsonb NOT NULL,
	CONSTRAINT "cleaning_rules_pair" UNIQUE("plant_id","unit_kind","from_family_id","to_family_id")
);
--> statement-breakpoint
CREATE TABLE "duties" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"model" text NOT NULL,
	"inputs" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "families" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "process_data" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"product_id" text NOT NULL,
	"document" text NOT NULL,
	"issue" text NOT NULL,
	"values" jsonb NOT NULL,
	"entered_by" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"released_by" text,
	"released_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "products" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"family_id" text NOT NULL,
	"composition" jsonb NOT NULL,
	"container_kg" double precision NOT NULL,
	"fill_kg" double precision NOT NULL,
	"case_pieces" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "route_modes" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"product_id" text NOT NULL,
	"position" integer NOT NULL,
	"stage" text NOT NULL,
	"unit_id" text NOT NULL,
	"minutes" integer NOT NULL,
	"duty_id" text,
	"uses" jsonb NOT NULL,
	CONSTRAINT "route_modes_stage_unit" UNIQUE("product_id","position","unit_id")
);
--> statement-breakpoint
CREATE TABLE "orders" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"number" text NOT NULL,
	"product_id" text NOT NULL,
	"quantity_kg" double precision NOT NULL,
	"earliest_at" timestamp with time zone,
	"latest_start_at" timestamp with time zone,
	"due_at" timestamp with time zone NOT NULL,
	"priority" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "activities" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"kind" text NOT NULL,
	"stage" text,
	"batch_id" text,
	"order_id" text,
	"code" text NOT NULL,
	"title" text NOT NULL,
	"product_id" text,
	"family_id" text,
	"modes" jsonb NOT NULL,
	"unit_id" text,
	"start_at" timestamp with time zone,
	"clean_after_min" integer DEFAULT 0 NOT NULL,
	"fixing" text DEFAULT 'free' NOT NULL,
	"occupies_until_link_id" text,
	"earliest_at" timestamp with time zone NOT NULL,
	"latest_start_at" timestamp with time zone,
	"due_at" timestamp with time zone,
	"weight" double precision DEFAULT 1 NOT NULL,
	"process_data_id" text,
	"revision" integer DEFAULT 0 NOT NULL,
	"moved_by" text,
	"moved_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "agreements" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"revision" integer NOT NULL,
	"comment" text NOT NULL,
	"author_id" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "edits" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"revision" integer NOT NULL,
	"kind" text NOT NULL,
	"changes" jsonb NOT NULL,
	"author_id" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "edits_revision" UNIQUE("plan_id","revision")
);
--> statement-breakpoint
CREATE TABLE "issues" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"number" integer NOT NULL,
	"revision" integer NOT NULL,
	"week" jsonb NOT NULL,
	"comment" text NOT NULL,
	"agreement_id" text,
	"author_id" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "issues_number" UNIQUE("plan_id","number")
);
--> statement-breakpoint
CREATE TABLE "levelling_runs" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"revision" integer NOT NULL,
	"state" text NOT NULL,
	"options" jsonb NOT NULL,
	"progress" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"proposal" jsonb,
	"failure" text,
	"cancel_asked" boolean DEFAULT false NOT NULL,
	"heartbeat_at" timestamp with time zone,
	"author_id" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "links" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"plan_id" text NOT NULL,
	"from_end" jsonb NOT NULL,
	"to_end" jsonb NOT NULL,
	"least_min" integer NOT NULL,
	"greatest_min" integer,
	"rule" text NOT NULL,
	"greatest_breach" text NOT NULL,
	"source" text
);
--> statement-breakpoint
CREATE TABLE "plans" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"week_start" date NOT NULL,
	"revision" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "plans_week" UNIQUE("plant_id","week_start")
);
--> statement-breakpoint
CREATE TABLE "base_loads" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"header_id" text NOT NULL,
	"from_hour" integer NOT NULL,
	"to_hour" integer NOT NULL,
	"kg_per_h" double precision NOT NULL,
	"note" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "boiler_firings" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"boiler_id" text NOT NULL,
	"from_at" timestamp with time zone NOT NULL,
	"to_at" timestamp with time zone NOT NULL,
	"share" double precision NOT NULL,
	"reason" text NOT NULL,
	"author_id" text NOT NULL,
	"sequence" integer GENERATED ALWAYS AS IDENTITY (sequence name "boiler_firings_sequence_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 2147483647 START WITH 1 CACHE 1),
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "boilers" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"header_id" text NOT NULL,
	"rating_from_and_at_kg_per_h" double precision NOT NULL,
	"pressure_bar_g" double precision NOT NULL,
	"feed_tank_bar_g" double precision NOT NULL,
	"blowdown_fraction" double precision NOT NULL,
	"condensate_return_fraction" double precision NOT NULL,
	"condensate_c" double precision NOT NULL,
	"make_up_c" double precision NOT NULL,
	"turndown" double precision NOT NULL,
	"greatest_rise_fraction_per_min" double precision NOT NULL,
	"water_tonnes" double precision NOT NULL,
	"position" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "calendar_exceptions" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"unit_id" text,
	"from_at" timestamp with time zone NOT NULL,
	"to_at" timestamp with time zone NOT NULL,
	"open" boolean NOT NULL,
	"reason" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "headers" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"pressure_bar_g" double precision NOT NULL,
	"dryness" double precision,
	"superheat_k" double precision,
	"feed" jsonb NOT NULL,
	"position" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "lines" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"position" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "plants" (
	"id" text PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"is_demo" boolean DEFAULT false NOT NULL,
	"time_zone" text NOT NULL,
	"week_starts_on" integer DEFAULT 1 NOT NULL,
	"altitude_m" double precision DEFAULT 0 NOT NULL,
	"display_units" text DEFAULT 'si' NOT NULL,
	"snap_minutes" integer DEFAULT 5 NOT NULL,
	"reserve_fraction" double precision DEFAULT 0 NOT NULL,
	"sag_tolerance_bar" double precision DEFAULT 0.5 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "shared_limits" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"unit" text NOT NULL,
	"capacity" jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "shifts" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"days" jsonb NOT NULL,
	"starts_at" text NOT NULL,
	"ends_at" text NOT NULL,
	"line_ids" jsonb,
	"position" integer NOT NULL,
	CONSTRAINT "shifts_name" UNIQUE("plant_id","name")
);
--> statement-breakpoint
CREATE TABLE "steam_limits" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"header_id" text NOT NULL,
	"from_at" timestamp with time zone NOT NULL,
	"to_at" timestamp with time zone NOT NULL,
	"limit_kg_per_h" double precision,
	"reason" text NOT NULL,
	"author_id" text NOT NULL,
	"sequence" integer GENERATED ALWAYS AS IDENTITY (sequence name "steam_limits_sequence_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 2147483647 START WITH 1 CACHE 1),
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "units" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"line_id" text NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"header_id" text,
	"vent_group_id" text,
	"position" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "vent_groups" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"vents_at_once" integer NOT NULL,
	"steam_ons_at_once" integer NOT NULL,
	"steam_on_minutes" integer DEFAULT 1 NOT NULL,
	"margin_minutes" integer DEFAULT 0 NOT NULL,
	"source" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "record" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"author_id" text NOT NULL,
	"action" text NOT NULL,
	"subject" text NOT NULL,
	"details" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_people_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "floor_events" ADD CONSTRAINT "floor_events_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "floor_events" ADD CONSTRAINT "floor_events_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "floor_events" ADD CONSTRAINT "floor_events_issue_id_issues_id_fk" FOREIGN KEY ("issue_id") REFERENCES "public"."issues"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "floor_events" ADD CONSTRAINT "floor_events_activity_id_activities_id_fk" FOREIGN KEY ("activity_id") REFERENCES "public"."activities"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cleaning_rules" ADD CONSTRAINT "cleaning_rules_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cleaning_rules" ADD CONSTRAINT "cleaning_rules_from_family_id_families_id_fk" FOREIGN KEY ("from_family_id") REFERENCES "public"."families"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cleaning_rules" ADD CONSTRAINT "cleaning_rules_to_family_id_families_id_fk" FOREIGN KEY ("to_family_id") REFERENCES "public"."families"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "duties" ADD CONSTRAINT "duties_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "families" ADD CONSTRAINT "families_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "process_data" ADD CONSTRAINT "process_data_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "process_data" ADD CONSTRAINT "process_data_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "products" ADD CONSTRAINT "products_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "products" ADD CONSTRAINT "products_family_id_families_id_fk" FOREIGN KEY ("family_id") REFERENCES "public"."families"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "route_modes" ADD CONSTRAINT "route_modes_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "route_modes" ADD CONSTRAINT "route_modes_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "route_modes" ADD CONSTRAINT "route_modes_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "route_modes" ADD CONSTRAINT "route_modes_duty_id_duties_id_fk" FOREIGN KEY ("duty_id") REFERENCES "public"."duties"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "orders" ADD CONSTRAINT "orders_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_order_id_orders_id_fk" FOREIGN KEY ("order_id") REFERENCES "public"."orders"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_family_id_families_id_fk" FOREIGN KEY ("family_id") REFERENCES "public"."families"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "activities" ADD CONSTRAINT "activities_process_data_id_process_data_id_fk" FOREIGN KEY ("process_data_id") REFERENCES "public"."process_data"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreements" ADD CONSTRAINT "agreements_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "agreements" ADD CONSTRAINT "agreements_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edits" ADD CONSTRAINT "edits_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "edits" ADD CONSTRAINT "edits_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "issues" ADD CONSTRAINT "issues_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "issues" ADD CONSTRAINT "issues_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "issues" ADD CONSTRAINT "issues_agreement_id_agreements_id_fk" FOREIGN KEY ("agreement_id") REFERENCES "public"."agreements"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "levelling_runs" ADD CONSTRAINT "levelling_runs_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "levelling_runs" ADD CONSTRAINT "levelling_runs_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "links" ADD CONSTRAINT "links_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "links" ADD CONSTRAINT "links_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plans" ADD CONSTRAINT "plans_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "base_loads" ADD CONSTRAINT "base_loads_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "base_loads" ADD CONSTRAINT "base_loads_header_id_headers_id_fk" FOREIGN KEY ("header_id") REFERENCES "public"."headers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boiler_firings" ADD CONSTRAINT "boiler_firings_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boiler_firings" ADD CONSTRAINT "boiler_firings_boiler_id_boilers_id_fk" FOREIGN KEY ("boiler_id") REFERENCES "public"."boilers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boilers" ADD CONSTRAINT "boilers_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boilers" ADD CONSTRAINT "boilers_header_id_headers_id_fk" FOREIGN KEY ("header_id") REFERENCES "public"."headers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calendar_exceptions" ADD CONSTRAINT "calendar_exceptions_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "calendar_exceptions" ADD CONSTRAINT "calendar_exceptions_unit_id_units_id_fk" FOREIGN KEY ("unit_id") REFERENCES "public"."units"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "headers" ADD CONSTRAINT "headers_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lines" ADD CONSTRAINT "lines_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "shared_limits" ADD CONSTRAINT "shared_limits_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "shifts" ADD CONSTRAINT "shifts_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "steam_limits" ADD CONSTRAINT "steam_limits_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "steam_limits" ADD CONSTRAINT "steam_limits_header_id_headers_id_fk" FOREIGN KEY ("header_id") REFERENCES "public"."headers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "units" ADD CONSTRAINT "units_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "units" ADD CONSTRAINT "units_line_id_lines_id_fk" FOREIGN KEY ("line_id") REFERENCES "public"."lines"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "units" ADD CONSTRAINT "units_header_id_headers_id_fk" FOREIGN KEY ("header_id") REFERENCES "public"."headers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "units" ADD CONSTRAINT "units_vent_group_id_vent_groups_id_fk" FOREIGN KEY ("vent_group_id") REFERENCES "public"."vent_groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "vent_groups" ADD CONSTRAINT "vent_groups_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "record" ADD CONSTRAINT "record_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "memberships_plant" ON "memberships" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "sessions_user" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "floor_events_activity" ON "floor_events" USING btree ("activity_id");--> statement-breakpoint
CREATE INDEX "floor_events_plan" ON "floor_events" USING btree ("plan_id");--> statement-breakpoint
CREATE INDEX "duties_plant" ON "duties" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "families_plant" ON "families" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "process_data_product" ON "process_data" USING btree ("plant_id","product_id");--> statement-breakpoint
CREATE INDEX "products_plant" ON "products" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "orders_due" ON "orders" USING btree ("plant_id","due_at");--> statement-breakpoint
CREATE INDEX "activities_plan" ON "activities" USING btree ("plan_id");--> statement-breakpoint
CREATE INDEX "activities_unit" ON "activities" USING btree ("unit_id","start_at");--> statement-breakpoint
CREATE INDEX "agreements_plan" ON "agreements" USING btree ("plan_id","revision");--> statement-breakpoint
CREATE INDEX "levelling_runs_plan" ON "levelling_runs" USING btree ("plan_id");--> statement-breakpoint
CREATE INDEX "links_plan" ON "links" USING btree ("plan_id");--> statement-breakpoint
CREATE INDEX "base_loads_plant" ON "base_loads" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "boiler_firings_span" ON "boiler_firings" USING btree ("plant_id","from_at","to_at");--> statement-breakpoint
CREATE INDEX "boilers_plant" ON "boilers" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "calendar_exceptions_span" ON "calendar_exceptions" USING btree ("plant_id","from_at","to_at");--> statement-breakpoint
CREATE INDEX "headers_plant" ON "headers" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "lines_plant" ON "lines" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "shared_limits_plant" ON "shared_limits" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "steam_limits_span" ON "steam_limits" USING btree ("plant_id","from_at","to_at");--> statement-breakpoint
CREATE INDEX "units_plant" ON "units" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "vent_groups_plant" ON "vent_groups" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "record_plant_time" ON "record" USING btree ("plant_id","created_at");