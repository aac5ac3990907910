import type { MeasureInput, RulerInput, Seen } from '$lib/parts/box/input';
import { plural } from '$lib/format';
import type { Context } from '$lib/server/context';
import { noteMeasure, pullSeen, setRuler } from '$lib/server/parts';
import { kind } from '$lib/trade';
import type { RequestEvent } from './$types';

export const idOf = ({ params }: RequestEvent) => Number(params.photo);

/** Back to the photo, saying what was done, with what takes it back. */
export const shown = ({ url }: RequestEvent, done: string, undo: readonly number[] = []) => ({
	to: `${url.pathname}?done=${encodeURIComponent(done)}${undo.length ? `&undo=${undo.join(',')}` : ''}`
});

/** All that was ticked, and the tags that are to be written on them. */
export async function logSeen(ctx: Context, input: Seen, event: RequestEvent) {
	const logged = await pullSeen(ctx, event.params.donor, input);
	const tags = logged.map(({ tag }, at) => `${tag} ${kind(input.kinds[at]!.kind).name}`);
	const said = `${plural(logged.length, 'part logged', 'parts logged')}: ${tags.join(', ')}`;
	return shown(
		event,
		said,
		logged.map(({ eventId }) => eventId)
	);
}

export async function layRuler(ctx: Context, input: RulerInput, event: RequestEvent) {
	const { eventId } = await setRuler(ctx, event.params.donor, idOf(event), input);
	return shown(event, `Ruler set: ${input.length}`, [eventId]);
}

export async function measured(ctx: Context, input: MeasureInput, event: RequestEvent) {
	const { tag, eventId } = await noteMeasure(ctx, event.params.donor, idOf(event), input);
	return shown(event, `Noted on ${tag}: ${input.what}`, [eventId]);
}
