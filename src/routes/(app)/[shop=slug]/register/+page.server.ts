import { page } from '$lib/server/people';
import { listRegister } from '$lib/server/yard';
import { registerAsked } from '$lib/yard/register-form';
import type { PageServerLoadEvent } from './$types';

export const load = page('work', async (ctx, { url }: PageServerLoadEvent) => {
	const asked = registerAsked(url.searchParams);
	const { cursor: _, ...narrowed } = asked;
	return {
		...(await listRegister(ctx, asked)),
		asked,
		narrowed: new URLSearchParams(
			Object.entries(narrowed).filter(([, v]) => v) as [string, string][]
		).toString(),
		wide: true
	};
});
