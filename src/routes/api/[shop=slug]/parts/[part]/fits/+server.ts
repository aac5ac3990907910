import { FitNote } from '$lib/parts/fits';
import { listFits, noteFit } from '$lib/server/parts';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', async (ctx, { params }: RequestEvent) => ({
	items: await listFits(ctx, params.part)
}));

export const POST = change('work', FitNote, async (ctx, input, { params }: RequestEvent) => {
	await noteFit(ctx, params.part, input);
	return { status: 201, body: { items: await listFits(ctx, params.part) } };
});
