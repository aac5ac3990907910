update found_number n set kind = p.kind, engine_key = p.engine_key from part p where p.shop_id = n.shop_id and p.id = n.part_id;
--> statement-breakpoint
-- What was written before: roughly, until each is edited again.
create function rough_words(said text) returns text immutable language sql as $$
	select coalesce(string_agg(distinct case when w ~ '[0-9]' then translate(upper(w), 'OI', '01') else w end, ' '), '')
	from regexp_split_to_table(lower(said), '[^[:alnum:]]+') w where w <> ''
$$;
--> statement-breakpoint
update donor set search_words = trim(rough_words(concat_ws(' ', maker, model, type_code, serial))
	|| coalesce(' ' || round(displacement_cc)::text || 'cc', ''));
--> statement-breakpoint
update part set search_words = rough_words(concat_ws(' ', label, array_to_string(numbers, ' '), note, engine, hardware_set));
--> statement-breakpoint
insert into found_number (shop_id, key, part_id, kind, engine_key)
select p.shop_id, k, p.id, p.kind, p.engine_key from part p, unnest(p.number_keys) k on conflict do nothing;
--> statement-breakpoint
drop function rough_words(text);
