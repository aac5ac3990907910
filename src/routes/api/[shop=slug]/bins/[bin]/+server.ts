import { BinEdit } from '$lib/bins/input';
import { editBin, getBin } from '$lib/server/bins';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('see', (ctx, { params }) => getBin(ctx, params.bin));

export const PATCH = change('work', BinEdit, async (ctx, input, { params }: RequestEvent) => ({
	body: await editBin(ctx, params.bin, input)
}));
