import type { MoveInput } from '$lib/donors/input';
import type { Context } from '$lib/server/context';
import type { RequestEvent } from './$types';

/** Back to the donor, saying what was done. */
export const back = ({ params }: RequestEvent, done: string, more = '') => ({
	to: `/${params.shop}/donors/${params.donor}?done=${encodeURIComponent(done)}${more}`
});

/** One step on the donor's way, then back to its page, where it can be undone. */
export const moved =
	(verb: (ctx: Context, ref: string, input: MoveInput) => Promise<unknown>, done: string) =>
	async (ctx: Context, input: MoveInput, event: RequestEvent) => {
		const made = await verb(ctx, event.params.donor, input);
		return back(event, done, typeof made === 'number' ? `&undo=${made}` : '');
	};
