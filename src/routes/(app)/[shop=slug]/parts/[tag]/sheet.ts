import { whyNot, type Move } from '$lib/parts/state';
import { getPart } from '$lib/server/parts';

type Ctx = Parameters<typeof getPart>[0];
interface Event {
	params: { shop: string; tag: string };
}

/** What every page about one change of a part shows: the part, and why the change is shut, if it is. */
export async function loadSheet(ctx: Ctx, { params }: Event, move: Move) {
	const part = await getPart(ctx, params.tag);
	const no = whyNot(move, part);
	return {
		part,
		shut: no && (no.code === 'taken' ? (part.taken ?? no.said) : no.said),
		back: { href: `/${params.shop}/parts/${part.tag}`, label: part.kindName },
		short: part.tag
	};
}

/** Back to the part, saying what was done and offering to undo it. */
export function after({ params }: Event, done: { tag: string; eventId?: number }, said: string) {
	const undo = done.eventId === undefined ? '' : `&undo=${done.eventId}`;
	return { to: `/${params.shop}/parts/${done.tag}?done=${encodeURIComponent(said)}${undo}` };
}
