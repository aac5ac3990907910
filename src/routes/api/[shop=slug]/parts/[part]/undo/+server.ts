import { UndoPart } from '$lib/parts/input';
import { NotFound } from '$lib/refusal';
import { getPart, undoPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', UndoPart, async (ctx, { event }, { params }: RequestEvent) => {
	const { tag } = await getPart(ctx, params.part);
	const undone = await undoPart(ctx, event);
	if (undone.tag !== tag) throw new NotFound();
	return { body: await getPart(ctx, tag) };
});
