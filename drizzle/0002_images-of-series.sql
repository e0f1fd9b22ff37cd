CREATE TYPE "public"."arrival" AS ENUM('upload', 'scanner', 'web-push', 'made-here');--> statement-breakpoint
CREATE TYPE "public"."image_use" AS ENUM('measured', 'look-only');--> statement-breakpoint
CREATE TYPE "public"."kspace_origin" AS ENUM('derived', 'raw');--> statement-breakpoint
ALTER TABLE "images" ALTER COLUMN "uploader_id" DROP NOT NULL;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "arrival" "arrival" DEFAULT 'upload' NOT NULL;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "scanner_id" uuid;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "use" "image_use" DEFAULT 'measured' NOT NULL;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "kspace" "kspace_origin" DEFAULT 'derived' NOT NULL;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "frame_facts" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "study_key" text;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "series_key" text;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "frame_of_reference_key" text;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "image_key" text;--> statement-breakpoint
ALTER TABLE "images" ADD COLUMN "file_key" text;--> statement-breakpoint
ALTER TABLE "images" ADD CONSTRAINT "images_scanner_id_scanners_id_fk" FOREIGN KEY ("scanner_id") REFERENCES "public"."scanners"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "images_of_series" ON "images" USING btree ("department_id","series_key");--> statement-breakpoint
CREATE INDEX "images_of_file" ON "images" USING btree ("department_id","file_key");--> statement-breakpoint
CREATE INDEX "images_of_scanner" ON "images" USING btree ("scanner_id");