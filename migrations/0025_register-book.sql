ALTER TABLE "release" ADD COLUMN "engine" text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE "release" ADD COLUMN "serial" text DEFAULT '' NOT NULL;