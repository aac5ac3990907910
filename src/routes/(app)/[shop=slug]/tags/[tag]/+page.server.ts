import { redirect } from '@sveltejs/kit';
import { addBox, listDonors } from '$lib/server/donors';
import { action, page } from '$lib/server/people';
import { findTag } from '$lib/server/tags';
import { BoxForm } from '$lib/tags/input';
import { opens } from '../../../../t/opens';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const AT_HAND = 6;

/** The first scan of a blank tag asks what it hangs on; any other tag leads on to its thing. */
export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => {
	const { shop } = params;
	const found = await findTag(ctx, params.tag);
	if (found?.what !== 'blank') redirect(303, await opens(ctx, shop, params.tag));
	const on = async (state: 'on the bench' | 'parked') =>
		(await listDonors(ctx, { state, limit: AT_HAND })).items;
	const donors = [...(await on('on the bench')), ...(await on('parked'))].slice(0, AT_HAND);
	return {
		code: found.code,
		donors: donors.map(({ number, engine, state }) => ({ number, engine, state })),
		back: { href: `/${shop}/scan`, label: 'Scan' },
		short: found.code
	};
});

export const actions = {
	box: action('work', BoxForm, async (ctx, { donor }, { params }: RequestEvent) => {
		const { tag } = await addBox(ctx, donor, params.tag);
		return { to: `/${params.shop}/donors/${tag}?done=${tag}%20is%20on%20its%20box` };
	})
};
