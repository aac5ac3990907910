import type { Template, TemplateName, Values } from '$lib/customers/templates';
import { written } from '$lib/customers/templates';
import { money } from '$lib/format';
import { findKind } from '$lib/trade';
import { kindSaid, whatSaid } from '$lib/wants/asks';
import { wantSaid } from '$lib/wants/state';
import type { Context } from '../context';
import { templateFor } from '../customers';
import type { Tx } from '../db';
import { kindVerdicts } from '../parts';
import { getShop } from '../people';
import type { LiveMatch } from './matches';
import type { WantRow } from './rows';

interface Who {
	name: string;
	kind: 'customer' | 'neighbour shop';
}

/** What the law of the house is for kinds that are not for everybody. */
function termsOf(kind: string, who: Who): string {
	const reuse = findKind(kind)?.reuse;
	if (reuse === 'safety-own')
		return 'This kind we only fit ourselves; we do not hand it out loose.';
	if (reuse === 'safety-trade' && who.kind === 'customer')
		return 'This kind we fit ourselves or give to a repair business.';
	return '';
}

const lower = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);

/** What the counter asks for it; for one still on its donor, as if it were off and passed its test. */
async function askedFor(ctx: Context, { part, donor }: LiveMatch, kind: string) {
	if (part) return part.askedCents;
	return donor && ((await kindVerdicts(ctx, donor.id, [kind])).get(kind)?.askedCents ?? null);
}

async function valuesOf(ctx: Context, row: WantRow, who: Who, match: LiveMatch): Promise<Values> {
	const shop = await getShop(ctx);
	const kind = match.part?.kind ?? row.kind;
	const asked = await askedFor(ctx, match, kind);
	return {
		name: who.name,
		wanted: lower(whatSaid(row)),
		part: lower(kindSaid(kind)),
		engine: match.part?.engine || match.donor?.engine || 'an engine of ours',
		grade: match.part?.grade ?? 'not tested yet',
		price: asked === null ? '' : `We ask ${money(asked, shop.currency)} for it.`,
		terms: termsOf(kind, who),
		want: wantSaid(row.number),
		shop: shop.name
	};
}

/** What somebody is told of what came in, in the shop's words. */
export async function letterFor(
	tx: Tx,
	ctx: Context,
	row: WantRow,
	who: Who,
	match: LiveMatch
): Promise<Template> {
	const name: TemplateName = match.part ? 'part' : 'donor';
	return written(await templateFor(tx, ctx, name), await valuesOf(ctx, row, who, match));
}
