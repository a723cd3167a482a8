CREATE TABLE "practice_rules" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"kind" text NOT NULL,
	"vent_group_id" text,
	"values" jsonb NOT NULL,
	"source" text NOT NULL,
	"entered_by" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"released_by" text,
	"released_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "accumulators" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"charged_from_header_id" text NOT NULL,
	"feeds_header_id" text NOT NULL,
	"water_tonnes" double precision NOT NULL,
	"high_bar_g" double precision NOT NULL,
	"low_bar_g" double precision NOT NULL,
	"greatest_charge_kg_per_h" double precision NOT NULL,
	"greatest_discharge_kg_per_h" double precision NOT NULL,
	"share_at_week_start" double precision DEFAULT 0 NOT NULL,
	"position" integer NOT NULL,
	"retired_at" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "cleaning_rules" ADD COLUMN "duty_id" text;--> statement-breakpoint
ALTER TABLE "duties" ADD COLUMN "revision" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "duties" ADD COLUMN "changed_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "duties" ADD COLUMN "changed_by" text;--> statement-breakpoint
ALTER TABLE "duties" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "families" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "products" ADD COLUMN "specific_heat" jsonb;--> statement-breakpoint
ALTER TABLE "products" ADD COLUMN "initial_c" double precision;--> statement-breakpoint
ALTER TABLE "products" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "route_modes" ADD COLUMN "lead_min" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "route_modes" ADD COLUMN "after_min" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "boilers" ADD COLUMN "efficiency" double precision DEFAULT 0.8 NOT NULL;--> statement-breakpoint
ALTER TABLE "boilers" ADD COLUMN "fuel" text DEFAULT 'naturalGasUs' NOT NULL;--> statement-breakpoint
ALTER TABLE "boilers" ADD COLUMN "purge_minutes" integer DEFAULT 5 NOT NULL;--> statement-breakpoint
ALTER TABLE "boilers" ADD COLUMN "warm_ready_minutes" integer DEFAULT 30 NOT NULL;--> statement-breakpoint
ALTER TABLE "boilers" ADD COLUMN "cold_ready_minutes" integer DEFAULT 120 NOT NULL;--> statement-breakpoint
ALTER TABLE "boilers" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "headers" ADD COLUMN "flash" jsonb;--> statement-breakpoint
ALTER TABLE "headers" ADD COLUMN "warm_up_minutes" integer DEFAULT 20 NOT NULL;--> statement-breakpoint
ALTER TABLE "headers" ADD COLUMN "warm_up_kg" double precision DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "headers" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "plants" ADD COLUMN "fuel_price_per_kwh" double precision;--> statement-breakpoint
ALTER TABLE "plants" ADD COLUMN "currency" text DEFAULT 'EUR' NOT NULL;--> statement-breakpoint
ALTER TABLE "shared_limits" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "units" ADD COLUMN "start_spread" jsonb;--> statement-breakpoint
ALTER TABLE "units" ADD COLUMN "start_spread_source" text;--> statement-breakpoint
ALTER TABLE "units" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "vent_groups" ADD COLUMN "study_greatest_load_kg_per_h" double precision;--> statement-breakpoint
ALTER TABLE "vent_groups" ADD COLUMN "least_header_bar_g" double precision;--> statement-breakpoint
ALTER TABLE "vent_groups" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "practice_rules" ADD CONSTRAINT "practice_rules_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "practice_rules" ADD CONSTRAINT "practice_rules_vent_group_id_vent_groups_id_fk" FOREIGN KEY ("vent_group_id") REFERENCES "public"."vent_groups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accumulators" ADD CONSTRAINT "accumulators_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accumulators" ADD CONSTRAINT "accumulators_charged_from_header_id_headers_id_fk" FOREIGN KEY ("charged_from_header_id") REFERENCES "public"."headers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "accumulators" ADD CONSTRAINT "accumulators_feeds_header_id_headers_id_fk" FOREIGN KEY ("feeds_header_id") REFERENCES "public"."headers"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "practice_rules_plant" ON "practice_rules" USING btree ("plant_id","kind");--> statement-breakpoint
CREATE INDEX "accumulators_plant" ON "accumulators" USING btree ("plant_id");--> statement-breakpoint
ALTER TABLE "cleaning_rules" ADD CONSTRAINT "cleaning_rules_duty_id_duties_id_fk" FOREIGN KEY ("duty_id") REFERENCES "public"."duties"("id") ON DELETE no action ON UPDATE no action;