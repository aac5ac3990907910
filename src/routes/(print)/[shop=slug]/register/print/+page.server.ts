import { getShop, page } from '$lib/server/people';
import { listRegister } from '$lib/server/yard';
import { registerAsked } from '$lib/yard/register-form';
import type { PageServerLoadEvent } from './$types';

const MOST = 1000;

export const load = page('work', async (ctx, { url }: PageServerLoadEvent) => {
	const asked = registerAsked(url.searchParams);
	const { name, slug, currency, timeZone } = await getShop(ctx);
	const { items, next } = await listRegister(ctx, { ...asked, limit: MOST });
	return {
		items,
		asked,
		more: next !== null,
		name,
		slug,
		currency,
		timeZone,
		now: ctx.now.toISOString()
	};
});
