CREATE TABLE "label_settings" (
	"shop_id" bigint PRIMARY KEY NOT NULL,
	"stocks" jsonb NOT NULL,
	"says_owner" boolean NOT NULL,
	"version" integer NOT NULL,
	"changed_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "stranger_scan" (
	"came" text PRIMARY KEY NOT NULL,
	"scans" integer NOT NULL,
	"until" timestamp with time zone NOT NULL
);
--> statement-breakpoint
ALTER TABLE "tag" DROP CONSTRAINT "tag_what";--> statement-breakpoint
ALTER TABLE "label_settings" ADD CONSTRAINT "label_settings_shop_id_shop_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "stranger_scan_until" ON "stranger_scan" USING btree ("until");--> statement-breakpoint
CREATE INDEX "tag_blank" ON "tag" USING btree ("shop_id","minted_at","code") WHERE what = 'blank';--> statement-breakpoint
ALTER TABLE "tag" ADD CONSTRAINT "tag_what" CHECK ("tag"."what" in ('box', 'part', 'bin', 'blank'));