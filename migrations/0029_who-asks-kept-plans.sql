-- Who asks is read with every request: in a language that keeps its plan.
create or replace function key_holder(of_hash text)
returns table (shop_id bigint, slug text, member_id bigint, role text)
stable security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan language plpgsql as $$
begin return query
	select s.id, s.slug, m.id, m.role
	from api_key k
	join member m on m.shop_id = k.shop_id and m.id = k.member_id and m.disabled_at is null
	join shop s on s.id = k.shop_id
	where k.token_hash = of_hash and k.revoked_at is null;
end $$;
--> statement-breakpoint
create or replace function shops_of(of_person text)
returns table (shop_id bigint, slug text, name text, member_id bigint, role text, disabled boolean)
stable security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan language plpgsql as $$
begin return query
	select s.id, s.slug, s.name, m.id, m.role, m.disabled_at is not null
	from member m join shop s on s.id = m.shop_id
	where m.person_id = of_person
	order by s.name, s.id;
end $$;
