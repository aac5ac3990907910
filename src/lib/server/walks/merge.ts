import type { Merge } from '$lib/bins/input';
import { NotFound, Refused } from '$lib/refusal';
import { and, asc, eq, notInArray } from 'drizzle-orm';
import { binEvent, findPlace, recordUndone, undoBin, useBinAgain, type BinRow } from '../bins';
import { bin } from '../bins/tables';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { movePart, rehomePart, undoPart } from '../parts';
import { part } from '../parts/tables';
import { allow, record } from '../people';

/** Both bins, locked in the order of their numbers, so that two merges cannot wait for each other. */
async function both(tx: Tx, ctx: Context, from: string, into: string): Promise<[BinRow, BinRow]> {
	const a = await findPlace(tx, ctx, from);
	if (!a) throw new NotFound();
	const b = await findPlace(tx, ctx, into);
	if (!b)
		throw new Refused('bad input', `There is no bin ${into}. Type an address like K3-1.`, 'into');
	if (a.id === b.id)
		throw new Refused(
			'bad input',
			`This is ${a.address}. Type the address of another bin.`,
			'into'
		);
	if (a.red !== b.red)
		throw new Refused(
			'gate',
			'What is in a red bin stays in a red bin, and nothing else goes there.',
			'into'
		);
	for (const tag of a.id < b.id ? [a.tag, b.tag] : [b.tag, a.tag])
		if (!(await findPlace(tx, ctx, tag, 'no key update')))
			throw new Refused('taken', 'One of them was merged or taken out of use meanwhile.', 'into');
	return [a, b];
}

const inside = (tx: Tx, ctx: Context, binId: number) =>
	tx
		.select({ tag: part.tag, state: part.state })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				eq(part.binId, binId),
				notInArray(part.state, ['out', 'scrapped'])
			)
		)
		.orderBy(asc(part.id));

/** Everything in one bin moves into another, each part with its own event; the emptied bin is taken out of use. */
export const mergeBins = (
	ctx: Context,
	from: string,
	input: Merge
): Promise<{ address: string; moved: number; eventId: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const [a, b] = await both(tx, ctx, from, input.into);
		const moves: number[] = [];
		for (const { tag, state } of await inside(tx, ctx, a.id)) {
			const done =
				state === 'missing'
					? await rehomePart(ctx, tag, b.tag)
					: await movePart(ctx, tag, { bin: b.tag });
			moves.push(done.eventId);
		}
		await tx
			.update(bin)
			.set({ retiredAt: ctx.now, version: a.version + 1 })
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, a.id)));
		const eventId = await record(tx, ctx, {
			...{ about: 'bin', aboutId: a.id, what: 'merged', fromState: 'in use', toState: 'retired' },
			detail: { to: b.address, moves }
		});
		return { address: b.address, moved: moves.length, eventId };
	});

/** The bin is in use again and takes back its parts; refused where one of them was moved on since. */
async function unmerge(tx: Tx, ctx: Context, eventId: number): Promise<boolean> {
	const undone = await binEvent(tx, ctx, eventId);
	if (undone?.what !== 'merged') return false;
	const [row] = await tx
		.select({ tag: bin.tag })
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, undone.aboutId)));
	await useBinAgain(ctx, row!.tag);
	for (const move of (undone.detail.moves as number[]).toReversed()) await undoPart(ctx, move);
	await recordUndone(tx, ctx, undone);
	return true;
}

/** Takes back the newest change of a bin. False: the event is not about a bin. */
export const undoBinChange = (ctx: Context, eventId: number): Promise<boolean> =>
	inShop(ctx, async (tx, ctx) => {
		if (!(await binEvent(tx, ctx, eventId))) return false;
		if (!(await unmerge(tx, ctx, eventId))) await undoBin(ctx, eventId);
		return true;
	});
