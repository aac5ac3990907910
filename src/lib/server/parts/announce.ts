import type { Context } from '../context';
import type { Tx } from '../db';
import { enqueue } from '../queue/enqueue';

/** A part came in, or more is known of one: rooms to the right hear of it after this transaction, and only then. */
export const announcePart = (
	tx: Tx,
	{ shopId, now }: Context,
	partId: number,
	isNew: boolean
): Promise<void> => enqueue(tx, 'parts.came-in', { shopId, partId, isNew, at: now });
