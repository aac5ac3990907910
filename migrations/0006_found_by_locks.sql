-- What parts are found by. Filled in the transaction of each change, whoever makes it; the app only reads it.
do $$
declare t text;
begin
	foreach t in array array['found_by', 'found_number', 'shop_word', 'asked', 'fit', 'supersession'] loop
		execute format('alter table %I enable row level security', t);
		execute format('alter table %I force row level security', t);
		execute format(
			'create policy own_shop on %I to endplay_app using (shop_id = current_shop()) with check (shop_id = current_shop())', t
		);
	end loop;
	foreach t in array array['found_by', 'found_number', 'fit', 'supersession', 'donor', 'bin', 'box', 'proof', 'policy', 'shop', 'price', 'part_photo', 'photo', 'event', 'tag'] loop
		execute format('create policy search_all on %I to endplay_search using (true)', t);
		execute format('grant select on %I to endplay_search', t);
	end loop;
end $$;
--> statement-breakpoint
grant select on found_by, found_number, shop_word to endplay_app;
--> statement-breakpoint
grant select, insert on asked to endplay_app;
--> statement-breakpoint
grant select, insert, delete on fit, supersession to endplay_app;
--> statement-breakpoint
grant usage on all sequences in schema public to endplay_app;
--> statement-breakpoint

-- The words of a part with its shop in front of each, so that the lists of the index are those of one shop.
create function shop_words(shop_id bigint, words text) returns tsvector
immutable strict parallel safe language plpgsql as $$
begin
	return array_to_tsvector(string_to_array(
		shop_id || ':' || replace(words, ' ', ' ' || shop_id || ':'), ' '));
end $$;
--> statement-breakpoint
create function key_grams(shop_id bigint, key text) returns text[]
immutable strict parallel safe language plpgsql as $$
declare
	n int := greatest(length(key) - 3, 1);
	r text[] := array_fill(null::text, array[n]);
begin
	for i in 1..n loop r[i] := shop_id || ':' || substr(key, i, 4); end loop;
	return r;
end $$;
--> statement-breakpoint
create index found_by_words on found_by using gin (shop_words(shop_id, words)) with (fastupdate = off);
--> statement-breakpoint
create index found_number_grams on found_number using gin (key_grams(shop_id, key)) with (fastupdate = off);
--> statement-breakpoint
create index found_by_kind on found_by (shop_id, kind, stands, grade_no, aged, part_id)
	include (proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, same_no);
--> statement-breakpoint
alter table found_by set (fillfactor = 85);
--> statement-breakpoint

-- What the trade knows of each kind, as the app ships it: what each cause leaves, High, Medium, Low or X ruined.
create table kind_level (kind text primary key, letters text not null, never boolean not null);
--> statement-breakpoint
insert into kind_level (kind, letters, never) values
	('carb-float', 'HHMMHMLHMXLMMHHMM', false),
	('carb-diaph', 'HHMMHMLHMXLLLHHHM', false),
	('carb-bowl', 'HHMMHMLHMXLMMHHHM', false),
	('fuel-tank', 'HHHHHMMHMXMMHHHHM', false),
	('fuel-cap', 'HHHHHMMHMXMMHHHHM', false),
	('fuel-valve', 'HHHHHMLHMXMMHHHHM', false),
	('fuel-pump', 'HMMMHLLHMXLMMMHHL', false),
	('fuel-hose', '', true),
	('primer', '', true),
	('fuel-sol', 'HHHHHMLHMXLHMHMHM', false),
	('intake', 'HHMMHMHHMLHMMHHHM', false),
	('airbox', 'HHLHHHHHLXMHMHHHM', false),
	('airfilter', '', true),
	('breather', 'HMHLHMHHHXLHHHHHM', false),
	('coil', 'HHHMHMHHMXLMHHMHM', false),
	('trigger', 'HHHMHHHHMXLLMHMHM', false),
	('points', '', true),
	('plug', '', true),
	('boot', 'HHHMHHHHMXLHMHHHM', false),
	('flywheel', 'MMHHLMHHMXMXHHHHM', false),
	('key', '', true),
	('recoil', 'MHMHMMHHLXLHMHHHM', false),
	('cup', 'HHHHMHHHHLHMHHHHM', false),
	('starter12', 'MMHHMMHHMXLHMHMMM', false),
	('starter120', 'HHHMHHHHMXLLMHMHM', false),
	('drive', 'MMHHLMHHMXLHMHHMM', false),
	('solenoid', 'HHHMHHHHMXLHMHMHM', false),
	('ringgear', 'HMHHMMHHMXMLHHHHM', false),
	('stator', 'HHHMHMHHMXLMMHMHM', false),
	('regulator', 'HHHMHHHHMXLLMHMHM', false),
	('keyswitch', 'HHHMHHHHMXLHMHMHM', false),
	('lowoil', 'LLHMHMHHMXLHMHMHM', false),
	('harness', 'HHHMHMHHMXLHMHMHM', false),
	('interlock', '', true),
	('muffler', 'HHHMHMHHMLLMHHHHM', false),
	('guard', 'HHHMHMHHMLLMHHHHM', false),
	('exgasket', '', true),
	('shroud', 'HHHHMHHHLXMMHHHHM', false),
	('tins', 'HHHHHHHHMMHHMHHHM', false),
	('screen', 'HHHHHHHHLXMXHHHHM', false),
	('dipstick', 'HMHMHHHHMXMHMHHHM', false),
	('oilpump', 'XLLMHMHHMXLMMHHHM', false),
	('oilfilter', '', true),
	('sump', 'LLMMLMHHLXMLMHHMM', false),
	('seal', '', true),
	('govgear', 'LLMLHMHHMXMXMHHMM', false),
	('govarm', 'HHHHHMHHHLMLHHHHM', false),
	('govspring', 'HHHMHMHHMXMXMHHHM', false),
	('ctrl', 'HHHHHMHHMLMLMHHHM', false),
	('cable', 'HHHHHMHHHXMHHMHHL', false),
	('brake', 'HHHHMMHHMXLMMHHHM', false),
	('head', 'MMMLHMHLMXLLMHHMM', false),
	('valves', 'MLMLHLMXHXLLMMHLL', false),
	('vspring', 'MLMLHLMXHXLXMMHLL', false),
	('rocker', 'MMHMHMMLHXMLMHHMM', false),
	('vcover', 'HHHHHMHHMLMHMHHHM', false),
	('cam', 'LLLMHLHMMXLMMMHLL', false),
	('tappet', 'LLLMHLHMMXLMMMHLL', false),
	('piston', 'XXXLMLHMMXLLXMHLL', false),
	('rings', '', true),
	('cyl', 'LXLLMLHMXXLLLMHLL', false),
	('hgasket', '', true),
	('headbolt', 'HHHLHHHMHXLHHHHHM', false),
	('crank', 'MLLMXMHHMXLLMHHLM', false),
	('rod', 'XXLLMLHHMXLXLMHLL', true),
	('bearing', '', true),
	('block', 'LXLLLLHMXXLLLMHLL', false),
	('balance', 'LLLMHLHMMXLMMMHHL', false),
	('reduction', 'HMHHMHHHMLMMMHHHM', false),
	('pulley', 'HHHHMMHHMLMMHHHHM', false),
	('adapter', 'HHHHXHHHHXHHHHHHM', false),
	('cclutch', 'HHHHMMHHHXMHHMHHL', false),
	('eclutch', 'HHHMMHHHMXLMMHMHM', false),
	('hardware', 'MMHHMMHHMLMMHHHHM', false),
	('bracket', 'HHHHHMHHHXMHHMHHL', false),
	('isolator', '', true),
	('spindle', 'HHHHMMHHHXMHHMHHL', false),
	('mblade', '', true),
	('belt', '', true),
	('wheel', 'HHHHHMHHHXMHHMHHL', false),
	('sptrans', 'HHHHHMHHHXMHHMHHL', false),
	('hydro', 'HHHHHMHHHXMHHMHHL', false),
	('friction', 'HHHHHMHHHXMHHMHHL', false),
	('auger', 'HHHHHMHHHXMHHMHHL', false),
	('chute', 'HHHHHMHHHXMHHMHHL', false),
	('tines', 'HHHHHMHHHXMHHMHHL', false),
	('genhead', 'HMHMHMHHMXLLMHMHM', false),
	('avr', 'HHHMHHHHMXLLMHMHM', false),
	('panel', 'HHHMHHHHMXLLMHMHM', false),
	('pwpump', 'HHHHHMHHHXMHHMHHL', false),
	('pwgun', '', true),
	('sawclutch', 'HHHHHMHHHXMHHHHHM', false),
	('sawcase', 'MMMMMMHMLXMMHHHHM', false),
	('chainbrake', 'MMMMMMMMMXLMMMHHL', false),
	('gearhead', 'HHHHHMHHHXMHHMHHL', false),
	('battery', '', true),
	('idler', 'HHHHHMHHHXMHHMHHL', false),
	('guidebar', 'HHHHHMHHHXMHHMHHL', false),
	('recoil-kit', 'HHMHMMMHLXLHMHHHM', false),
	('choke', 'HHMMHMMHMXLMMHHHM', false),
	('airvane', 'HHHHHHHHMXHLHHHHM', false),
	('heaterbox', 'HHHHMHHHLXMMHHHHM', false),
	('oilcooler', 'XLLMHMHHMXLMMHHHM', false),
	('throttlebody', 'HHHMHHHHMXLLMHMHM', false),
	('ptoswitch', 'HHHMHHHHMXLLMHMHM', false),
	('hourmeter', 'HHHMHHHHMXLLMHMHM', false),
	('seat', 'HHHHHMHHHXMHHMHHL', false),
	('hood', 'HHHHHMHHHXMHHMHHL', false),
	('steering', 'HHHHHMHHHXMHHMHHL', false),
	('frontspindle', 'HHHHHMHHHXMHHMHHL', false),
	('bail', 'HHHHHMHHHXMHHMHHL', false),
	('heightadj', 'HHHHHMHHHXMHHMHHL', false),
	('chutecrank', 'HHHHHMHHHXMHHMHHL', false),
	('pumpvolute', 'HHHHHMHHHXMHHMHHL', false),
	('brushholder', 'HHHMHHHHMXLLMHHHM', false),
	('avspring', 'HHHHHHHHMXHHHHHHM', false),
	('fuelgauge', 'HHHHHMMHMXMMHHHHM', false),
	('shortblock', 'XXLLLLHMXXLLXMHLL', false),
	('unloader', 'HHHHHMHHHXMHHMHHL', false),
	('brakecable', '', true),
	('sawtank', 'HHHHHHMHLXHHHHHHM', false),
	('sawcover', 'HHHHHHHHLXHHHHHHM', false);
--> statement-breakpoint
grant select on kind_level to endplay_app, endplay_search;
--> statement-breakpoint

-- The grade that a part is priced at: its own; where it waits for its test, the one that it will have. 0: never sold.
create function asks_no(of_kind text, cause text, second text, grade_no int, tested boolean) returns int
stable parallel safe language sql as $$
	select case
		when k.never or l.letter = 'X' then 0
		when grade_no = 4 and not tested then position(l.letter in 'HML')
		else grade_no end
	from kind_level k,
		lateral (select max(position(substr(k.letters, array_position(array['no-oil','thrown-rod','dirt','overheated','strike','water','stale-fuel','valve','broken-block','fire','flood','overspeed','lean','retired','electrical','worn','unknown'], c), 1) in 'HMLX')) as worst
			from unnest(array[coalesce(cause, 'unknown'), coalesce(second, cause, 'unknown')]) c) w,
		lateral (select substr('HMLX', w.worst, 1) as letter) l
	where k.kind = of_kind
$$;
--> statement-breakpoint

-- How a part was proved: the strongest passed since it last failed, and whether its bench test is done.
create function proof_of(of_shop bigint, of_part bigint, out proof_no int, out tested boolean)
stable parallel safe language sql as $$
	select
		case when f.at is not null and not exists (
			select from proof p where p.shop_id = of_shop and p.part_id = of_part and p.passed and p.id > f.at and p.how like 'bench test%')
		then 0 else coalesce((
			select max(array_position(array['look-over','seen running','worked in place','bench test cold','bench test hot'], p.how))
			from proof p where p.shop_id = of_shop and p.part_id = of_part and p.passed and p.id > coalesce(f.at, 0)), 0) end,
		coalesce((select p.passed from proof p where p.shop_id = of_shop and p.part_id = of_part
			and (not p.passed or p.how like 'bench test%') order by p.id desc limit 1), false)
	from (select max(p.id) as at from proof p where p.shop_id = of_shop and p.part_id = of_part and not p.passed) f
$$;
--> statement-breakpoint

create function follow_parts(of_shop bigint, ids bigint[]) returns void language plpgsql as $$
begin
	insert into found_by as f (shop_id, part_id, kind, stands, grade_no, proof_no, bin_id, box_id, donor_id,
		engine_key, new_cents, copy_cents, asks_no, aged, same_no, words)
	select p.shop_id, p.id, p.kind,
		array_position(array['shelved','pulled','held','back','missing','out','scrapped'], p.state) - 1,
		g.no, t.proof_no, p.bin_id, p.box_id, p.donor_id, p.engine_key, c.new_cents, c.copy_cents,
		coalesce(asks_no(p.kind, d.cause, d.second_cause, g.no, t.tested), 0),
		greatest(0, extract(epoch from p.pulled_at) - 946684800)::int,
		case when p.engine_key = '' and p.number_keys = '{}' then -p.id
			else hashtextextended(concat_ws(' ', p.kind, p.engine_key, g.no, p.state, p.number_keys::text), 0) & 9223372036854775807 end,
		concat_ws(' ', '#' || p.kind, nullif(p.search_words, ''), nullif(d.search_words, ''), '~' || d.cause, '~' || d.second_cause,
			to_char(m.at, '"@"YYYY "@"YYYY-MM'))
	from part p
	join shop s on s.id = p.shop_id
	left join donor d on d.shop_id = p.shop_id and d.id = p.donor_id
	cross join lateral (select array_position(array['clean used','good used','usable','untested','core'], p.grade) as no) g
	cross join lateral proof_of(p.shop_id, p.id) t
	cross join lateral (select coalesce(d.taken_in_at, p.pulled_at) at time zone s.time_zone as at) m
	left join lateral (
		select x.new_cents, x.copy_cents from (
			select 1 - (r.kind = p.kind)::int as nearness, r.* from price r
			where r.shop_id = p.shop_id and r.number_key = any (p.number_keys) and r.number_key <> ''
			union all
			select 2 + (r.number_key <> '')::int, r.* from price r
			where r.shop_id = p.shop_id and r.kind = p.kind and r.engine_key = p.engine_key and p.engine_key <> ''
		) x order by x.nearness, x.seen_on desc, x.id desc limit 1
	) c on true
	where p.shop_id = of_shop and p.id = any (ids)
	on conflict (shop_id, part_id) do update set
		kind = excluded.kind, stands = excluded.stands, grade_no = excluded.grade_no, proof_no = excluded.proof_no,
		bin_id = excluded.bin_id, box_id = excluded.box_id, donor_id = excluded.donor_id, engine_key = excluded.engine_key,
		new_cents = excluded.new_cents, copy_cents = excluded.copy_cents, asks_no = excluded.asks_no,
		aged = excluded.aged, same_no = excluded.same_no, words = excluded.words
	where row(f.*) is distinct from row(excluded.*);
end $$;
--> statement-breakpoint

create function follow_words(of_shop bigint, ids bigint[]) returns void language sql as $$
	insert into shop_word (shop_id, word)
	select of_shop, w.word from (
		select distinct word from found_by f, unnest(string_to_array(f.words, ' ')) word
		where f.shop_id = of_shop and f.part_id = any (ids) and word ~ '^[[:lower:]]{3,24}$'
	) w
	where not exists (select from shop_word k where k.shop_id = of_shop and k.word = w.word)
	order by w.word on conflict do nothing
$$;
--> statement-breakpoint

create function part_changed() returns trigger security definer set search_path = public, pg_temp language plpgsql as $$
declare one record;
begin
	for one in select shop_id, array_agg(id) as ids from changed group by shop_id loop
		perform follow_parts(one.shop_id, one.ids);
		if tg_op = 'INSERT' then
			insert into found_number (shop_id, key, part_id, kind, engine_key)
			select p.shop_id, k, p.id, p.kind, p.engine_key from changed p, unnest(p.number_keys) k where p.shop_id = one.shop_id
			on conflict do nothing;
		else
			update found_number n set kind = p.kind, engine_key = p.engine_key from changed p
			where p.shop_id = one.shop_id and n.shop_id = p.shop_id and n.part_id = p.id and (n.kind, n.engine_key) <> (p.kind, p.engine_key);
		end if;
		perform follow_words(one.shop_id, one.ids);
	end loop;
	return null;
end $$;
--> statement-breakpoint
create function part_renumbered() returns trigger security definer set search_path = public, pg_temp language plpgsql as $$
begin
	if new.number_keys is distinct from old.number_keys then
		delete from found_number where shop_id = new.shop_id and part_id = new.id and not key = any (new.number_keys);
		insert into found_number (shop_id, key, part_id, kind, engine_key)
		select new.shop_id, k, new.id, new.kind, new.engine_key from unnest(new.number_keys) k on conflict do nothing;
	end if;
	return null;
end $$;
--> statement-breakpoint
create function donor_changed() returns trigger security definer set search_path = public, pg_temp language plpgsql as $$
begin
	if (new.search_words, new.cause, new.second_cause, new.taken_in_at) is distinct from (old.search_words, old.cause, old.second_cause, old.taken_in_at) then
		perform follow_parts(new.shop_id, x.ids), follow_words(new.shop_id, x.ids)
		from (select array_agg(id) as ids from part where shop_id = new.shop_id and donor_id = new.id) x where x.ids is not null;
	end if;
	if new.engine_key is distinct from old.engine_key then
		update part set engine_key = new.engine_key where shop_id = new.shop_id and donor_id = new.id;
		update fit f set from_key = new.engine_key from part p
		where p.shop_id = new.shop_id and p.donor_id = new.id and f.shop_id = p.shop_id and f.part_id = p.id;
	end if;
	return null;
end $$;
--> statement-breakpoint
create function price_changed() returns trigger security definer set search_path = public, pg_temp language plpgsql as $$
declare one record;
begin
	for one in
		select c.shop_id, array_agg(distinct f.part_id) as ids from changed c, lateral (
			select n.part_id from found_number n where n.shop_id = c.shop_id and n.key = c.number_key
			union all
			select b.part_id from found_by b where b.shop_id = c.shop_id and b.kind = c.kind and b.engine_key = c.engine_key and c.engine_key <> ''
		) f group by c.shop_id
	loop
		perform follow_parts(one.shop_id, one.ids);
	end loop;
	return null;
end $$;
--> statement-breakpoint
create function proof_added() returns trigger security definer set search_path = public, pg_temp language plpgsql as $$
declare one record;
begin
	for one in select shop_id, array_agg(distinct part_id) as ids from changed group by shop_id loop
		perform follow_parts(one.shop_id, one.ids);
	end loop;
	return null;
end $$;
--> statement-breakpoint
create trigger part_added after insert on part referencing new table as changed for each statement execute function part_changed();
--> statement-breakpoint
create trigger part_edited after update on part referencing new table as changed for each statement execute function part_changed();
--> statement-breakpoint
create trigger part_renumbered after update of number_keys on part for each row execute function part_renumbered();
--> statement-breakpoint
create trigger donor_edited after update on donor for each row execute function donor_changed();
--> statement-breakpoint
create trigger price_added after insert on price referencing new table as changed for each statement execute function price_changed();
--> statement-breakpoint
create trigger price_edited_new after update on price referencing new table as changed for each statement execute function price_changed();
--> statement-breakpoint
create trigger price_edited_old after update on price referencing old table as changed for each statement execute function price_changed();
--> statement-breakpoint
create trigger price_removed after delete on price referencing old table as changed for each statement execute function price_changed();
--> statement-breakpoint
create trigger proof_added after insert on proof referencing new table as changed for each statement execute function proof_added();
--> statement-breakpoint

drop function find_words(text[]);
--> statement-breakpoint

-- What the counter asks, as the calculator has it: share of the grade, held down by the copy, in the shop's steps.
-- policy: the shares of the five grades, cap of the copy, limit of the low step, low step, high step.
create function asked_cents(asks int, new_cents int, copy_cents int, policy float8[]) returns int
immutable parallel safe language plpgsql as $$
declare
	exact float8 := floor(policy[asks] * new_cents * 1e6 + 0.5) / 1e6;
	cap float8 := floor(policy[6] * copy_cents * 1e6 + 0.5) / 1e6;
	step float8;
begin
	if cap < exact then
		step := case when cap < policy[7] then policy[8] else policy[9] end;
		return floor(floor(cap / step * 1e6 + 0.5) / 1e6) * step;
	end if;
	step := case when exact < policy[7] then policy[8] else policy[9] end;
	return floor(floor(exact / step * 1e6 + 0.5) / 1e6 + 0.5) * step;
end $$;
--> statement-breakpoint

create type find_question as (
	number text, doubtful text, run text, tags text[], near_tags text[], address text, place text, donor int, box_tag text,
	kinds text[], engine text[], needs tsquery, needs_word tsquery, near tsquery, near_word tsquery, wide tsquery, weak tsquery, each text[],
	f_kind text, f_grade int, f_stands int, f_place text, f_bin_tag text, f_engine text, f_low int, f_high int, f_unpriced boolean,
	f_proof_low int, f_proof_high int, f_same bigint, policy float8[], most int, together boolean, sort text, down boolean,
	by_name jsonb, after_ord bigint, after_id bigint
);
--> statement-breakpoint

-- One look at the shelf. In: what was understood, as the app's planner writes it; the shop comes from the session.
-- Out: a page, the exact total, the counts of each filter over all answers, and how the answer came about.
-- Levels: to the letter; spelling forgiven; what was named, the words only for the order.
create function find_parts(q json) returns json
stable parallel safe security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan
set jit = off language plpgsql as $f$
#variable_conflict use_column
declare
	shop bigint := current_shop();
	ask find_question := json_populate_record(null::find_question, q);
	p_key text := ask.number;
	p_like text := ask.doubtful;
	p_run text := ask.run;
	p_tags text[] := ask.tags;
	p_near_tags text[] := ask.near_tags;
	p_address text := ask.address;
	p_kinds text[] := ask.kinds;
	p_engine text[] := ask.engine;
	p_each text[] := ask.each;
	p_weak tsquery := ask.weak;
	p_wide tsquery := ask.wide;
	p_strict tsquery := ask.needs;
	p_loose tsquery := ask.near;
	p_limit int := ask.most;
	p_together boolean := ask.together;
	p_sort text := ask.sort;
	p_sign int := case when ask.down then -1 else 1 end;
	f_kind text := ask.f_kind;
	f_grade int := ask.f_grade;
	f_stands int := ask.f_stands;
	f_place boolean := ask.f_place is not null;
	f_bins bigint[];
	f_boxes bigint[];
	f_engine text := ask.f_engine;
	f_low int := ask.f_low;
	f_high int := ask.f_high;
	f_unpriced boolean := ask.f_unpriced;
	f_price boolean := ask.f_low is not null or ask.f_high is not null or ask.f_unpriced is not null;
	f_proof_low int := coalesce(ask.f_proof_low, 0);
	f_proof_high int := coalesce(ask.f_proof_high, 5);
	f_same bigint := ask.f_same;
	after_ord bigint := ask.after_ord;
	after_id bigint := ask.after_id;
	v_bins bigint[];
	v_donor bigint;
	isword boolean := false;
	narrow boolean;
	onlykinds boolean;
	everything boolean;
	policy float8[] := ask.policy;
	v_red bigint[];
	v_ranks jsonb;
	v_fits jsonb;
	answer json;
begin
v_red := array(select id from bin where shop_id = shop and red);
if ask.place is not null then
	v_bins := array(select b.id from bin b where b.shop_id = shop and (upper(b.address) = ask.place or upper(b.address) like ask.place || '-%'));
	isword := cardinality(v_bins) = 0;
	if isword then
		v_bins := null;
		p_strict := ask.needs_word;
		p_loose := ask.near_word;
	end if;
end if;
if ask.donor is not null then
	v_donor := coalesce((select d.id from donor d where d.shop_id = shop and d.number = ask.donor),
		(select x.donor_id from box x where x.shop_id = shop and x.tag = ask.box_tag), 0);
end if;
if f_place then
	f_bins := array(select b.id from bin b where b.shop_id = shop and (upper(b.address) = ask.f_place or b.tag = ask.f_bin_tag));
	f_boxes := array(select x.id from box x join donor d on d.shop_id = x.shop_id and d.id = x.donor_id
		where x.shop_id = shop and 'BOX D' || d.number = ask.f_place);
end if;
if p_sort = 'engine' then
	v_ranks := (select jsonb_object_agg(engine_key, n) from (select engine_key, row_number() over (order by engine_key) as n from found_by where shop_id = shop group by 1) r);
elsif p_sort = 'bin' then
	v_ranks := (select jsonb_object_agg(id, n) from (select id, row_number() over (order by upper(address)) as n from bin where shop_id = shop) r);
elsif p_sort = 'kind' then
	v_ranks := ask.by_name;
end if;
if cardinality(p_engine) > 0 and cardinality(p_kinds) > 0 then
	v_fits := (select jsonb_object_agg(x.kind || ' ' || x.key, x.fits order by x.id) from (
		select id, kind, from_key as key, engine_key as wanted, fits from fit where shop_id = shop and kind = any (p_kinds)
		union all
		select id, kind, engine_key, from_key, fits from fit where shop_id = shop and kind = any (p_kinds) and both_ways
	) x where x.key <> '' and not exists (select from unnest(p_engine) w where position(w in x.wanted) = 0));
end if;
narrow := v_bins is not null or v_donor is not null;
onlykinds := not narrow and p_strict is null and cardinality(p_kinds) > 0;
everything := not narrow and not onlykinds and p_strict is null and p_key is null and p_like is null and cardinality(p_tags) = 0 and p_address is null;
with recursive chain(key, far) as (
	select p_key, 0 where p_key is not null
	union
	select case when s.old_key = c.key then s.new_key else s.old_key end, c.far + 1
	from chain c join supersession s on s.shop_id = shop and (s.old_key = c.key or (s.both_ways and s.new_key = c.key))
	where c.far < 8
),
exact as materialized (
	select n.part_id, min(case when c.far = 0 then 1 else 2 end) as tier
	from (select key, min(far) as far from chain group by key) c join found_number n on n.shop_id = shop and n.key = c.key group by 1
),
pieces as materialized (
	select n.part_id, min(n.tier) as tier from (
		select part_id, 3 as tier from found_number where shop_id = shop and p_key is not null and key > p_key and key < p_key || '~'
		union all
		select part_id, case when right(key, length(p_key)) = p_key then 4 else 5 end from found_number
		where length(p_key) > 3 and not exists (select from exact)
			and key_grams(shop_id, key) @> key_grams(shop, p_key) and key like '%' || p_key || '%'
		union all
		select part_id, 4 from found_number
		where p_run is not null and key_grams(shop_id, key) @> key_grams(shop, p_run) and key like p_like and shop_id + 0 = shop
		union all
		select part_id, 4 from found_number where p_like is not null and p_run is null and shop_id = shop and key like p_like
	) n where not exists (select from exact e where e.part_id = n.part_id) group by 1
),
coded as materialized (
	select id as part_id, 0 as tier from part where shop_id = shop and tag = any (p_tags)
	union all
	select f.part_id, 0 from bin b join found_by f on f.shop_id = shop and f.bin_id = b.id
	where b.shop_id = shop and (b.tag = any (p_tags) or upper(b.address) = p_address)
	union all
	select f.part_id, 0 from box x join found_by f on f.shop_id = shop and (f.box_id = x.id or f.donor_id = x.donor_id)
	where x.shop_id = shop and x.tag = any (p_tags)
),
named as materialized (
	select part_id, min(tier) as tier from (
		select * from coded union all select * from exact union all select * from pieces ) u group by 1
),
level1 as materialized (
	select n.tier, 0 as unlike, f.* from named n cross join lateral (
		select part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
		from found_by where shop_id = shop and part_id = n.part_id offset 0) f
	union all
	select case when cardinality(p_kinds) = 0 or kind = any (p_kinds) then 7 else 8 end, 0,
		part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from found_by f
	where not narrow and shop_id + 0 = shop and shop_words(shop_id, words) @@ p_strict
		and not exists (select from named n where n.part_id = f.part_id)
	union all
	select 7, 0, part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from found_by where (onlykinds) and shop_id = shop and kind = any (p_kinds)
	union all
	select 7, 0, part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from found_by where everything and shop_id = shop
	union all
	select 7, 0, part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from (
		select * from found_by where v_donor is null and narrow and shop_id = shop and bin_id = any (v_bins)
		union all
		select * from found_by where v_donor is not null and shop_id = shop and donor_id = v_donor and (v_bins is null or bin_id = any (v_bins))
	) f
	where (cardinality(p_kinds) = 0 or p_strict is not null or kind = any (p_kinds))
		and (p_strict is null or shop_words(shop_id, words) @@ p_strict)
		and not exists (select from named n where n.part_id = f.part_id)
	union all
	select 7, 1, f.* from jsonb_each(v_fits) t cross join lateral (
		select part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
		from found_by w where shop_id = shop and kind = split_part(t.key, ' ', 1) and engine_key = split_part(t.key, ' ', 2)
			and (p_strict is null or not shop_words(w.shop_id, w.words) @@ p_strict) offset 0) f
	where t.value = 'true' and not onlykinds and not narrow and not exists (select from named n where n.part_id = f.part_id)
),
level2 as materialized (
	select 6 as tier, 0 as unlike, f.* from donor d cross join lateral (
		select part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
		from found_by where shop_id = shop and donor_id = d.id offset 0) f
	where (p_key is not null or p_like is not null) and not exists (select from level1)
		and d.shop_id = shop and d.serial_key like coalesce(p_like, '%' || p_key || '%')
	union all
	select 9, 0, part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from found_by
	where not narrow and not exists (select from level1) and shop_id + 0 = shop and shop_words(shop_id, words) @@ p_loose
	union all
	select 9, 0, part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from (
		select * from found_by where v_donor is null and narrow and shop_id = shop and bin_id = any (v_bins)
		union all
		select * from found_by where v_donor is not null and shop_id = shop and donor_id = v_donor and (v_bins is null or bin_id = any (v_bins))
	) f where not exists (select from level1) and shop_words(shop_id, words) @@ p_loose
	union all
	select 10, 0, f.* from part p cross join lateral (
		select part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
		from found_by where shop_id = shop and part_id = p.id offset 0) f
	where p.shop_id = shop and p.tag = any (p_near_tags) and not exists (select from level1)
),
wide as materialized (
	select part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from found_by where not narrow and p_strict is not null and cardinality(p_kinds) > 0 and shop_id = shop and kind = any (p_kinds)
		and not exists (select from level1) and not exists (select from level2)
	union all
	select part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no
	from found_by where not narrow and cardinality(p_kinds) = 0 and shop_id + 0 = shop and shop_words(shop_id, words) @@ p_wide
		and not exists (select from level1) and not exists (select from level2)
),
partly as materialized (
	select f.part_id, count(*)::int as n from unnest(p_each) e cross join lateral (
		select part_id from found_by where shop_id + 0 = shop and shop_words(shop_id, words) @@ e::tsquery offset 0) f
	where exists (select from wide) group by 1
),
weak as materialized (
	select part_id from found_by where shop_id + 0 = shop and shop_words(shop_id, words) @@ p_weak
),
base as not materialized (
	select * from level1 union all select * from level2
	union all
	select 11, greatest(cardinality(p_each) - coalesce(s.n, 0), 0), w.* from wide w left join partly s on s.part_id = w.part_id
),
hits as materialized (
	select b.part_id, b.kind, b.stands, b.grade_no, b.proof_no, b.bin_id, b.box_id, b.engine_key, b.new_cents, b.copy_cents, b.asks_no, b.same_no, b.tier,
		case when v_fits is not null then (v_fits->>(b.kind || ' ' || b.engine_key))::boolean end as fits,
		case when p_sort = 'fit' then
			(b.stands::bigint << 58) + ((case when v_fits is not null and v_fits->>(b.kind || ' ' || b.engine_key) = 'false' then 15 else b.tier end)::bigint << 54)
			+ (least(b.unlike * 16 + case when cardinality(p_kinds) > 1 then least(coalesce(array_position(p_kinds, b.kind), 8), 8) - 1 else 0 end
				+ case when p_weak is not null and b.part_id not in (select part_id from weak) then 8 else 0 end, 255)::bigint << 46)
			+ (b.grade_no::bigint << 42) + b.aged
		when p_sort = 'grade' then b.grade_no
		when p_sort = 'state' then b.stands
		when p_sort = 'new' then coalesce(b.new_cents, 0)
		when p_sort = 'copy' then coalesce(b.copy_cents, 0)
		when p_sort = 'age' then b.aged
		when p_sort = 'asked' then coalesce(asked_cents(b.asks_no, b.new_cents, b.copy_cents, policy), 0)
		when p_sort = 'kind' then (v_ranks->>b.kind)::bigint
		when p_sort = 'engine' then (v_ranks->>b.engine_key)::bigint
		when p_sort = 'bin' then coalesce((v_ranks->>b.bin_id::text)::bigint, 9223372036854775)
		end * p_sign as ord,
		not f_place or coalesce(b.bin_id = any (f_bins), false) or coalesce(b.box_id = any (f_boxes), false) as ok_place,
		(f_engine is null or b.engine_key = f_engine) as ok_engine,
		not f_price or coalesce(case when f_unpriced then asked_cents(b.asks_no, b.new_cents, b.copy_cents, policy) is null
			else asked_cents(b.asks_no, b.new_cents, b.copy_cents, policy) between coalesce(f_low, 0) and coalesce(f_high, 2147483647) end, false) as ok_price
	from base b
	where f_same is null or b.same_no = f_same
),
cells as materialized (
	select kind, grade_no, stands, proof_no, ok_place, ok_engine, ok_price, count(*)::int as n,
		(f_kind is null or kind = f_kind) as ok_kind,
		(f_grade is null or grade_no = f_grade) as ok_grade,
		(case when f_stands is null then stands < 5 else stands = f_stands end) as ok_stands,
		(proof_no between f_proof_low and f_proof_high) as ok_proof
	from hits group by 1, 2, 3, 4, 5, 6, 7
),
answers as materialized (
	select part_id, ord, same_no, tier, fits from hits
	where ok_place and ok_engine and ok_price and (f_kind is null or kind = f_kind) and (f_grade is null or grade_no = f_grade)
		and (case when f_stands is null then stands < 5 else stands = f_stands end) and proof_no between f_proof_low and f_proof_high
),
tops as materialized (
	select same_no, min(ord) as ord, count(*)::int as n from answers where p_together group by 1
	having after_ord is null or (min(ord), same_no) > (after_ord, after_id) order by 2, 1 limit p_limit + 1
),
page as materialized (
	(select part_id, ord, part_id as id, tier, fits, same_no, null::int as n from answers
	where not p_together and (after_ord is null or (ord, part_id) > (after_ord, after_id)) order by 2, 3 limit p_limit + 1)
	union all
	(select distinct on (t.ord, t.same_no) a.part_id, t.ord, t.same_no, a.tier, a.fits, t.same_no, t.n
	from tops t join answers a on a.same_no = t.same_no and a.ord = t.ord order by t.ord, t.same_no, a.part_id)
),
alike as materialized (
	select same_no, count(*)::int as n from answers where not p_together and same_no > 0 and (same_no in (select same_no from page)) is true group by 1
),
gone as materialized (
	select part_id, ord, part_id as id, tier, fits, same_no, 1 as n from hits
	where f_stands is null and stands = 5 and ok_place and ok_engine and ok_price and (f_kind is null or kind = f_kind) and (f_grade is null or grade_no = f_grade)
		and not everything and tier < 11
	order by ord desc limit 3
),
shown as (
	select g.*, false as is_gone from page g union all select g.*, true from gone g
),
worded as materialized (
	select h.ord, h.id, h.is_gone, json_build_object('at', json_build_array(h.ord::text, h.id::text), 'tier', h.tier, 'fits', h.fits, 'same', h.same_no::text,
		'count', coalesce(h.n, (select n from alike a where a.same_no = h.same_no), 1), 'part', json_build_object('id', p.id, 'tag', p.tag, 'kind', p.kind, 'label', p.label, 'grade', p.grade, 'state', p.state,
		'bin', b.address, 'box', xd.number, 'donor', d.number, 'maker', d.maker, 'model', d.model, 'engine', p.engine, 'engineKey', p.engine_key,
		'serial', d.serial, 'typeCode', d.type_code, 'cc', d.displacement_cc, 'cause', d.cause, 'secondCause', d.second_cause, 'sureness', d.sureness, 'takenInAt', d.taken_in_at,
		'numbers', p.numbers, 'note', p.note, 'mass', p.mass_grams, 'heldFor', p.held_for, 'heldUntil', p.held_until, 'outAs', p.out_as, 'outTo', p.out_to, 'changedAt', p.changed_at, 'pulledAt', p.pulled_at,
		'binCost', b.yearly_cost_cents, 'binLitres', b.litres,
		'asked', asked_cents(f.asks_no, f.new_cents, f.copy_cents, policy),
		'photo', (select min(pp.photo_id) from part_photo pp join photo ph on ph.shop_id = pp.shop_id and ph.id = pp.photo_id and ph.deleted_at is null where pp.shop_id = shop and pp.part_id = p.id),
		'proofs', (select json_agg(json_build_object('how', r.how, 'passed', r.passed) order by r.id) from proof r where r.shop_id = shop and r.part_id = p.id),
		'price', case when f.new_cents is null then null else (select json_build_object('newCents', x.new_cents, 'copyCents', x.copy_cents, 'source', x.source, 'seenOn', x.seen_on) from (
			select 1 - (r.kind = p.kind)::int as nearness, r.* from price r where r.shop_id = shop and r.number_key = any (p.number_keys) and r.number_key <> ''
			union all
			select 2 + (r.number_key <> '')::int, r.* from price r where r.shop_id = shop and r.kind = p.kind and r.engine_key = p.engine_key and p.engine_key <> ''
			) x order by x.nearness, x.seen_on desc, x.id desc limit 1) end,
		'queue', (select json_build_array(count(*), count(*) filter (where o.grade_no < f.grade_no or o.grade_no = f.grade_no and (o.aged, o.part_id) < (f.aged, f.part_id))) from (
			select o.part_id, o.grade_no, o.aged, o.bin_id from found_by o
			where o.shop_id = shop and o.engine_key = p.engine_key and o.kind = p.kind and o.stands < 2 and p.engine_key <> ''
			union all
			select distinct o.part_id, o.grade_no, o.aged, o.bin_id from found_number n join found_by o on o.shop_id = shop and o.part_id = n.part_id
			where n.shop_id = shop and n.key = any (p.number_keys) and n.kind = p.kind and (n.engine_key <> p.engine_key or p.engine_key = '') and o.stands < 2
			) o where o.part_id <> p.id and (v_red = '{}' or o.bin_id is null or not o.bin_id = any (v_red))),
		'stands', f.stands < 2 and not coalesce(b.red, false))) as said
	from shown h
	join part p on p.shop_id = shop and p.id = h.part_id
	join found_by f on f.shop_id = shop and f.part_id = h.part_id
	left join bin b on b.shop_id = shop and b.id = p.bin_id
	left join box x on x.shop_id = shop and x.id = p.box_id
	left join donor xd on xd.shop_id = shop and xd.id = x.donor_id
	left join donor d on d.shop_id = shop and d.id = p.donor_id
)
select json_build_object(
	'level', case when exists (select from wide) then 3 when exists (select from level2) then 2 else 1 end,
	'placed', not isword,
	'total', (select coalesce(sum(n), 0) from cells where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_stands and ok_proof),
	'kind', (select json_agg(x) from (select kind as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_grade and ok_stands and ok_proof group by 1 order by 2 desc, 1) x),
	'grade', (select json_agg(x) from (select grade_no as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_kind and ok_stands and ok_proof group by 1 order by 2 desc, 1) x),
	'state', (select json_agg(x) from (select stands as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_proof group by 1 order by 2 desc, 1) x),
	'proof', (select json_agg(x) from (select proof_no as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_stands group by 1 order by 1) x),
	'price', (select json_agg(x) from (select width_bucket(asked, array[1000, 2500, 5000, 10000]) as value, sum(n) as count from (
		select asked_cents(asks_no, new_cents, copy_cents, policy) as asked, count(*) as n from hits
		where ok_place and ok_engine and (f_kind is null or kind = f_kind) and (f_grade is null or grade_no = f_grade)
			and (case when f_stands is null then stands < 5 else stands = f_stands end) and proof_no between f_proof_low and f_proof_high
		group by asks_no, new_cents, copy_cents) c group by 1 order by 1) x),
	'bin', (select json_agg(json_build_object('value', coalesce(b.address, 'box D' || d.number), 'count', c.n) order by c.n desc, b.address) from (
		select bin_id, box_id, count(*) as n from hits
		where ok_engine and ok_price and (f_kind is null or kind = f_kind) and (f_grade is null or grade_no = f_grade)
			and (case when f_stands is null then stands < 5 else stands = f_stands end) and proof_no between f_proof_low and f_proof_high and (bin_id is not null or box_id is not null)
		group by 1, 2 order by 3 desc, 1, 2 limit 20) c
		left join bin b on b.shop_id = shop and b.id = c.bin_id
		left join box x on x.shop_id = shop and x.id = c.box_id left join donor d on d.shop_id = shop and d.id = x.donor_id),
	'engine', (select json_agg(json_build_object('value', c.engine_key, 'count', c.n, 'said', (
			select coalesce(nullif(trim(concat_ws(' ', d.maker, d.model)), ''), p.engine) from part p left join donor d on d.shop_id = shop and d.id = p.donor_id where p.shop_id = shop and p.id = c.one)) order by c.n desc, c.engine_key) from (
		select engine_key, count(*) as n, min(part_id) as one from hits
		where ok_place and ok_price and engine_key <> '' and (f_kind is null or kind = f_kind) and (f_grade is null or grade_no = f_grade)
			and (case when f_stands is null then stands < 5 else stands = f_stands end) and proof_no between f_proof_low and f_proof_high
		group by 1 order by 2 desc, 1 limit 12) c),
	'page', (select json_agg(w.said order by w.ord, w.id) from worded w where not w.is_gone),
	'gone', (select json_agg(w.said order by w.ord desc) from worded w where w.is_gone)
) into answer;
return answer;
end $f$;
--> statement-breakpoint

-- Donors not yet taken apart from which no such kind was logged, newest first, with the kinds that were.
create function find_on_donors(kinds text[], classes text[], engine text[], of_number int) returns json
stable parallel safe security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan language plpgsql as $f$
begin return (
	select json_agg(json_build_object('number', d.number, 'maker', d.maker, 'model', d.model, 'class', d.engine_class, 'fittings', d.fittings, 'state', d.state,
		'cause', d.cause, 'secondCause', d.second_cause, 'sureness', d.sureness, 'named', d.named,
		'logged', (select coalesce(json_agg(distinct p.kind), '[]') from part p where p.shop_id = current_shop() and p.donor_id = d.id and p.scrap_reason is distinct from 'logged by mistake')) order by d.id desc)
	from (
		select d.*, n.named from donor d
		cross join lateral (select not exists (select from unnest(engine) w where not position(lower(w) in lower(d.engine_key || ' ' || d.search_words)) > 0) and cardinality(engine) > 0 as named) n
		where d.shop_id = current_shop() and d.engine_class = any (classes) and d.state in ('whole', 'on the bench', 'parked')
			and (of_number is null or d.number = of_number)
			and exists (select from unnest(kinds) k where not exists (
				select from part p where p.shop_id = d.shop_id and p.donor_id = d.id and p.kind = k and p.scrap_reason is distinct from 'logged by mistake'))
		order by n.named desc, d.id desc limit 24) d
); end $f$;
--> statement-breakpoint
grant create on schema public to endplay_search;
--> statement-breakpoint
alter function find_parts(json) owner to endplay_search;
--> statement-breakpoint
alter function find_on_donors(text[], text[], text[], int) owner to endplay_search;
--> statement-breakpoint
revoke create on schema public from endplay_search;
--> statement-breakpoint
revoke all on function find_parts(json), find_on_donors(text[], text[], text[], int),
	follow_parts(bigint, bigint[]), follow_words(bigint, bigint[]), part_changed(), part_renumbered(), donor_changed(), price_changed(), proof_added() from public;
--> statement-breakpoint
grant execute on function find_parts(json), find_on_donors(text[], text[], text[], int) to endplay_app;
