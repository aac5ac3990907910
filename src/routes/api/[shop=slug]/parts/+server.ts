import { readQuestion } from '$lib/find/input';
import { OldStock } from '$lib/parts/input';
import { findParts } from '$lib/server/find';
import { getPart, logOldStock } from '$lib/server/parts';
import { change, read } from '$lib/server/people';

export const GET = read('see', (ctx, { url }) => findParts(ctx, readQuestion(url.searchParams)));

export const POST = change('work', OldStock, async (ctx, input) => {
	const { tag } = await logOldStock(ctx, input);
	return { status: 201, body: await getPart(ctx, tag) };
});
