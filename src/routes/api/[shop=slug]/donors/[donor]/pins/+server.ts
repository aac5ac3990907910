import { Pin } from '$lib/parts/box/input';
import { listPins, placePin } from '$lib/server/parts';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', async (ctx, { params }: RequestEvent) => ({
	items: await listPins(ctx, params.donor)
}));

export const POST = change('work', Pin, async (ctx, input, { params }: RequestEvent) => {
	const { id } = await placePin(ctx, params.donor, input);
	const pins = await listPins(ctx, params.donor);
	return { status: 201, body: pins.find((one) => one.id === id) };
});
