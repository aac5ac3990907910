import { causeOptions } from '$lib/donors/options';
import { askedIn } from '$lib/parts/calculation';
import { GRADES } from '$lib/parts/words';
import { workOut } from '$lib/server/parts';
import { getShop, page } from '$lib/server/people';
import { kind, kinds } from '$lib/trade';
import type { PageServerLoadEvent } from './$types';

const kindOptions = kinds.map(({ id, name, system }) => ({
	value: id,
	label: name,
	group: system
}));

export const load = page('see terms', async (ctx, { url, params }: PageServerLoadEvent) => {
	const { currency } = await getShop(ctx);
	const { asked, problems } = askedIn(url.searchParams, currency);
	return {
		typed: Object.fromEntries(url.searchParams),
		problems,
		asked,
		kindName: asked && kind(asked.kind).name,
		verdict: asked && (await workOut(ctx, asked)),
		kinds: kindOptions,
		causes: causeOptions,
		grades: GRADES.map((value) => ({ value, label: value })),
		back: { href: `/${params.shop}/people`, label: 'More' },
		wide: true
	};
});
