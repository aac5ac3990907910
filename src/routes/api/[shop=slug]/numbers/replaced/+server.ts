import { Replaced } from '$lib/parts/fits';
import { change } from '$lib/server/people';
import { listReplaced, replaceNumber } from '$lib/server/prices';

export const POST = change('work', Replaced, async (ctx, input) => {
	await replaceNumber(ctx, input);
	return { status: 201, body: { items: await listReplaced(ctx, [input.number]) } };
});
