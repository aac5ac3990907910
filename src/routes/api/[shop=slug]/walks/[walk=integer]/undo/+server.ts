import { Stop } from '$lib/walks/input';
import { change } from '$lib/server/people';
import { takeBackAnswer } from '$lib/server/walks';
import type { RequestEvent } from './$types';

export const POST = change('work', Stop, async (ctx, input, { params }: RequestEvent) => ({
	body: await takeBackAnswer(ctx, Number(params.walk), input)
}));
