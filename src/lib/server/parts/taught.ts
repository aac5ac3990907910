import { withHistory } from '$lib/parts/learned';
import { taughtRows, type TaughtRow } from '$lib/parts/taught';
import { inShop, type Context } from '../context';
import { allow, getPolicy } from '../people';
import { observed } from './observed';

const MOST = 8;

/** The figures that this shop's own history has moved most, and how many it has moved at all. */
export const whatItTaught = (ctx: Context): Promise<{ rows: TaughtRow[]; moved: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'see costs');
		const seen = await observed(tx, ctx, null);
		const { taught } = withHistory(await getPolicy(ctx), seen);
		const rows = taughtRows(seen, taught);
		return { rows: rows.slice(0, MOST), moved: rows.length };
	});
