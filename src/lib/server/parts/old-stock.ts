import type { OldStock } from '$lib/parts/input';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import type { KeptPhoto } from '../photos';
import { logPart, type Logged } from './log-part';

/** Logs a part from before: no donor, cause unknown, it says itself which engine it fits. */
export const logOldStock = (
	ctx: Context,
	{ engine, ...input }: OldStock,
	kept: readonly KeptPhoto[] = []
): Promise<Logged> =>
	inShop(ctx, (tx, ctx) => {
		allow(ctx, 'work');
		return logPart(tx, ctx, input, { donor: null, engine: engine ?? '', kept });
	});
