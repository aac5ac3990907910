import { may, type Ability } from '$lib/people/role';
import { getShop, page } from '$lib/server/people';
import { countFresh } from '$lib/server/wants';

const ABILITIES: Ability[] = ['see', 'see terms', 'see costs', 'work', 'hold', 'trade', 'run'];

export const load = page('see', async (ctx, { locals, cookies, url }) => {
	const shop = await getShop(ctx);
	return {
		shop,
		me: { person: locals.person?.id ?? '', name: locals.person?.name ?? '', role: ctx.role },
		may: Object.fromEntries(ABILITIES.map((one) => [one, may(ctx.role, one)])) as Record<
			Ability,
			boolean
		>,
		fresh: { wants: may(ctx.role, 'trade') ? await countFresh(ctx) : 0 },
		severalShops: locals.shops.length > 1,
		theme: cookies.get('theme') ?? 'system',
		done: url.searchParams.get('done'),
		undo: url.searchParams.get('undo')
	};
});
