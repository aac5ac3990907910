import { redirect } from '@sveltejs/kit';
import { UndoParts } from '$lib/parts/input';
import { NotFound } from '$lib/refusal';
import { readScan, sayScan } from '$lib/scan/read';
import { getPart, undoParts } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { opens } from '../../../t/opens';
import { inHand, type InHand } from './in-hand';
import type { PageServerLoadEvent } from './$types';

type Ctx = Parameters<typeof getPart>[0];
const MOST = 60;

/** A code typed without scripts leads on to its thing; else what to say about it. */
async function typedCode(ctx: Ctx, shop: string, typed: string): Promise<string> {
	const scan = readScan(typed, shop);
	if (!('tag' in scan)) return sayScan(scan) ?? '';
	const path = await opens(ctx, shop, scan.tag).catch((fault: unknown) => {
		if (fault instanceof NotFound) return null;
		throw fault;
	});
	if (path) redirect(303, path);
	return `No box, part or bin of this shop carries ${scan.tag}.`;
}

/** The parts that an address names; one that is not of this shop is left out. */
async function partsIn(ctx: Ctx, tags: string[]): Promise<InHand[]> {
	const parts: InHand[] = [];
	for (const tag of [...new Set(tags)].slice(0, MOST)) {
		const part = await getPart(ctx, tag).catch((fault: unknown) => {
			if (fault instanceof NotFound) return null;
			throw fault;
		});
		if (part) parts.push(inHand(part));
	}
	return parts;
}

export const load = page('see', async (ctx, { params, url }: PageServerLoadEvent) => {
	const code = url.searchParams.get('code');
	return {
		typed: code ?? '',
		problem: code === null ? '' : await typedCode(ctx, params.shop, code),
		inHand: await partsIn(ctx, url.searchParams.getAll('part')),
		back: { href: `/${params.shop}/parts`, label: 'Find' }
	};
});

export const actions = { undo: action('work', UndoParts, (ctx, input) => undoParts(ctx, input)) };
