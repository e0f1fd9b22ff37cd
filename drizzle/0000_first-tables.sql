CREATE TYPE "public"."case_state" AS ENUM('reported', 'under-investigation', 'awaiting-sign-off', 'closed');--> statement-breakpoint
CREATE TYPE "public"."component" AS ENUM('magnitude', 'phase', 'real', 'imaginary', 'complex');--> statement-breakpoint
CREATE TYPE "public"."confidence" AS ENUM('consistent', 'reproduced', 'removed', 'reproduced-and-removed', 'excluded-others', 'not-found');--> statement-breakpoint
CREATE TYPE "public"."direction" AS ENUM('phase-encode', 'frequency-encode', 'both', 'none', 'unknown');--> statement-breakpoint
CREATE TYPE "public"."domain" AS ENUM('image', 'kspace');--> statement-breakpoint
CREATE TYPE "public"."event_kind" AS ENUM('filed', 'changed', 'image-added', 'fact-set', 'trial-kept', 'mark-added', 'mark-removed', 'commented', 'finding-written', 'assigned', 'state-changed', 'signed');--> statement-breakpoint
CREATE TYPE "public"."frequency" AS ENUM('once', 'on-and-off', 'every-scan', 'unknown');--> statement-breakpoint
CREATE TYPE "public"."image_cost" AS ENUM('usable', 'repeated', 'abandoned', 'unknown');--> statement-breakpoint
CREATE TYPE "public"."image_role" AS ENUM('bad', 'comparison', 'phantom', 'other-slice', 'noise-only', 'coil-element', 'verification');--> statement-breakpoint
CREATE TYPE "public"."mark_kind" AS ENUM('arrow', 'ellipse', 'rectangle', 'polyline', 'text', 'ruler', 'profile');--> statement-breakpoint
CREATE TYPE "public"."phase_encode" AS ENUM('row', 'column');--> statement-breakpoint
CREATE TYPE "public"."role" AS ENUM('technologist', 'lead-technologist', 'physicist', 'administrator');--> statement-breakpoint
CREATE TYPE "public"."sighting" AS ENUM('ghosts', 'fold-in', 'lines', 'shading', 'distortion', 'blur', 'noise', 'signal-loss', 'other');--> statement-breakpoint
CREATE TABLE "comments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"case_id" uuid NOT NULL,
	"text" text NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "findings" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"case_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"cause" text,
	"confidence" "confidence" NOT NULL,
	"text" text NOT NULL,
	"lesson" text NOT NULL,
	"author_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "marks" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"case_id" uuid NOT NULL,
	"image_id" uuid NOT NULL,
	"frame" integer NOT NULL,
	"domain" "domain" NOT NULL,
	"kind" "mark_kind" NOT NULL,
	"points" jsonb NOT NULL,
	"text" text NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "signatures" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"case_id" uuid NOT NULL,
	"member_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"attested" jsonb NOT NULL,
	"digest" text NOT NULL,
	"statement" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "trials" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"case_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"note" text NOT NULL,
	"image_id" uuid NOT NULL,
	"frame" integer NOT NULL,
	"compare_image_id" uuid,
	"compare_frame" integer,
	"phase_encode" "phase_encode" NOT NULL,
	"recipe" jsonb NOT NULL,
	"metrics" jsonb NOT NULL,
	"digest" text NOT NULL,
	"image_thumbnail" text NOT NULL,
	"kspace_thumbnail" text NOT NULL,
	"author_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "case_images" (
	"case_id" uuid NOT NULL,
	"image_id" uuid NOT NULL,
	"role" "image_role" NOT NULL,
	"added_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "case_images_case_id_image_id_pk" PRIMARY KEY("case_id","image_id")
);
--> statement-breakpoint
CREATE TABLE "cases" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"department_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"state" "case_state" DEFAULT 'reported' NOT NULL,
	"title" text NOT NULL,
	"scanner_id" uuid,
	"coil_id" uuid,
	"seen" "sighting"[] DEFAULT '{}'::sighting[] NOT NULL,
	"direction" "direction" DEFAULT 'unknown' NOT NULL,
	"how_often" "frequency" DEFAULT 'unknown' NOT NULL,
	"cost" "image_cost" DEFAULT 'unknown' NOT NULL,
	"body_region" text DEFAULT '' NOT NULL,
	"protocol" text DEFAULT '' NOT NULL,
	"description" text DEFAULT '' NOT NULL,
	"tried" text DEFAULT '' NOT NULL,
	"seen_on" date,
	"reporter_id" uuid NOT NULL,
	"assignee_id" uuid,
	"opened_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "images" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"department_id" uuid NOT NULL,
	"uploader_id" uuid NOT NULL,
	"rows" integer NOT NULL,
	"columns" integer NOT NULL,
	"frames" integer NOT NULL,
	"component" "component" NOT NULL,
	"spacing_mm" jsonb,
	"range_low" double precision NOT NULL,
	"range_high" double precision NOT NULL,
	"values_digest" text NOT NULL,
	"header_facts" jsonb NOT NULL,
	"member_facts" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"warnings" jsonb NOT NULL,
	"removed_tags" text[] NOT NULL,
	"replaced_tags" text[] NOT NULL,
	"uploaded_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "departments" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"last_case_number" integer DEFAULT 0 NOT NULL
);
--> statement-breakpoint
CREATE TABLE "members" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"department_id" uuid NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"role" "role" NOT NULL,
	"password_hash" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"member_id" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sign_in_attempts" (
	"key" varchar(255) PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
CREATE TABLE "coils" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"scanner_id" uuid NOT NULL,
	"name" text NOT NULL,
	"serial" text NOT NULL,
	"elements" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "scanners" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"department_id" uuid NOT NULL,
	"name" text NOT NULL,
	"manufacturer" text NOT NULL,
	"model" text NOT NULL,
	"field_strength_tesla" double precision NOT NULL,
	"serial" text NOT NULL,
	"software_version" text NOT NULL,
	"room" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "timeline_events" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sequence" bigserial NOT NULL,
	"case_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"actor_id" uuid NOT NULL,
	"kind" "event_kind" NOT NULL,
	"from_state" "case_state",
	"to_state" "case_state",
	"text" text NOT NULL
);
--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "comments" ADD CONSTRAINT "comments_author_id_members_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "findings" ADD CONSTRAINT "findings_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "findings" ADD CONSTRAINT "findings_author_id_members_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_image_id_images_id_fk" FOREIGN KEY ("image_id") REFERENCES "public"."images"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "marks" ADD CONSTRAINT "marks_author_id_members_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "signatures" ADD CONSTRAINT "signatures_member_id_members_id_fk" FOREIGN KEY ("member_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trials" ADD CONSTRAINT "trials_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trials" ADD CONSTRAINT "trials_image_id_images_id_fk" FOREIGN KEY ("image_id") REFERENCES "public"."images"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trials" ADD CONSTRAINT "trials_compare_image_id_images_id_fk" FOREIGN KEY ("compare_image_id") REFERENCES "public"."images"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "trials" ADD CONSTRAINT "trials_author_id_members_id_fk" FOREIGN KEY ("author_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "case_images" ADD CONSTRAINT "case_images_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "case_images" ADD CONSTRAINT "case_images_image_id_images_id_fk" FOREIGN KEY ("image_id") REFERENCES "public"."images"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_department_id_departments_id_fk" FOREIGN KEY ("department_id") REFERENCES "public"."departments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_scanner_id_scanners_id_fk" FOREIGN KEY ("scanner_id") REFERENCES "public"."scanners"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_coil_id_coils_id_fk" FOREIGN KEY ("coil_id") REFERENCES "public"."coils"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_reporter_id_members_id_fk" FOREIGN KEY ("reporter_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cases" ADD CONSTRAINT "cases_assignee_id_members_id_fk" FOREIGN KEY ("assignee_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "images" ADD CONSTRAINT "images_department_id_departments_id_fk" FOREIGN KEY ("department_id") REFERENCES "public"."departments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "images" ADD CONSTRAINT "images_uploader_id_members_id_fk" FOREIGN KEY ("uploader_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_department_id_departments_id_fk" FOREIGN KEY ("department_id") REFERENCES "public"."departments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_member_id_members_id_fk" FOREIGN KEY ("member_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coils" ADD CONSTRAINT "coils_scanner_id_scanners_id_fk" FOREIGN KEY ("scanner_id") REFERENCES "public"."scanners"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "scanners" ADD CONSTRAINT "scanners_department_id_departments_id_fk" FOREIGN KEY ("department_id") REFERENCES "public"."departments"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "timeline_events" ADD CONSTRAINT "timeline_events_case_id_cases_id_fk" FOREIGN KEY ("case_id") REFERENCES "public"."cases"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "timeline_events" ADD CONSTRAINT "timeline_events_actor_id_members_id_fk" FOREIGN KEY ("actor_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "comments_of_case" ON "comments" USING btree ("case_id");--> statement-breakpoint
CREATE UNIQUE INDEX "finding_version_in_case" ON "findings" USING btree ("case_id","version");--> statement-breakpoint
CREATE INDEX "marks_of_case" ON "marks" USING btree ("case_id");--> statement-breakpoint
CREATE INDEX "signatures_of_case" ON "signatures" USING btree ("case_id");--> statement-breakpoint
CREATE UNIQUE INDEX "trial_number_in_case" ON "trials" USING btree ("case_id","number");--> statement-breakpoint
CREATE UNIQUE INDEX "case_number_in_department" ON "cases" USING btree ("department_id","number");--> statement-breakpoint
CREATE INDEX "cases_by_state" ON "cases" USING btree ("department_id","state");--> statement-breakpoint
CREATE INDEX "images_of_department" ON "images" USING btree ("department_id");--> statement-breakpoint
CREATE UNIQUE INDEX "members_email_in_any_case" ON "members" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "members_of_department" ON "members" USING btree ("department_id");--> statement-breakpoint
CREATE INDEX "sessions_of_member" ON "sessions" USING btree ("member_id");--> statement-breakpoint
CREATE INDEX "coils_of_scanner" ON "coils" USING btree ("scanner_id");--> statement-breakpoint
CREATE INDEX "scanners_of_department" ON "scanners" USING btree ("department_id");--> statement-breakpoint
CREATE INDEX "timeline_of_case" ON "timeline_events" USING btree ("case_id","sequence");