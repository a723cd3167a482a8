ALTER TABLE "route_modes" ADD COLUMN "size_kg" double precision;--> statement-breakpoint
ALTER TABLE "route_modes" ADD COLUMN "pieces" integer;--> statement-breakpoint
ALTER TABLE "route_modes" ADD COLUMN "pieces_per_min" double precision;--> statement-breakpoint
ALTER TABLE "route_modes" ADD COLUMN "yield" double precision;--> statement-breakpoint
ALTER TABLE "orders" ADD COLUMN "quantity_unit" text DEFAULT 'cases' NOT NULL;--> statement-breakpoint
ALTER TABLE "orders" ADD COLUMN "revision" integer DEFAULT 0 NOT NULL;