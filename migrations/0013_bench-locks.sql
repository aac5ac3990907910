-- The locks of what the tailgate showed and what was left on, as of every table of a shop.
do $$
declare t text;
begin
	foreach t in array array['triage', 'left_on'] loop
		execute format('alter table %I enable row level security', t);
		execute format('alter table %I force row level security', t);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())', t
		);
	end loop;
end $$;
--> statement-breakpoint
grant select, insert, update on triage to endplay_app;
--> statement-breakpoint
grant select, insert, delete on left_on to endplay_app;
--> statement-breakpoint

-- Tells the benches that watch a donor that something about it changed; says only which shop and donor.
create function tell_bench() returns trigger language plpgsql as $$
begin
	perform pg_notify('endplay_bench',
		coalesce(new.shop_id, old.shop_id) || ':' || coalesce(new.donor_id, old.donor_id));
	return null;
end $$;
--> statement-breakpoint
create trigger part_tells_bench after insert or update of state on part
	for each row when (new.donor_id is not null) execute function tell_bench();
--> statement-breakpoint
create trigger left_on_tells_bench after insert or delete on left_on
	for each row execute function tell_bench();
--> statement-breakpoint
create trigger triage_tells_bench after insert or update on triage
	for each row execute function tell_bench();
