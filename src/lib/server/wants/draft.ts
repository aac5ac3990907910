import type { Template } from '$lib/customers/templates';
import { inShop, type Context } from '../context';
import { customerRow } from '../customers';
import { allow } from '../people';
import { liveMatches } from './matches';
import { wantRow } from './rows';
import { letterFor } from './values';

/** What somebody would be told of the best that is here: to read first, to copy, to print. Null where nothing is here. */
export const draftFor = (ctx: Context, ref: string, match?: number): Promise<Template | null> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await wantRow(tx, ctx, ref);
		const all = await liveMatches(tx, ctx, row);
		const chosen = all.find(({ id }) => id === match) ?? all[0];
		if (!chosen || row.customerId === null) return null;
		const who = await customerRow(tx, ctx, row.customerId).catch(() => null);
		return who && letterFor(tx, ctx, row, who, chosen);
	});
