import { NotFound } from '$lib/refusal';
import { getBin } from '$lib/server/bins';
import { getDonor } from '$lib/server/donors';
import { getPart } from '$lib/server/parts';
import { getShop, page } from '$lib/server/people';
import { findTag } from '$lib/server/tags';
import type { Context } from '$lib/server/context';
import { drawQr, scanAddress } from '$lib/tags/qr';
import type { PageServerLoadEvent } from './$types';

interface Printed {
	large: string;
	lines: string[];
	back: string;
}

/** What a tag says beside its code; never whose machine it was. */
async function printed(ctx: Context, what: 'box' | 'part' | 'bin', code: string): Promise<Printed> {
	if (what === 'bin') {
		const { address, purpose, place, red } = await getBin(ctx, code);
		return { large: address, lines: [red ? 'red bin' : purpose, place], back: `bins/${code}` };
	}
	if (what === 'part') {
		const { kindName, label, engine, donor, grade } = await getPart(ctx, code);
		return {
			large: label || kindName,
			lines: [engine, donor ?? 'old stock', grade],
			back: `parts/${code}`
		};
	}
	const { number, engine, causeSaid, sureness } = await getDonor(ctx, code);
	const cause = causeSaid && `${causeSaid}${sureness ? ` (${sureness})` : ''}`;
	return { large: number, lines: [engine, cause], back: `donors/${number}` };
}

export const load = page('see', async (ctx, { params, url }: PageServerLoadEvent) => {
	const found = await findTag(ctx, params.tag);
	if (!found) throw new NotFound('No box, part or bin of this shop carries this tag.');
	const { code, what } = found;
	const { slug, name } = await getShop(ctx);
	const said = await printed(ctx, what, code);
	return {
		...said,
		code,
		what,
		shopName: name,
		lines: said.lines.filter(Boolean),
		back: `/${slug}/${said.back}`,
		qr: drawQr(scanAddress(url.origin, slug, code))
	};
});
