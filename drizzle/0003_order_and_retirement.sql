ALTER TABLE "base_loads" ADD COLUMN "position" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "base_loads" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "lines" ADD COLUMN "retired_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "shared_limits" ADD COLUMN "position" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "vent_groups" ADD COLUMN "position" integer DEFAULT 0 NOT NULL;