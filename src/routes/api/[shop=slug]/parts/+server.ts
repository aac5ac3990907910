import { OldStock } from '$lib/parts/input';
import { getPart, logOldStock } from '$lib/server/parts';
import { change } from '$lib/server/people';

export const POST = change('work', OldStock, async (ctx, input) => {
	const { tag } = await logOldStock(ctx, input);
	return { status: 201, body: await getPart(ctx, tag) };
});
