import { BinInput } from '$lib/bins/input';
import { addBin, listBins } from '$lib/server/bins';
import { change, read } from '$lib/server/people';

export const GET = read('see', async (ctx) => ({ items: await listBins(ctx) }));

export const POST = change('work', BinInput, async (ctx, input) => ({
	status: 201,
	body: await addBin(ctx, input)
}));
