import { read } from '$lib/server/people';
import { getWalk } from '$lib/server/walks';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('see', (ctx, { params, url }) => {
	const at = Number(url.searchParams.get('at') ?? Number.NaN);
	return getWalk(ctx, Number(params.walk), Number.isInteger(at) ? at : undefined);
});
