DROP INDEX "found_by_engine";--> statement-breakpoint
ALTER TABLE "found_number" ADD COLUMN "kind" text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE "found_number" ADD COLUMN "engine_key" text DEFAULT '' NOT NULL;--> statement-breakpoint
CREATE INDEX "found_by_queue" ON "found_by" USING btree ("shop_id","engine_key","kind","stands","grade_no","aged","part_id","bin_id");--> statement-breakpoint
CREATE INDEX "found_number_like" ON "found_number" USING btree ("shop_id","key","kind","engine_key","part_id");