ALTER TABLE "donor_photo" DROP CONSTRAINT "donor_photo_shop_id_photo_id_photo_shop_id_id_fk";
--> statement-breakpoint
ALTER TABLE "part_photo" DROP CONSTRAINT "part_photo_shop_id_photo_id_photo_shop_id_id_fk";
--> statement-breakpoint
ALTER TABLE "donor_photo" ADD CONSTRAINT "donor_photo_shop_id_photo_id_photo_shop_id_id_fk" FOREIGN KEY ("shop_id","photo_id") REFERENCES "public"."photo"("shop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "part_photo" ADD CONSTRAINT "part_photo_shop_id_photo_id_photo_shop_id_id_fk" FOREIGN KEY ("shop_id","photo_id") REFERENCES "public"."photo"("shop_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
-- A shop takes the first slug that is free as it is written; nobody asks before.
DROP FUNCTION "slug_taken"(text);
