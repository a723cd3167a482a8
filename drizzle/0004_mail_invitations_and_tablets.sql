CREATE TABLE "badges" (
	"person_id" text NOT NULL,
	"plant_id" text NOT NULL,
	"number" text NOT NULL,
	"pin_hash" text NOT NULL,
	"changed_at" timestamp with time zone NOT NULL,
	CONSTRAINT "badges_person_id_plant_id_pk" PRIMARY KEY("person_id","plant_id"),
	CONSTRAINT "badges_number" UNIQUE("plant_id","number")
);
--> statement-breakpoint
CREATE TABLE "first_run_codes" (
	"code_hash" text PRIMARY KEY NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "invitations" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"email" text NOT NULL,
	"roles" jsonb NOT NULL,
	"line_ids" jsonb,
	"token_hash" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"mail_id" text,
	"invited_by" text NOT NULL,
	"accepted_at" timestamp with time zone,
	"accepted_by" text,
	"withdrawn_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invitations_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "password_resets" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"person_id" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "tablets" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text NOT NULL,
	"name" text NOT NULL,
	"line_id" text,
	"token_hash" text NOT NULL,
	"enrolled_by" text NOT NULL,
	"last_seen_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "tablets_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "mails" (
	"id" text PRIMARY KEY NOT NULL,
	"plant_id" text,
	"to_address" text NOT NULL,
	"subject" text NOT NULL,
	"body_text" text,
	"body_html" text,
	"message_id" text NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"tries" integer DEFAULT 0 NOT NULL,
	"next_try_at" timestamp with time zone DEFAULT now() NOT NULL,
	"lease_ends_at" timestamp with time zone,
	"give_up_at" timestamp with time zone NOT NULL,
	"last_error" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp with time zone,
	CONSTRAINT "mails_message_id_unique" UNIQUE("message_id")
);
--> statement-breakpoint
ALTER TABLE "memberships" ADD COLUMN "line_ids" jsonb;--> statement-breakpoint
ALTER TABLE "memberships" ADD COLUMN "inactive_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "sessions" ADD COLUMN "tablet_id" text;--> statement-breakpoint
ALTER TABLE "sessions" ADD COLUMN "touched_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "sessions" ADD COLUMN "ends_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "badges" ADD CONSTRAINT "badges_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "badges" ADD CONSTRAINT "badges_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_mail_id_mails_id_fk" FOREIGN KEY ("mail_id") REFERENCES "public"."mails"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "password_resets" ADD CONSTRAINT "password_resets_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tablets" ADD CONSTRAINT "tablets_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tablets" ADD CONSTRAINT "tablets_line_id_lines_id_fk" FOREIGN KEY ("line_id") REFERENCES "public"."lines"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mails" ADD CONSTRAINT "mails_plant_id_plants_id_fk" FOREIGN KEY ("plant_id") REFERENCES "public"."plants"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "invitations_plant" ON "invitations" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "password_resets_person" ON "password_resets" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "tablets_plant" ON "tablets" USING btree ("plant_id");--> statement-breakpoint
CREATE INDEX "mails_due" ON "mails" USING btree ("state","next_try_at");--> statement-breakpoint
CREATE INDEX "mails_plant" ON "mails" USING btree ("plant_id");--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_tablet_id_tablets_id_fk" FOREIGN KEY ("tablet_id") REFERENCES "public"."tablets"("id") ON DELETE cascade ON UPDATE no action;