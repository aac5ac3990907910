import { ageClock } from '$lib/bins/age';
import { BinEditForm, Merge } from '$lib/bins/input';
import type { BinPart } from '$lib/bins/view';
import { plural } from '$lib/format';
import { editBin, getBin, retireBin } from '$lib/server/bins';
import { firstPhotos } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { mergeBins } from '$lib/server/walks';
import { findKind } from '$lib/trade';
import { z } from 'zod';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => {
	const bin = await getBin(ctx, params.bin);
	return {
		bin,
		kindNames: bin.kinds.map((id) => findKind(id)?.name ?? id),
		photos: await firstPhotos(
			ctx,
			bin.contents.map((part) => part.tag)
		),
		ages: agesOf(bin.contents, ctx.now),
		back: { href: `/${params.shop}/bins`, label: 'Bins' },
		short: bin.tag
	};
});

/** How old what ages is, and whether it is time for a look. */
const agesOf = (parts: BinPart[], now: Date) =>
	Object.fromEntries(
		parts.flatMap(({ tag, kind, pulledAt, testedAt }) => {
			const clock = ageClock(kind, pulledAt, testedAt, now);
			return clock ? [[tag, `${clock.said} old${clock.due ? ': look at it again' : ''}`]] : [];
		})
	);

const said = (done: string, undo: number) => `done=${encodeURIComponent(done)}&undo=${undo}`;

export const actions = {
	edit: action('work', BinEditForm, async (ctx, input, { params }: RequestEvent) => {
		const { tag, history } = await editBin(ctx, params.bin, input);
		return { to: `/${params.shop}/bins/${tag}?${said('Saved', history[0]!.id)}` };
	}),
	merge: action('work', Merge, async (ctx, input, { params }: RequestEvent) => {
		const { address, moved, eventId } = await mergeBins(ctx, params.bin, input);
		const done = `${plural(moved, 'part', 'parts')} moved to ${address}`;
		return {
			to: `/${params.shop}/bins/${encodeURIComponent(address)}?${said(done, eventId)}`
		};
	}),
	retire: action('work', z.object({}), async (ctx, _input, { params }: RequestEvent) => {
		const { address, eventId } = await retireBin(ctx, params.bin);
		return { to: `/${params.shop}/bins?${said(`${address} is out of use`, eventId)}` };
	})
};
