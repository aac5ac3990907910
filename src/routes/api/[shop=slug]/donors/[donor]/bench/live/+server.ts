import { changeStream } from '$lib/server/http/stream';
import { watchBench } from '$lib/server/parts';
import { read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('work', async (ctx, { params }) =>
	changeStream(await watchBench(ctx, params.donor))
);
