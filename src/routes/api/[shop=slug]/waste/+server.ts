import { change, read } from '$lib/server/people';
import { addWaste, listWaste } from '$lib/server/yard';
import { WasteEntry } from '$lib/yard/input';

export const GET = read('work', (ctx) => listWaste(ctx));

export const POST = change('work', WasteEntry, async (ctx, input) => ({
	status: 201,
	body: await addWaste(ctx, input)
}));
