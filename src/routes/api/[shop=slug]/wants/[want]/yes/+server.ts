import { change } from '$lib/server/people';
import { sayYes, wantState } from '$lib/server/wants';
import { YesInput } from '$lib/wants/input';
import type { RequestEvent } from './$types';

export const POST = change('trade', YesInput, async (ctx, input, { params }: RequestEvent) => {
	await sayYes(ctx, params.want, input);
	return { body: await wantState(ctx, params.want) };
});
