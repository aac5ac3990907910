import { Answer } from '$lib/walks/input';
import { change } from '$lib/server/people';
import { answerStop } from '$lib/server/walks';
import type { RequestEvent } from './$types';

export const POST = change('work', Answer, async (ctx, input, { params }: RequestEvent) => ({
	body: await answerStop(ctx, Number(params.walk), input)
}));
