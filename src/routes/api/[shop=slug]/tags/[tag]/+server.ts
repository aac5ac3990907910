import { NotFound } from '$lib/refusal';
import { getBin } from '$lib/server/bins';
import { getDonor } from '$lib/server/donors';
import { getPart } from '$lib/server/parts';
import { read } from '$lib/server/people';
import { findTag } from '$lib/server/tags';
import type { RequestEvent } from './$types';

export const GET = read('see', async (ctx, { params }: RequestEvent) => {
	const found = await findTag(ctx, params.tag);
	if (!found) throw new NotFound();
	const { what, code } = found;
	if (what === 'part') return { what, code, part: await getPart(ctx, code) };
	if (what === 'bin') return { what, code, bin: await getBin(ctx, code) };
	if (what === 'blank') return { what, code };
	return { what, code, donor: await getDonor(ctx, code) };
});
