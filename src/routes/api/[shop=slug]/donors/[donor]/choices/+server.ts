import { ChoiceFigures } from '$lib/parts/choices-form';
import { choicesFor } from '$lib/server/parts';
import { read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', (ctx, { params, url }: RequestEvent) =>
	choicesFor(ctx, params.donor, ChoiceFigures.parse(Object.fromEntries(url.searchParams)))
);
