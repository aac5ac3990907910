import { BinForm } from '$lib/bins/input';
import { addBin } from '$lib/server/bins';
import { action, page } from '$lib/server/people';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', (_ctx, { params }: PageServerLoadEvent) => ({
	back: { href: `/${params.shop}/bins`, label: 'Bins' }
}));

export const actions = {
	default: action('work', BinForm, async (ctx, input, { params }: RequestEvent) => {
		const { address } = await addBin(ctx, input);
		return { to: `/${params.shop}/bins/${encodeURIComponent(address)}?done=Bin added` };
	})
};
