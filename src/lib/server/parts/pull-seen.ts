import { sayNumber } from '$lib/donors/reference';
import type { Seen } from '$lib/parts/box/input';
import { Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import { inShop, type Context } from '../context';
import { pullableDonor } from '../donors';
import { allow } from '../people';
import { logPart, type Logged } from './log-part';
import { kindsThere } from './still-on';

/** The kinds seen on a photo become parts in one go: all of them, or none. */
export const pullSeen = (ctx: Context, ref: string, input: Seen): Promise<Logged[]> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await pullableDonor(tx, ctx, ref);
		const there = new Set((await kindsThere(tx, ctx, donor)).map(({ id }) => id));
		const seen = new Map(input.kinds.map((one) => [one.kind, one]));
		const gone = [...seen.keys()].filter((id) => !there.has(id)).map((id) => kind(id).name);
		if (gone.length > 0)
			throw new Refused(
				'taken',
				`Not on ${sayNumber(donor.number)} any more: ${gone.join(', ')}. Take the tick away, or log it by itself.`,
				'kinds'
			);
		const logged: Logged[] = [];
		for (const one of seen.values()) {
			const { bin } = input;
			logged.push(await logPart(tx, ctx, { ...one, bin }, { donor, engine: '' }));
		}
		return logged;
	});
