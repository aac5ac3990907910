import { change } from '$lib/server/people';
import { closeWant, wantState } from '$lib/server/wants';
import { Nothing } from '$lib/wants/input';
import type { RequestEvent } from './$types';

export const POST = change('trade', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	await closeWant(ctx, params.want);
	return { body: await wantState(ctx, params.want) };
});
