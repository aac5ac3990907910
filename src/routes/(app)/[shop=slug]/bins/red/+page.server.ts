import { page } from '$lib/server/people';
import { redParts } from '$lib/server/walks';
import type { PageServerLoadEvent } from './$types';

export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => ({
	parts: await redParts(ctx),
	back: { href: `/${params.shop}/bins`, label: 'Bins' }
}));
