import { sql, type SQL } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import { box, donor } from '../donors/tables';
import { part } from '../parts/tables';

/** On the shelf first, then what is soon there, then what somebody has, then what is gone. */
const order = sql.raw(
	`array_position(array['shelved','pulled','held','back','missing','out','scrapped'], p.state)`
);

/** Every part of the shop with what it is found by: the one place where a search begins. */
export const shelfOf = (ctx: Context): SQL => sql`
	select p.id, p.tag, p.kind, p.grade, p.state, p.number_keys, p.engine_key, p.search_text,
		${order} as stands, (extract(epoch from p.pulled_at) * 1000000)::bigint as aged,
		p.donor_id, d.number as donor_number,
		b.tag as bin_tag, coalesce(x.tag, own.tag) as box_tag,
		coalesce(b.address, 'box D' || xd.number) as place
	from ${part} p
	left join ${donor} d on d.shop_id = p.shop_id and d.id = p.donor_id
	left join ${bin} b on b.shop_id = p.shop_id and b.id = p.bin_id
	left join ${box} x on x.shop_id = p.shop_id and x.id = p.box_id
	left join ${donor} xd on xd.shop_id = x.shop_id and xd.id = x.donor_id
	left join lateral (
		select o.tag from ${box} o where o.shop_id = p.shop_id and o.donor_id = p.donor_id
		order by o.id limit 1
	) own on true
	where p.shop_id = ${ctx.shopId}`;
