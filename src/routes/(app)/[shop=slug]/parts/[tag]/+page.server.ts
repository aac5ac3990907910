import { Nothing } from '$lib/parts/input';
import { MOVES, whyNot, type Move } from '$lib/parts/state';
import type { PartView } from '$lib/parts/view';
import {
	cleaningFor,
	foundPart,
	freePart,
	getPart,
	listFits,
	listPinsOfPart,
	missPart,
	removedPartPhotos
} from '$lib/server/parts';
import { listReplaced } from '$lib/server/prices';
import { action, page } from '$lib/server/people';
import { partWanted } from '$lib/server/wants';
import { causeSaid, isCauseId, whyChance } from '$lib/trade';
import { benchActions } from './bench';
import { fitActions } from './fits';
import { photoActions } from './photos';
import { after } from './sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const OTHERWISE = ['pull', 'grade', 'edit', 'photo', 'sell'];
const ASKED = (Object.keys(MOVES) as Move[]).filter((move) => !OTHERWISE.includes(move));

export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => {
	const part = await getPart(ctx, params.tag);
	return {
		part,
		open: ASKED.filter((move) => whyNot(move, part) === null),
		causes: causesOf(part),
		cleaning: ['out', 'scrapped'].includes(part.state) ? null : await cleaningFor(ctx, part.tag),
		wanted: await partWanted(ctx, part.id),
		fits: await listFits(ctx, part.tag),
		pins: await listPinsOfPart(ctx, part.tag),
		replaced: await listReplaced(ctx, part.numbers),
		photosAway: await removedPartPhotos(ctx, part.tag),
		back: { href: `/${params.shop}/parts`, label: 'Find' },
		short: part.tag
	};
});

/** What its donor died of, and what that means for this kind where people often get it wrong. */
const causesOf = ({ kind, donorOf }: PartView) =>
	[donorOf?.cause, donorOf?.secondCause].flatMap((id) =>
		id && isCauseId(id) ? [{ said: causeSaid(id), why: whyChance(kind, id) }] : []
	);

export const actions = {
	...fitActions,
	...benchActions,
	free: action('hold', Nothing, async (ctx, _input, event: RequestEvent) =>
		after(event, await freePart(ctx, event.params.tag), 'Freed')
	),
	miss: action('work', Nothing, async (ctx, _input, event: RequestEvent) =>
		after(event, await missPart(ctx, event.params.tag), 'Noted as missing')
	),
	find: action('work', Nothing, async (ctx, _input, event: RequestEvent) =>
		after(event, await foundPart(ctx, event.params.tag), 'Back where it belongs')
	),
	...photoActions
};
