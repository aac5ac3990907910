import { NotFound } from '$lib/refusal';
import { getDonor } from '$lib/server/donors';
import { findTag } from '$lib/server/tags';

type Ctx = Parameters<typeof findTag>[0];

/** What a tag opens in its shop: the page of the part, the bin or the donor; a blank one asks what it hangs on. */
export async function opens(ctx: Ctx, shop: string, typed: string): Promise<string> {
	const found = await findTag(ctx, typed);
	if (!found) throw new NotFound('No box, part or bin of this shop carries this tag.');
	const { what, code } = found;
	if (what === 'part') return `/${shop}/parts/${code}`;
	if (what === 'bin') return `/${shop}/bins/${code}`;
	if (what === 'blank') return `/${shop}/tags/${code}`;
	return `/${shop}/donors/${(await getDonor(ctx, code)).number}`;
}
