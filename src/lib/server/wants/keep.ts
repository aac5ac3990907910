import type { FitRank } from '$lib/parts/wanted';
import { sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { wantMatch } from './tables';

export interface Found {
	wantId: number;
	partId?: number;
	donorId?: number;
	rank: FitRank;
}

/** When it came in, and whether it came in anew or was only read again. */
export interface Coming {
	at: Date;
	isNew: boolean;
}

/** One row for each want and thing; what comes in again is new again, but only by a later coming. */
export async function keep(tx: Tx, ctx: Context, found: readonly Found[], { at, isNew }: Coming) {
	const added: number[] = [];
	for (const which of ['partId', 'donorId'] as const) {
		const rows = found.filter((one) => one[which] !== undefined);
		if (rows.length === 0) continue;
		const later = sql`excluded.at > ${wantMatch.at}`;
		const again = { at: sql`excluded.at`, seenAt: null, rank: sql`excluded.rank` };
		const known = await tx
			.insert(wantMatch)
			.values(rows.map((one) => ({ ...one, shopId: ctx.shopId, at })))
			.onConflictDoUpdate({
				target: [wantMatch.shopId, wantMatch.wantId, wantMatch[which]],
				set: isNew ? again : { rank: sql`excluded.rank` },
				setWhere: isNew ? later : sql`true`
			})
			.returning({ wantId: wantMatch.wantId, at: wantMatch.at, seenAt: wantMatch.seenAt });
		for (const row of known)
			if (!row.seenAt && row.at.getTime() === at.getTime()) added.push(row.wantId);
	}
	return added;
}
