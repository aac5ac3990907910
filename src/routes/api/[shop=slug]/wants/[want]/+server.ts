import { change, read } from '$lib/server/people';
import { editWant, getWant, wantState } from '$lib/server/wants';
import { WantEdit } from '$lib/wants/input';
import type { RequestEvent } from './$types';

export const GET = read('trade', (ctx, { params }: RequestEvent) => getWant(ctx, params.want));

export const PATCH = change('trade', WantEdit, async (ctx, input, { params }: RequestEvent) => {
	await editWant(ctx, params.want, input);
	return { body: await wantState(ctx, params.want) };
});
