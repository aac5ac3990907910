-- One look at the shelf, in the smallest statement that answers: by kinds, words, place, or all there is.
create index bin_said on bin (shop_id, (upper(address) collate "C"));
--> statement-breakpoint
create index bin_red on bin (shop_id, id) where red;
--> statement-breakpoint
create index part_logged on part (shop_id, donor_id, kind) where scrap_reason is distinct from 'logged by mistake';
--> statement-breakpoint

-- What the counter asks, as the calculator has it: share of the grade, held down by the copy, in the shop's steps. In
-- one expression, so that counting by price calls no function for each price.
create function asked_cents(share float8, new_cents int, copy_cents int, copy_cap float8, step_limit float8, step_low float8, step_high float8) returns int
immutable parallel safe language sql as $$
	select (case
		when floor(copy_cap * copy_cents * 1e6 + 0.5) < floor(share * new_cents * 1e6 + 0.5) then
			floor(floor(floor(copy_cap * copy_cents * 1e6 + 0.5) / 1e6
				/ case when floor(copy_cap * copy_cents * 1e6 + 0.5) / 1e6 < step_limit then step_low else step_high end * 1e6 + 0.5) / 1e6)
			* case when floor(copy_cap * copy_cents * 1e6 + 0.5) / 1e6 < step_limit then step_low else step_high end
		else
			floor(floor(floor(share * new_cents * 1e6 + 0.5) / 1e6
				/ case when floor(share * new_cents * 1e6 + 0.5) / 1e6 < step_limit then step_low else step_high end * 1e6 + 0.5) / 1e6 + 0.5)
			* case when floor(share * new_cents * 1e6 + 0.5) / 1e6 < step_limit then step_low else step_high end
		end)::int
$$;
--> statement-breakpoint
alter type find_question add attribute slips boolean;
--> statement-breakpoint

-- find_on_shelf is put together from pieces: where the parts come from, and what is made of them. Each way to look is a
-- statement of its own with a small plan, kept by the session.
do $make$
declare
	-- What an answer is made of.
	columns text := $$part_id, kind, stands, grade_no, proof_no, bin_id, box_id, engine_key, new_cents, copy_cents, asks_no, aged, same_no$$;
	-- Parts that a tag, an address or a number names.
	named text := $$select n.tier, 0 as unlike, f.* from unnest(n_ids, n_tiers) n(part_id, tier) cross join lateral (
		select {columns} from found_by where shop_id = shop and part_id = n.part_id offset 0) f$$;
	others text := $$part_id not in (select unnest(n_ids))$$;
	by_kind text := $$select 7, 0, {columns} from found_by where shop_id = shop and kind = any (p_kinds) and {others}$$;
	by_words text := $$select case when cardinality(p_kinds) = 0 or kind = any (p_kinds) then 7 else 8 end, 0, {columns}
		from found_by where shop_id + 0 = shop and shop_words(shop_id, words) @@ p_strict and {others}
		union all
		select 7, 1, f.* from jsonb_each(v_fits) t cross join lateral (
			select {columns} from found_by w where shop_id = shop and kind = split_part(t.key, ' ', 1) and engine_key = split_part(t.key, ' ', 2)
				and (p_strict is null or not shop_words(w.shop_id, w.words) @@ p_strict) offset 0) f
		where t.value = 'true' and f.{others}$$;
	placed text := $$select {columns}, words from found_by where v_donor is null and shop_id = shop and bin_id = any (v_bins)
		union all
		select {columns}, words from found_by where v_donor is not null and shop_id = shop and donor_id = v_donor and (v_bins is null or bin_id = any (v_bins))$$;
	by_place text := $$select 7, 0, {columns} from ({placed}) f
		where (cardinality(p_kinds) = 0 or p_strict is not null or kind = any (p_kinds))
			and (p_strict is null or shop_words(shop, words) @@ p_strict) and {others}$$;
	every text := $$select 7 as tier, 0 as unlike, {columns} from found_by where shop_id = shop$$;
	-- Spelling forgiven: near words, serials with the number in them, tags with one slip.
	near text := $$select tier, 0 as unlike, f.* from unnest(n_ids, n_tiers) n(part_id, tier) cross join lateral (
			select {columns} from found_by where shop_id = shop and part_id = n.part_id offset 0) f
		union all
		select 9, 0, {columns} from found_by where not narrow and shop_id + 0 = shop and shop_words(shop_id, words) @@ p_loose and {others}
		union all
		select 9, 0, {columns} from ({placed}) f where narrow and shop_words(shop, words) @@ p_loose and {others}$$;
	-- Some of the words left out; what has more of them comes first.
	wide text := $$select 11 as tier, greatest(cardinality(p_each) - coalesce(s.n, 0), 0) as unlike, {w.columns} from (
			select {columns} from found_by where p_strict is not null and cardinality(p_kinds) > 0 and shop_id = shop and kind = any (p_kinds)
			union all
			select {columns} from found_by where cardinality(p_kinds) = 0 and shop_id + 0 = shop and shop_words(shop_id, words) @@ p_wide) w
		left join (select f.part_id, count(*)::int as n from unnest(p_each) e cross join lateral (
			select part_id from found_by where shop_id + 0 = shop and shop_words(shop_id, words) @@ e::tsquery offset 0) f group by 1) s using (part_id)$$;

	-- How near it comes: where it stands, what named it, how unlike it is, its grade, its age.
	fit_order text := $$(b.stands::bigint << 58) + ((case when v_fits is not null and v_fits->>(b.kind || ' ' || b.engine_key) = 'false' then 15 else b.tier end)::bigint << 54)
		+ (least(b.unlike * 16 + case when cardinality(p_kinds) > 1 then least(coalesce(array_position(p_kinds, b.kind), 8), 8) - 1 else 0 end
			+ case when p_weak is not null and b.part_id not in (select part_id from found_by where shop_id + 0 = shop and shop_words(shop_id, words) @@ p_weak) then 8 else 0 end, 255)::bigint << 46)
		+ (b.grade_no::bigint << 42) + b.aged$$;
	fits text := $$case when v_fits is not null then (v_fits->>(b.kind || ' ' || b.engine_key))::boolean end as fits$$;
	head text := $$with base as (
		{base}
	), $$;
	-- Nothing narrows: each count is over all of them that are there.
	plain text := head || $$hits as materialized (
		select {columns}, tier, {fits}, {fit_order} as ord from base b
	),
	answers as (select * from hits where stands < 5),
	cells as materialized (select kind, grade_no, stands, proof_no, count(*)::int as n from hits group by 1, 2, 3, 4),
	prices as (select asked_cents(policy[asks_no], new_cents, copy_cents, copy_cap, step_limit, step_low, step_high) as asked, count(*) as n from answers group by asks_no, new_cents, copy_cents),
	bins as (select bin_id, box_id, count(*) as n from answers where bin_id is not null or box_id is not null group by 1, 2 order by 3 desc, 1, 2 limit 20),
	engines as (select engine_key, count(*) as n, min(part_id) as one from answers where engine_key <> '' group by 1 order by 2 desc, 1 limit 12),
	kind_counts as (select kind as value, sum(n) as count from cells where stands < 5 group by 1),
	grade_counts as (select grade_no as value, sum(n) as count from cells where stands < 5 group by 1),
	state_counts as (select stands as value, sum(n) as count from cells group by 1),
	proof_counts as (select proof_no as value, sum(n) as count from cells where stands < 5 group by 1),
	totals as (select coalesce(sum(n), 0) as n from cells where stands < 5),
	gone_hits as (select * from hits where stands = 5 and tier < 11 and not everything order by ord desc limit 3), {shown}$$;
	-- Filters, or another order: each count leaves its own filter out.
	filtered text := head || $$hits as materialized (
		select {columns}, tier, {fits},
			case when p_sort = 'fit' then {fit_order}
			when p_sort = 'grade' then b.grade_no
			when p_sort = 'state' then b.stands
			when p_sort = 'new' then coalesce(b.new_cents, 0)
			when p_sort = 'copy' then coalesce(b.copy_cents, 0)
			when p_sort = 'age' then b.aged
			when p_sort = 'asked' then coalesce(asked_cents(policy[b.asks_no], b.new_cents, b.copy_cents, copy_cap, step_limit, step_low, step_high), 0)
			when p_sort = 'kind' then (v_ranks->>b.kind)::bigint
			when p_sort = 'engine' then (v_ranks->>b.engine_key)::bigint
			when p_sort = 'bin' then coalesce((v_ranks->>b.bin_id::text)::bigint, 9223372036854775)
			end * p_sign as ord,
			not f_place or coalesce(b.bin_id = any (f_bins), false) or coalesce(b.box_id = any (f_boxes), false) as ok_place,
			(f_engine is null or b.engine_key = f_engine) as ok_engine,
			not f_price or coalesce(case when f_unpriced then asked_cents(policy[b.asks_no], b.new_cents, b.copy_cents, copy_cap, step_limit, step_low, step_high) is null
				else asked_cents(policy[b.asks_no], b.new_cents, b.copy_cents, copy_cap, step_limit, step_low, step_high) between coalesce(f_low, 0) and coalesce(f_high, 2147483647) end, false) as ok_price,
			(f_kind is null or b.kind = f_kind) as ok_kind,
			(f_grade is null or b.grade_no = f_grade) as ok_grade,
			(case when f_stands is null then b.stands < 5 else b.stands = f_stands end) as ok_stands,
			(b.proof_no between f_proof_low and f_proof_high) as ok_proof
		from base b where f_same is null or b.same_no = f_same
	),
	cells as materialized (
		select kind, grade_no, stands, proof_no, ok_place, ok_engine, ok_price, ok_kind, ok_grade, ok_stands, ok_proof, count(*)::int as n
		from hits group by 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11
	),
	answers as (select * from hits where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_stands and ok_proof),
	prices as (select asked_cents(policy[asks_no], new_cents, copy_cents, copy_cap, step_limit, step_low, step_high) as asked, count(*) as n from hits
		where ok_place and ok_engine and ok_kind and ok_grade and ok_stands and ok_proof group by asks_no, new_cents, copy_cents),
	bins as (select bin_id, box_id, count(*) as n from hits where ok_engine and ok_price and ok_kind and ok_grade and ok_stands and ok_proof
		and (bin_id is not null or box_id is not null) group by 1, 2 order by 3 desc, 1, 2 limit 20),
	engines as (select engine_key, count(*) as n, min(part_id) as one from hits
		where ok_place and ok_price and ok_kind and ok_grade and ok_stands and ok_proof and engine_key <> '' group by 1 order by 2 desc, 1 limit 12),
	kind_counts as (select kind as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_grade and ok_stands and ok_proof group by 1),
	grade_counts as (select grade_no as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_kind and ok_stands and ok_proof group by 1),
	state_counts as (select stands as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_proof group by 1),
	proof_counts as (select proof_no as value, sum(n) as count from cells where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_stands group by 1),
	totals as (select coalesce(sum(n), 0) as n from cells where ok_place and ok_engine and ok_price and ok_kind and ok_grade and ok_stands and ok_proof),
	gone_hits as (select * from hits where f_stands is null and stands = 5 and ok_place and ok_engine and ok_price and ok_kind and ok_grade
		and tier < 11 and not everything order by ord desc limit 3), {shown}$$;
	-- The empty question of a large shop: counted straight off the index, nothing kept.
	shelf text := $$with hits as (
		select {columns}, tier, null::boolean as fits, {fit_order} as ord from ({every}) b
	),
	answers as (select * from hits where stands < 5),
	cells as materialized (select kind, grade_no, stands, proof_no, count(*)::int as n from found_by where shop_id = shop group by 1, 2, 3, 4),
	prices as (select asked_cents(policy[asks_no], new_cents, copy_cents, copy_cap, step_limit, step_low, step_high) as asked, count(*) as n from answers group by asks_no, new_cents, copy_cents),
	bins as (select bin_id, box_id, count(*) as n from answers where bin_id is not null or box_id is not null group by 1, 2 order by 3 desc, 1, 2 limit 20),
	engines as (select engine_key, count(*) as n, min(part_id) as one from answers where engine_key <> '' group by 1 order by 2 desc, 1 limit 12),
	kind_counts as (select kind as value, sum(n) as count from cells where stands < 5 group by 1),
	grade_counts as (select grade_no as value, sum(n) as count from cells where stands < 5 group by 1),
	state_counts as (select stands as value, sum(n) as count from cells group by 1),
	proof_counts as (select proof_no as value, sum(n) as count from cells where stands < 5 group by 1),
	totals as (select coalesce(sum(n), 0) as n from cells where stands < 5),
	gone_hits as (select * from hits where false), {shown}$$;

	page text := $$tops as materialized (
		select same_no as id, min(ord) as ord, count(*)::int as n from answers where p_together group by 1
		having after_ord is null or (min(ord), same_no) > (after_ord, after_id) order by 2, 1 limit p_limit + 1
	),
	page as materialized (
		(select a.*, a.part_id as id, null::int as n from answers a
		where not p_together and (after_ord is null or (ord, part_id) > (after_ord, after_id)) order by ord, part_id limit p_limit + 1)
		union all
		(select distinct on (t.ord, t.id) a.*, t.id, t.n from tops t join answers a on a.same_no = t.id and a.ord = t.ord where p_together order by t.ord, t.id, a.part_id)
	),
	alike as materialized (
		select same_no, count(*)::int as n from answers where not p_together and same_no in (select same_no from page where same_no > 0) group by 1
	), $$;
	shown text := page || $$shown as (
		select part_id, ord, id, tier, fits, same_no, n, kind, grade_no, aged, engine_key, new_cents, copy_cents, false as is_gone from page
		union all
		select part_id, ord, part_id, tier, fits, same_no, 1, kind, grade_no, aged, engine_key, new_cents, copy_cents, true from gone_hits
	),
	worded as materialized (
		select h.ord, h.id, h.is_gone, json_build_object('at', h.ord || '.' || h.id, 'tier', h.tier, 'fits', h.fits, 'same', h.same_no::text,
			'count', coalesce(h.n, (select n from alike a where a.same_no = h.same_no), 1),
			'id', p.id, 'tag', p.tag, 'kind', p.kind, 'label', p.label, 'grade', p.grade, 'state', p.state,
			'bin', coalesce(b.address, 'box D' || xd.number), 'donor', d.number, 'maker', d.maker, 'model', d.model, 'engine', p.engine, 'engineKey', p.engine_key,
			'serial', d.serial, 'cc', d.displacement_cc, 'cause', d.cause, 'secondCause', d.second_cause, 'sureness', d.sureness,
			'numbers', p.numbers, 'note', p.note, 'mass', p.mass_grams, 'heldFor', p.held_for, 'heldUntil', p.held_until, 'outAs', p.out_as, 'outTo', p.out_to, 'changedAt', p.changed_at,
			'newCents', h.new_cents, 'copyCents', h.copy_cents,
			'photo', (select min(pp.photo_id) from part_photo pp join photo ph on ph.shop_id = pp.shop_id and ph.id = pp.photo_id and ph.deleted_at is null where pp.shop_id = shop and pp.part_id = p.id),
			'proofs', (select json_agg(json_build_object('how', r.how, 'passed', r.passed) order by r.id) from proof r where r.shop_id = shop and r.part_id = p.id),
			'before', (select count(*) from found_by o
				where h.engine_key <> '' and o.shop_id = shop and o.engine_key = h.engine_key and o.kind = h.kind and o.stands = any ('{0,1}')
				and (o.grade_no, o.aged, o.part_id) < (h.grade_no, h.aged, h.part_id) and (v_red = '{}' or o.bin_id is null or not o.bin_id = any (v_red)))
			+ case when p.number_keys = '{}' then 0 else (select count(distinct n.part_id) from unnest(p.number_keys) k cross join lateral (
					select part_id from found_number where shop_id = shop and key = k and kind = h.kind and engine_key < h.engine_key
					union all
					select part_id from found_number where shop_id = shop and key = k and kind = h.kind and engine_key > h.engine_key
					union all
					select part_id from found_number where h.engine_key = '' and shop_id = shop and key = k and kind = h.kind and engine_key = '') n
				join found_by o on o.shop_id = shop and o.part_id = n.part_id
				where n.part_id <> h.part_id and o.stands < 2
				and (o.grade_no, o.aged, o.part_id) < (h.grade_no, h.aged, h.part_id) and (v_red = '{}' or o.bin_id is null or not o.bin_id = any (v_red))) end) as said
		from shown h
		join part p on p.shop_id = shop and p.id = h.part_id
		left join bin b on b.shop_id = shop and b.id = p.bin_id
		left join box x on x.shop_id = shop and x.id = p.box_id
		left join donor xd on xd.shop_id = shop and xd.id = x.donor_id
		left join donor d on d.shop_id = shop and d.id = p.donor_id
	)
	select json_build_object('level', v_level, 'placed', not isword,
		'total', (select n from totals),
		'kind', (select json_agg(x order by count desc, value) from kind_counts x),
		'grade', (select json_agg(x order by count desc, value) from grade_counts x),
		'state', (select json_agg(x order by count desc, value) from state_counts x),
		'proof', (select json_agg(x order by value) from proof_counts x),
		'price', (select json_agg(x order by value) from (select width_bucket(asked, array[1000, 2500, 5000, 10000]) as value, sum(n) as count from prices group by 1) x),
		'bin', (select json_agg(json_build_object('value', coalesce(b.address, 'box D' || d.number), 'count', c.n) order by c.n desc, b.address) from bins c
			left join bin b on b.shop_id = shop and b.id = c.bin_id
			left join box x on x.shop_id = shop and x.id = c.box_id left join donor d on d.shop_id = shop and d.id = x.donor_id),
		'engine', (select json_agg(json_build_object('value', c.engine_key, 'count', c.n, 'said', coalesce(nullif(trim(concat_ws(' ', d.maker, d.model)), ''), p.engine)) order by c.n desc, c.engine_key)
			from engines c join part p on p.shop_id = shop and p.id = c.one left join donor d on d.shop_id = shop and d.id = p.donor_id),
		'page', (select json_agg(w.said order by w.ord, w.id) from worded w where not w.is_gone),
		'gone', (select json_agg(w.said order by w.ord desc) from worded w where w.is_gone)
	), (select count(*) > 0 from cells) into later, is_any;
	if is_any or answer is null then answer := later; end if;
	$$;

	prelude text := $$
#variable_conflict use_column
declare
	shop bigint := current_shop();
	ask find_question := json_populate_record(null::find_question, q);
	p_key text := ask.number;
	p_like text := ask.doubtful;
	p_run text := ask.run;
	p_tags text[] := ask.tags;
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
	is_plain boolean := p_sort = 'fit' and p_sign = 1 and not f_place and not f_price
		and coalesce(f_kind, f_engine, f_grade::text, f_stands::text, f_same::text, ask.f_proof_low::text) is null;
	after_ord bigint := ask.after_ord;
	after_id bigint := ask.after_id;
	n_ids bigint[] := '{}';
	n_tiers int[] := '{}';
	x_ids bigint[];
	x_tiers int[];
	v_bins bigint[];
	v_donor bigint;
	v_level int := 1;
	isword boolean := false;
	is_any boolean;
	narrow boolean;
	onlykinds boolean;
	everything boolean;
	policy float8[] := ask.policy;
	copy_cap float8 := ask.policy[6];
	step_limit float8 := ask.policy[7];
	step_low float8 := ask.policy[8];
	step_high float8 := ask.policy[9];
	v_red bigint[] := array(select id from bin where shop_id = shop and red);
	v_ranks jsonb;
	v_fits jsonb;
	later json;
	answer json;
begin
if ask.place is not null then
	v_bins := array(
		select id from bin where shop_id = shop and upper(address) collate "C" = ask.place
		union all
		select id from bin where shop_id = shop and upper(address) collate "C" > ask.place || '-' and upper(address) collate "C" < ask.place || '.');
	isword := v_bins = '{}';
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
	f_bins := array(select b.id from bin b where b.shop_id = shop and (upper(b.address) collate "C" = ask.f_place or b.tag = ask.f_bin_tag));
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
if p_engine <> '{}' and p_kinds <> '{}' and exists (select from fit where shop_id = shop and kind = any (p_kinds)) then
	v_fits := (select jsonb_object_agg(x.kind || ' ' || x.key, x.fits order by x.id) from (
		select id, kind, from_key as key, engine_key as wanted, fits from fit where shop_id = shop and kind = any (p_kinds)
		union all
		select id, kind, engine_key, from_key, fits from fit where shop_id = shop and kind = any (p_kinds) and both_ways
	) x where x.key <> '' and not exists (select from unnest(p_engine) w where position(w in x.wanted) = 0));
end if;
narrow := v_bins is not null or v_donor is not null;
onlykinds := not narrow and p_strict is null and p_kinds <> '{}';
everything := not narrow and not onlykinds and p_strict is null and p_key is null and p_like is null and p_tags = '{}' and ask.address is null;
if p_tags <> '{}' then
	n_ids := array(
		select id from part where shop_id = shop and tag = any (p_tags)
		union
		select f.part_id from bin b join found_by f on f.shop_id = shop and f.bin_id = b.id where b.shop_id = shop and b.tag = any (p_tags)
		union
		select f.part_id from box x join found_by f on f.shop_id = shop and (f.box_id = x.id or f.donor_id = x.donor_id) where x.shop_id = shop and x.tag = any (p_tags));
end if;
if ask.address is not null and exists (select from bin where shop_id = shop and upper(address) collate "C" = ask.address) then
	n_ids := array(select unnest(n_ids) union select f.part_id from bin b join found_by f on f.shop_id = shop and f.bin_id = b.id
		where b.shop_id = shop and upper(b.address) collate "C" = ask.address);
end if;
n_tiers := array_fill(0, array[cardinality(n_ids)]);
if p_key is not null then
	with recursive chain(key, far) as (
		select p_key, 0
		union
		select case when s.old_key = c.key then s.new_key else s.old_key end, c.far + 1
		from chain c join supersession s on s.shop_id = shop and (s.old_key = c.key or (s.both_ways and s.new_key = c.key))
		where c.far < 8
	)
	select array_agg(part_id), array_agg(tier) into x_ids, x_tiers from (
		select n.part_id, min(case when c.far = 0 then 1 else 2 end) as tier
		from (select key, min(far) as far from chain group by key) c join found_number n on n.shop_id = shop and n.key = c.key group by 1) x
	where part_id not in (select unnest(n_ids));
	if x_ids is not null then
		n_ids := n_ids || x_ids;
		n_tiers := n_tiers || x_tiers;
	end if;
end if;
if p_key is not null or p_like is not null then
	if x_ids is not null then
		select array_agg(part_id), array_agg(3) into x_ids, x_tiers from (
			select distinct part_id from found_number where shop_id = shop and key > p_key and key < p_key || '~' and part_id not in (select unnest(n_ids))) x;
	else
		select array_agg(part_id), array_agg(tier) into x_ids, x_tiers from (
			select n.part_id, min(n.tier) as tier from (
				select part_id, 3 as tier from found_number where p_key is not null and shop_id = shop and key > p_key and key < p_key || '~'
				union all
				select part_id, case when right(key, length(p_key)) = p_key then 4 else 5 end from found_number
				where length(p_key) > 3 and key_grams(shop_id, key) @> key_grams(shop, p_key) and key like '%' || p_key || '%'
				union all
				select part_id, 4 from found_number where p_run is not null and key_grams(shop_id, key) @> key_grams(shop, p_run) and key like p_like and shop_id + 0 = shop
				union all
				select part_id, 4 from found_number where p_like is not null and p_run is null and shop_id = shop and key like p_like
			) n where n.part_id not in (select unnest(n_ids)) group by 1) x;
	end if;
	if x_ids is not null then
		n_ids := n_ids || x_ids;
		n_tiers := n_tiers || x_tiers;
	end if;
	-- what may be a tag with a slip as well as a piece of a number is answered as both
	if ask.slips and not 1 = any (n_tiers) and not 2 = any (n_tiers) then
		x_ids := array(select id from part where shop_id = shop and tag = any (ask.near_tags) and id not in (select unnest(n_ids)));
		n_ids := n_ids || x_ids;
		n_tiers := n_tiers || array_fill(10, array[cardinality(x_ids)]);
	end if;
end if;
$$;

	-- Each level only where the one before it knew nothing.
	levels text := $$
	if everything then {every}
	elsif narrow then {by_place}
	elsif onlykinds then {by_kind}
	else {by_words}
	end if;
	if not is_any and not everything then
		v_level := 2;
		if p_key is not null or p_like is not null then
			n_ids := array(select f.part_id from donor d join found_by f on f.shop_id = shop and f.donor_id = d.id
				where d.shop_id = shop and d.serial_key like coalesce(p_like, '%' || p_key || '%'));
		end if;
		n_tiers := array_fill(6, array[cardinality(n_ids)]);
		if ask.near_tags <> '{}' then
			x_ids := array(select id from part where shop_id = shop and tag = any (ask.near_tags) and id not in (select unnest(n_ids)));
			n_ids := n_ids || x_ids;
			n_tiers := n_tiers || array_fill(10, array[cardinality(x_ids)]);
		end if;
		if p_loose is not null or n_ids <> '{}' then {near} end if;
		if not is_any and not narrow and (p_strict is not null or p_wide is not null) then
			v_level := 3;
			{wide}
		end if;
	end if;
$$;
	plainly text := levels;
	narrowly text := levels;
	made text;
	piece record;
begin
	for piece in select * from (values
		('{by_place}', named || ' union all ' || by_place), ('{by_kind}', named || ' union all ' || by_kind),
		('{by_words}', named || ' union all ' || by_words), ('{near}', near), ('{wide}', wide)) x(mark, base)
	loop
		plainly := replace(plainly, piece.mark, replace(plain, '{base}', piece.base));
		narrowly := replace(narrowly, piece.mark, replace(filtered, '{base}', piece.base));
	end loop;
	plainly := replace(plainly, '{every}', shelf);
	narrowly := replace(narrowly, '{every}', replace(filtered, '{base}', every));
	made := prelude || 'if is_plain then' || plainly || 'else' || narrowly || 'end if; return answer; end ';
	for piece in select * from (values
		(1, '{shown}', shown), (2, '{every}', every), (3, '{placed}', placed), (4, '{others}', others), (5, '{fit_order}', fit_order), (6, '{fits}', fits),
		(7, '{w.columns}', 'w.' || replace(columns, ', ', ', w.')), (8, '{columns}', columns)) x(no, mark, text) order by no
	loop
		made := replace(made, piece.mark, piece.text);
	end loop;
	execute 'create or replace function find_on_shelf(q json) returns json
		stable parallel safe security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan
		set jit = off language plpgsql as ' || quote_literal(made);
end $make$;
--> statement-breakpoint
-- Donors not yet taken apart from which no such kind was logged, those whose engine was named first, then the newest.
create or replace function find_on_donors(kinds text[], classes text[], engine text[], of_number int) returns json
stable parallel safe security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan language plpgsql as $f$
declare shop bigint := current_shop();
begin
	if kinds = '{}' then return null; end if;
	return (
	select json_agg(json_build_object('number', d.number, 'maker', d.maker, 'model', d.model, 'class', d.engine_class, 'fittings', d.fittings, 'state', d.state,
		'cause', d.cause, 'secondCause', d.second_cause, 'named', d.named,
		'logged', (select coalesce(json_agg(distinct p.kind), '[]') from part p where p.shop_id = shop and p.donor_id = d.id and p.scrap_reason is distinct from 'logged by mistake')) order by d.named desc, d.id desc)
	from (
		select * from (
			select o.*, engine <> '{}' and not exists (select from unnest(engine) w where position(lower(w) in lower(o.engine_key || ' ' || o.search_words)) = 0) as named
			from donor o
			where o.shop_id = shop and o.engine_class = any (classes) and o.state in ('whole', 'on the bench', 'parked')
				and (of_number is null or o.number = of_number)
			order by named desc, o.id desc offset 0) n
		where exists (select from unnest(kinds) k where not exists (
			select from part p where p.shop_id = shop and p.donor_id = n.id and p.kind = k and p.scrap_reason is distinct from 'logged by mistake'))
		limit 24) d);
end $f$;
--> statement-breakpoint
-- What an answer needs to know of its shop, and the last word that was written in it.
create function find_shop() returns json
stable parallel safe security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan language plpgsql as $f$
declare shop bigint := current_shop();
begin return (
	select json_build_object(
		'said', json_build_object('slug', s.slug, 'season', s.season, 'timeZone', s.time_zone, 'figures', p.figures)::text,
		'words', coalesce((select max(w.id) from shop_word w where w.shop_id = shop), 0))
	from shop s left join policy p on p.shop_id = s.id where s.id = shop
); end $f$;
--> statement-breakpoint
-- The first of these kinds of which some are there, with how many.
create function find_kinds(kinds text[], most int) returns json
stable parallel safe security definer set search_path = public, pg_temp set plan_cache_mode = force_generic_plan language plpgsql as $f$
declare shop bigint := current_shop();
begin return (
	select json_agg(x) from (
		select k.kind, n.count from (select u.kind from unnest(kinds) with ordinality u(kind, at) order by u.at offset 0) k
		cross join lateral (select count(*) as count from part p where p.shop_id = shop and p.kind = k.kind and p.state = any ('{shelved,pulled}')) n
		where n.count > 0 limit most) x
); end $f$;
--> statement-breakpoint
create policy search_all on shop_word to endplay_search using (true);
--> statement-breakpoint
grant select on shop_word to endplay_search;
--> statement-breakpoint
grant create on schema public to endplay_search;
--> statement-breakpoint
alter function find_on_shelf(json) owner to endplay_search;
--> statement-breakpoint
alter function find_shop() owner to endplay_search;
--> statement-breakpoint
alter function find_kinds(text[], int) owner to endplay_search;
--> statement-breakpoint
revoke create on schema public from endplay_search;
--> statement-breakpoint
revoke all on function find_on_shelf(json), find_shop(), find_kinds(text[], int) from public;
--> statement-breakpoint
grant execute on function find_on_shelf(json), find_shop(), find_kinds(text[], int) to endplay_app;
--> statement-breakpoint
-- What counts teeth is also found by the word alone.
update part set search_words = search_words || ' tooth' where search_words ~ '[0-9]tooth( |$)' and ' ' || search_words || ' ' not like '% tooth %';
