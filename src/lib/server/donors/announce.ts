import type { Context } from '../context';
import type { Tx } from '../db';
import { enqueue } from '../queue/enqueue';
import type { DonorRow } from './rows';

/** A donor came in, or more is known of one: rooms to the right hear of it after this transaction, and only then. */
export const announceDonor = (
	tx: Tx,
	{ shopId, now }: Context,
	donorId: number,
	isNew: boolean
): Promise<void> => enqueue(tx, 'donors.came-in', { shopId, donorId, isNew, at: now });

const CARRIES = ['engineKey', 'searchWords', 'engineClass', 'fittings', 'cause', 'secondCause'];

/** Whether what was written says something of what it carries. */
export const saysWhatItCarries = (written: Partial<DonorRow>): boolean =>
	CARRIES.some((field) => field in written);
