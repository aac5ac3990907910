import { AskReading } from '$lib/donors/label-form';
import { askReading, listReadings } from '$lib/server/donors';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', async (ctx, { params }: RequestEvent) => ({
	items: await listReadings(ctx, params.donor)
}));

export const POST = change('work', AskReading, async (ctx, { photo }, event: RequestEvent) => ({
	status: 201,
	body: await askReading(ctx, event.params.donor, photo)
}));
