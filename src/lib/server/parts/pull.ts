import type { Pull } from '$lib/parts/input';
import { inShop, type Context } from '../context';
import { pullableDonor } from '../donors';
import { allow } from '../people';
import type { KeptPhoto } from '../photos';
import { logPart, type Logged } from './log-part';

/** Takes a part off a donor on the bench, or off a parked one whose release is in order, and logs it. */
export const pullPart = (
	ctx: Context,
	donorRef: string,
	input: Pull,
	kept: readonly KeptPhoto[] = []
): Promise<Logged> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await pullableDonor(tx, ctx, donorRef);
		return logPart(tx, ctx, input, { donor, engine: '', kept });
	});
