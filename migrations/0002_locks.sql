-- The locks between shops. The app's role owns nothing; every table of a shop is policed, for its owner too;
-- the shop is set per transaction.

create function current_shop() returns bigint stable parallel safe language sql as
$$ select nullif(current_setting('endplay.shop', true), '')::bigint $$;
--> statement-breakpoint
revoke all on schema public from public;
--> statement-breakpoint
grant usage on schema public to endplay_app, endplay_search;
--> statement-breakpoint
do $$
declare t record;
begin
	for t in
		select c.table_name as name from information_schema.columns c
		where c.table_schema = 'public' and c.column_name = 'shop_id'
	loop
		execute format('alter table %I enable row level security', t.name);
		execute format('alter table %I force row level security', t.name);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())',
			t.name
		);
		execute format('grant select, insert, update, delete on %I to endplay_app', t.name);
	end loop;
end $$;
--> statement-breakpoint
alter table shop enable row level security;
--> statement-breakpoint
alter table shop force row level security;
--> statement-breakpoint
create policy own_shop on shop to endplay_app using (id = current_shop()) with check (id = current_shop());
--> statement-breakpoint
grant select, insert, update on shop to endplay_app;
--> statement-breakpoint
grant select, insert, update, delete on person, account, session, verification_token, password_hash, sign_in_try to endplay_app;
--> statement-breakpoint
-- What happened is only ever added to.
revoke update, delete on event, release, proof, tag from endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
--> statement-breakpoint

-- What must be read before a shop is known: one function each, owned by the role that passes the policies.
create function shops_of(of_person text)
returns table (shop_id bigint, slug text, name text, member_id bigint, role text, disabled boolean)
stable security definer set search_path = public, pg_temp language sql as $$
	select s.id, s.slug, s.name, m.id, m.role, m.disabled_at is not null
	from member m join shop s on s.id = m.shop_id
	where m.person_id = of_person
	order by s.name, s.id
$$;
--> statement-breakpoint
create function key_holder(of_hash text)
returns table (shop_id bigint, slug text, member_id bigint, role text)
stable security definer set search_path = public, pg_temp language sql as $$
	select s.id, s.slug, m.id, m.role
	from api_key k
	join member m on m.shop_id = k.shop_id and m.id = k.member_id and m.disabled_at is null
	join shop s on s.id = k.shop_id
	where k.token_hash = of_hash and k.revoked_at is null
$$;
--> statement-breakpoint
create function invite_of(of_hash text)
returns table (shop_id bigint, invite_id bigint, shop_name text, slug text, email text, role text, expires_at timestamptz, open boolean)
stable security definer set search_path = public, pg_temp language sql as $$
	select s.id, i.id, s.name, s.slug, i.email, i.role, i.expires_at, i.accepted_at is null and i.withdrawn_at is null
	from invite i join shop s on s.id = i.shop_id
	where i.token_hash = of_hash
$$;
--> statement-breakpoint
create function slug_taken(wanted text) returns boolean
stable security definer set search_path = public, pg_temp language sql as $$
	select exists (select from shop where slug = wanted)
$$;
--> statement-breakpoint
create function all_shop_ids() returns setof bigint
stable security definer set search_path = public, pg_temp language sql as $$
	select id from shop order by id
$$;
--> statement-breakpoint
revoke all on function shops_of(text), key_holder(text), invite_of(text), slug_taken(text), all_shop_ids() from public;
--> statement-breakpoint
grant execute on function current_shop(), shops_of(text), key_holder(text), invite_of(text), slug_taken(text), all_shop_ids() to endplay_app;
--> statement-breakpoint

-- Trigram operators are not leakproof, so a policed query would not use their index: the word search runs
-- as a role with a policy of its own and takes the shop from the session, never from the caller.
create policy search_all on part to endplay_search using (true);
--> statement-breakpoint
grant select on part to endplay_search;
--> statement-breakpoint
grant execute on function current_shop() to endplay_search;
--> statement-breakpoint
create function find_words(sought text[]) returns table (part_id bigint, likeness real)
stable security definer set search_path = public, pg_temp set pg_trgm.word_similarity_threshold = 0.5 language sql as $$
	select p.id, (select avg(word_similarity(w, p.search_text))::real from unnest(sought) w)
	from part p
	where p.shop_id = current_shop()
		and sought[1] <% p.search_text
		and (select bool_and(w <% p.search_text) from unnest(sought) w)
$$;
--> statement-breakpoint
grant create on schema public to endplay_search, endplay_worker;
--> statement-breakpoint
alter function find_words(text[]) owner to endplay_search;
--> statement-breakpoint
revoke all on function find_words(text[]) from public;
--> statement-breakpoint
grant execute on function find_words(text[]) to endplay_app;
--> statement-breakpoint

-- A job is added inside the business transaction; the queue's own tables stay closed to the app.
create function enqueue(task text, payload json, job_key text default null) returns void
security definer set search_path = graphile_worker, pg_temp language sql as $$
	select graphile_worker.add_job(task, payload, job_key => job_key, max_attempts => 10)
$$;
--> statement-breakpoint
alter function enqueue(text, json, text) owner to endplay_worker;
--> statement-breakpoint
revoke all on function enqueue(text, json, text) from public;
--> statement-breakpoint
grant execute on function enqueue(text, json, text) to endplay_app;
--> statement-breakpoint
revoke create on schema public from endplay_search, endplay_worker;
