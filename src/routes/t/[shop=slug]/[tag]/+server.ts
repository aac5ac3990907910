import { error, redirect } from '@sveltejs/kit';
import { getDonor } from '$lib/server/donors';
import { page } from '$lib/server/people';
import { findTag } from '$lib/server/tags';
import type { RequestEvent } from './$types';

/** What a scanned code opens. Codes are printed in upper case; here they are folded. */
export const GET = page('see', async (ctx, { params }: RequestEvent) => {
	const shop = params.shop.toLowerCase();
	const found = await findTag(ctx, params.tag);
	if (!found) error(404, 'No box, part or bin of this shop carries this tag.');
	if (found.what === 'part') redirect(303, `/${shop}/parts/${found.code}`);
	if (found.what === 'bin') redirect(303, `/${shop}/bins/${found.code}`);
	const { number } = await getDonor(ctx, found.code);
	redirect(303, `/${shop}/donors/${number}`);
});
