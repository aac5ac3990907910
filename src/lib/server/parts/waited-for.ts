import { inShop, type Context } from '../context';
import { rowsOf, wantable } from './verdict-rows';
import { openWants, waitingOf } from './waiting';

/** Which of these parts somebody waits for: for lists, where the wants are not named. */
export const waitedFor = (ctx: Context, partIds: readonly number[]): Promise<Set<number>> =>
	inShop(ctx, async (tx, ctx) => {
		if (partIds.length === 0) return new Set();
		const rows = await rowsOf(tx, ctx, partIds);
		const open = await openWants(tx, ctx, rows);
		const waited = rows.filter((row) => waitingOf(wantable(row), open).waiting);
		return new Set(waited.map(({ id }) => id));
	});
