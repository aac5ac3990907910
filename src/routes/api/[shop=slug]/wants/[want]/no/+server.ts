import { change } from '$lib/server/people';
import { sayNo, wantState } from '$lib/server/wants';
import { Nothing } from '$lib/wants/input';
import type { RequestEvent } from './$types';

export const POST = change('trade', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	await sayNo(ctx, params.want);
	return { body: await wantState(ctx, params.want) };
});
