-- The locks of pins and rulers, as of every table of a shop.
do $$
declare t text;
begin
	foreach t in array array['pin', 'ruler'] loop
		execute format('alter table %I enable row level security', t);
		execute format('alter table %I force row level security', t);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())', t
		);
	end loop;
end $$;
--> statement-breakpoint
grant select, insert, update on pin to endplay_app;
--> statement-breakpoint
grant select, insert, update, delete on ruler to endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
