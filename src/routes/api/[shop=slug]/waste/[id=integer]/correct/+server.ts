import { change } from '$lib/server/people';
import { correctWaste, listWaste } from '$lib/server/yard';
import { z } from 'zod';
import type { RequestEvent } from './$types';

export const POST = change('work', z.object({}), async (ctx, _input, { params }: RequestEvent) => {
	await correctWaste(ctx, Number(params.id));
	return { body: await listWaste(ctx) };
});
