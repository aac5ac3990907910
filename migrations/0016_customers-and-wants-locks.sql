do $$
declare t text;
begin
	foreach t in array array['customer', 'letter', 'letter_setting', 'letter_template', 'want', 'want_match'] loop
		execute format('alter table %I enable row level security', t);
		execute format('alter table %I force row level security', t);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())', t
		);
		execute format('grant select, insert, update on %I to endplay_app', t);
	end loop;
end $$;
--> statement-breakpoint
grant delete on letter_template to endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
--> statement-breakpoint
-- Whose letter carried this link: read before a shop is known.
create function letter_of(of_hash text)
returns table (shop_id bigint, shop_name text, letter_id bigint, customer_id bigint, member_id bigint, off boolean)
stable security definer set search_path = public, pg_temp language sql as $$
	select s.id, s.name, l.id, l.customer_id, l.member_id, c.letters_off_at is not null
	from letter l
	join shop s on s.id = l.shop_id
	join customer c on c.shop_id = l.shop_id and c.id = l.customer_id
	where l.token_hash = of_hash
$$;
--> statement-breakpoint
revoke all on function letter_of(text) from public;
--> statement-breakpoint
grant execute on function letter_of(text) to endplay_app;
