import { searchText } from '$lib/parts/search-text';
import { and, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import type { PartRow } from './row';

/** What the search words are made of. */
export const WORDED = ['label', 'numbers', 'note', 'engine', 'set', 'kind'] as const;

/** The search words of a part as it would be with these changes. */
export async function wordsOf(
	tx: Tx,
	ctx: Context,
	row: Pick<PartRow, (typeof WORDED)[number] | 'donorId'>
) {
	if (row.donorId === null) return searchText(row, null);
	const [from] = await tx
		.select()
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.donorId)));
	return searchText(row, from ?? null);
}
