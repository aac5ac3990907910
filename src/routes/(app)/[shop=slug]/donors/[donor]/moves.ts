import { MoveInput } from '$lib/donors/input';
import { finishDonor, parkDonor, reopenDonor, stripDonor } from '$lib/server/donors';
import { action } from '$lib/server/people';
import type { RequestEvent } from './$types';

/** Back to the donor, saying what was done. */
export const back = ({ params }: RequestEvent, done: string, more = '') => ({
	to: `/${params.shop}/donors/${params.donor}?done=${encodeURIComponent(done)}${more}`
});

const move = (verb: typeof stripDonor, done: string) =>
	action('work', MoveInput, async (ctx, input, event: RequestEvent) => {
		await verb(ctx, event.params.donor, input);
		return back(event, done);
	});

export const moves = {
	strip: move(stripDonor, 'On the bench'),
	park: move(parkDonor, 'Parked'),
	finish: move(finishDonor, 'Stripped'),
	reopen: move(reopenDonor, 'Reopened')
};
