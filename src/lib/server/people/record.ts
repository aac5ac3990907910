import type { Context } from '../context';
import type { Tx } from '../db';
import { event } from './tables';

export interface Happening {
	about:
		'part' | 'donor' | 'bin' | 'price' | 'shop' | 'member' | 'photo' | 'customer' | 'want' | 'walk';
	aboutId: number;
	what: string;
	fromState?: string | null;
	toState?: string | null;
	detail?: Record<string, unknown>;
}

/** Writes who did what, in the transaction of the change itself. Returns the event's number. */
export async function record(tx: Tx, ctx: Context, happening: Happening): Promise<number> {
	const [row] = await tx
		.insert(event)
		.values({
			shopId: ctx.shopId,
			at: ctx.now,
			memberId: ctx.memberId,
			detail: {},
			...happening
		})
		.returning({ id: event.id });
	return row!.id;
}
