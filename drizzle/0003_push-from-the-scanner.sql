CREATE TABLE "discarded_values" (
	"values_digest" text PRIMARY KEY NOT NULL,
	"discarded_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "scanner_push" (
	"scanner_id" uuid PRIMARY KEY NOT NULL,
	"ae_title" text,
	"addresses" text[] DEFAULT '{}' NOT NULL,
	"received_count" integer DEFAULT 0 NOT NULL,
	"last_received_at" timestamp with time zone,
	"refused_count" integer DEFAULT 0 NOT NULL,
	"last_refused_at" timestamp with time zone,
	"last_refusal" text,
	CONSTRAINT "scanner_ae_title" UNIQUE("ae_title")
);
--> statement-breakpoint
CREATE TABLE "scanner_tokens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"scanner_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"drawn_by_id" uuid NOT NULL,
	"drawn_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_used_at" timestamp with time zone,
	"revoked_at" timestamp with time zone,
	CONSTRAINT "scanner_token_hash" UNIQUE("token_hash")
);
--> statement-breakpoint
ALTER TABLE "scanner_push" ADD CONSTRAINT "scanner_push_scanner_id_scanners_id_fk" FOREIGN KEY ("scanner_id") REFERENCES "public"."scanners"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "scanner_tokens" ADD CONSTRAINT "scanner_tokens_scanner_id_scanners_id_fk" FOREIGN KEY ("scanner_id") REFERENCES "public"."scanners"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "scanner_tokens" ADD CONSTRAINT "scanner_tokens_drawn_by_id_members_id_fk" FOREIGN KEY ("drawn_by_id") REFERENCES "public"."members"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "tokens_of_scanner" ON "scanner_tokens" USING btree ("scanner_id");