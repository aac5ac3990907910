CREATE TABLE "triage" (
	"shop_id" bigint NOT NULL,
	"donor_id" bigint NOT NULL,
	"answers" jsonb NOT NULL,
	"in_place" jsonb NOT NULL,
	"member_id" bigint NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "triage_shop_id_donor_id_pk" PRIMARY KEY("shop_id","donor_id")
);
--> statement-breakpoint
CREATE TABLE "left_on" (
	"shop_id" bigint NOT NULL,
	"donor_id" bigint NOT NULL,
	"kind" text NOT NULL,
	"member_id" bigint NOT NULL,
	"at" timestamp with time zone NOT NULL,
	CONSTRAINT "left_on_shop_id_donor_id_kind_pk" PRIMARY KEY("shop_id","donor_id","kind")
);
--> statement-breakpoint
ALTER TABLE "proof" ADD COLUMN "figures" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "triage" ADD CONSTRAINT "triage_shop_id_shop_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "triage" ADD CONSTRAINT "triage_shop_id_donor_id_donor_shop_id_id_fk" FOREIGN KEY ("shop_id","donor_id") REFERENCES "public"."donor"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "triage" ADD CONSTRAINT "triage_shop_id_member_id_member_shop_id_id_fk" FOREIGN KEY ("shop_id","member_id") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "left_on" ADD CONSTRAINT "left_on_shop_id_shop_id_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "left_on" ADD CONSTRAINT "left_on_shop_id_donor_id_donor_shop_id_id_fk" FOREIGN KEY ("shop_id","donor_id") REFERENCES "public"."donor"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "left_on" ADD CONSTRAINT "left_on_shop_id_member_id_member_shop_id_id_fk" FOREIGN KEY ("shop_id","member_id") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;