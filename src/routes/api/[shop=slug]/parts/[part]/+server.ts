import { Edit } from '$lib/parts/input';
import { editPart, getPart } from '$lib/server/parts';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('see', (ctx, { params }) => getPart(ctx, params.part));

export const PATCH = change('work', Edit, async (ctx, input, { params }: RequestEvent) => {
	await editPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
