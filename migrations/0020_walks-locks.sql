do $$
declare t text;
begin
	foreach t in array array['walk', 'walk_stop'] loop
		execute format('alter table %I enable row level security', t);
		execute format('alter table %I force row level security', t);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())', t
		);
		execute format('grant select, insert, update on %I to endplay_app', t);
	end loop;
end $$;
--> statement-breakpoint
grant delete on walk_stop to endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
