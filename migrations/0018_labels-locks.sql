alter table label_settings enable row level security;
--> statement-breakpoint
alter table label_settings force row level security;
--> statement-breakpoint
create policy own_shop on label_settings to endplay_app
	using (shop_id = current_shop()) with check (shop_id = current_shop());
--> statement-breakpoint
grant select, insert, update on label_settings to endplay_app;
--> statement-breakpoint
grant select, insert, update, delete on stranger_scan to endplay_app;
--> statement-breakpoint

-- A blank tag is given to one thing, once. Nothing else about a tag ever changes.
grant update (what) on tag to endplay_app;
--> statement-breakpoint
create function tag_claimed() returns trigger language plpgsql as $$
begin
	if old.what <> 'blank' or new.what = 'blank' or (new.shop_id, new.code, new.minted_at) is distinct from (old.shop_id, old.code, old.minted_at) then
		raise exception 'tag % is given out already', old.code using errcode = '42501';
	end if;
	return new;
end $$;
--> statement-breakpoint
create trigger tag_claimed before update on tag for each row execute function tag_claimed();
--> statement-breakpoint

-- Whose a scanned tag is, before any shop is known: said only where the shop wants it and the tag is its own.
create function tag_owner(of_slug text, of_code text) returns text
stable security definer set search_path = public, pg_temp language sql as $$
	select s.name
	from shop s
	join label_settings l on l.shop_id = s.id and l.says_owner
	join tag t on t.shop_id = s.id and t.code = of_code
	where s.slug = of_slug
$$;
--> statement-breakpoint
revoke all on function tag_owner(text, text) from public;
--> statement-breakpoint
grant execute on function tag_owner(text, text) to endplay_app;
