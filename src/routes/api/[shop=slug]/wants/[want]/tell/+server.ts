import { change } from '$lib/server/people';
import { tellWant, wantState } from '$lib/server/wants';
import { TellInput } from '$lib/wants/input';
import type { RequestEvent } from './$types';

export const POST = change('trade', TellInput, async (ctx, input, { params }: RequestEvent) => {
	await tellWant(ctx, params.want, input);
	return { body: await wantState(ctx, params.want) };
});
