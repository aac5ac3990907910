import { BinEditForm } from '$lib/bins/input';
import { editBin, getBin, retireBin } from '$lib/server/bins';
import { firstPhotos } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { z } from 'zod';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => {
	const bin = await getBin(ctx, params.bin);
	const photos = await firstPhotos(
		ctx,
		bin.contents.map((part) => part.tag)
	);
	return { bin, photos, back: { href: `/${params.shop}/bins`, label: 'Bins' }, short: bin.tag };
});

export const actions = {
	edit: action('work', BinEditForm, async (ctx, input, { params }: RequestEvent) => {
		const { address } = await editBin(ctx, params.bin, input);
		return { to: `/${params.shop}/bins/${encodeURIComponent(address)}?done=Saved` };
	}),
	retire: action('work', z.object({}), async (ctx, _input, { params }: RequestEvent) => {
		const { address } = await retireBin(ctx, params.bin);
		const done = `${address} is out of use. It can be used again from the end of this page`;
		return { to: `/${params.shop}/bins?done=${encodeURIComponent(done)}` };
	})
};
