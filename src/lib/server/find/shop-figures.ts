import type { ShopFigures } from '$lib/parts/learned-view';
import { withDefaults, type Policy } from '$lib/people/policy';
import type { Season } from '$lib/people/settings';
import { sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { recentFigures } from '../parts';
import { policy, shop } from '../people/tables';

export interface ShopOf {
	slug: string;
	season: Season;
	timeZone: string;
	policy: ShopFigures;
}

interface Row extends Record<string, unknown> {
	slug: string;
	season: Season;
	time_zone: string;
	figures: Partial<Policy> | null;
}

/** What an answer needs to know of its shop, in one reading. */
export async function shopOf(tx: Tx, ctx: Context): Promise<ShopOf> {
	const { rows } = await tx.execute<Row>(sql`
		select s.slug, s.season, s.time_zone, p.figures
		from ${shop} s left join ${policy} p on p.shop_id = s.id where s.id = ${ctx.shopId}`);
	const { slug, season, time_zone: timeZone, figures } = rows[0]!;
	return { slug, season, timeZone, policy: await recentFigures(ctx, withDefaults(figures ?? {})) };
}
