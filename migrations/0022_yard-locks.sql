-- The locks of the yard's tables, as of every table of a shop.
do $$
declare t text;
begin
	foreach t in array array['carcass', 'scrap_run', 'scrap_load', 'scrap_run_donor', 'waste'] loop
		execute format('alter table %I enable row level security', t);
		execute format('alter table %I force row level security', t);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())', t
		);
	end loop;
end $$;
--> statement-breakpoint
grant select, insert, update on carcass, scrap_run to endplay_app;
--> statement-breakpoint
grant select, insert on scrap_load, scrap_run_donor, waste to endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
--> statement-breakpoint
-- The register's numbers run on from the oldest entry.
update release r set number = n.number
from (select shop_id, id, row_number() over (partition by shop_id order by id) as number from release) n
where n.shop_id = r.shop_id and n.id = r.id;
--> statement-breakpoint
update shop s set last_release_number = n.number
from (select shop_id, max(number) as number from release group by shop_id) n where n.shop_id = s.id;
