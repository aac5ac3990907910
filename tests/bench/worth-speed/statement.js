import { POLICY } from './columns.js';

const { copyCap, marginCents, moneyRate: r, labourNow, labour } = POLICY;

/**
 * The verdict of every part in one statement: used price, reach, both values, gain, word, timing,
 * break-even and how many to keep. Nothing is spent now. `offset 0` keeps each step from being worked
 * out anew wherever the next one names it.
 */
export const STATEMENT = `
with priced as (
	select *,
		floor(share * new_cents * 1e6 + 0.5) / 1e6 as by_share,
		case when copy_cents > 0 then floor(${copyCap} * copy_cents * 1e6 + 0.5) / 1e6 end as cap
	from part_figures offset 0
), stepped as (
	select *, coalesce(cap < by_share, false) as capped, least(by_share, cap) as exact,
		case when least(by_share, cap) < 5000 then 100 else 500 end as step
	from priced offset 0
), used as (
	select *, step * floor(exact / step + case when capped then 1e-9 else 0.5 end) as u,
		${r} + dying as theta, case when place = 1 then waiting else 0 end as w,
		${labour} * later as l_later, ${labourNow} * later as l_now
	from stepped offset 0
), reached as (
	select *, w + (1 - w) * power(calls / (calls + theta), place) as d,
		(shelf_cents - scrap_cents * dying) / theta as s,
		(shelf_cents + scrap_cents * ${r}) / theta as held,
		(1 - come_back) * u - come_back * refit_cents - kit_cents as sale
	from used offset 0
), valued as (
	select *,
		d * (chance * sale + (1 - chance) * scrap_cents - l_later) - s * (1 - d) as v_a,
		chance * (d * sale - s * (1 - d)) + (1 - chance) * scrap_cents - l_now as v_b,
		least(
			(held / d - s + l_later - (1 - chance) * scrap_cents) / chance,
			(held + l_now / chance) / d - s
		) as must_bring,
		held / nullif(greatest(chance * (sale - scrap_cents) + held - l_later, 0), 0) as need_a,
		(chance * held + l_now)
			/ nullif(greatest(chance * (sale - scrap_cents) + chance * held, 0), 0) as need_b
	from reached offset 0
), told as (
	select *, floor(greatest(v_a, v_b) - scrap_cents + 0.5) as gain,
		floor((must_bring + come_back * refit_cents + kit_cents) / (1 - come_back) + 0.5) as even,
		greatest(
			case when need_a < 1 then floor(ln(need_a) / -ln(1 + theta / calls) + 1e-9) else 0 end,
			case when need_b < 1 then floor(ln(need_b) / -ln(1 + theta / calls) + 1e-9) else 0 end
		) as closed,
		waiting + (1 - waiting) * calls / (calls + theta) as d_first
	from valued offset 0
), counted as (
	select *, case when closed = 0 and greatest(
			d_first * (chance * sale + (1 - chance) * scrap_cents - l_later) - s * (1 - d_first),
			chance * (d_first * sale - s * (1 - d_first)) + (1 - chance) * scrap_cents - l_now
		) - scrap_cents > 1e-6 then 1 else closed end as keep_up_to
	from told offset 0
)
select sum(u) as used, sum(gain) as gain,
	count(*) filter (where gain >= ${marginCents}) as keep,
	count(*) filter (where gain > 0 and gain < ${marginCents}) as close,
	count(*) filter (where gain <= 0) as go,
	count(*) filter (where v_b > v_a) as now,
	sum(even) as even,
	sum(keep_up_to) as "keepUpTo"
from counted`;
