-- The locks of what was read off plates, as of every table of a shop; a reading is asked for, then filled in.
alter table label_reading enable row level security;
--> statement-breakpoint
alter table label_reading force row level security;
--> statement-breakpoint
create policy own_shop on label_reading to endplay_app
	using (shop_id = current_shop()) with check (shop_id = current_shop());
--> statement-breakpoint
grant select, insert, update on label_reading to endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
