import { LEAST_APART, measureLine, readLength, rulerLength } from '$lib/parts/box/ruler';
import { apart } from '$lib/parts/box/geometry';
import type { MeasureInput, RulerInput } from '$lib/parts/box/input';
import { sayNumber } from '$lib/donors/reference';
import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow } from '../donors';
import { allow, getShop, record } from '../people';
import { donorPhotoRow } from './pinned-photo';
import { changePart, partFor, type Done } from './row';
import { ruler } from './tables';

type RulerRow = typeof ruler.$inferSelect;
type Ends = Pick<RulerInput, 'x1' | 'y1' | 'x2' | 'y2'>;

const points = ({ x1, y1, x2, y2 }: Ends) =>
	[
		{ x: x1, y: y1 },
		{ x: x2, y: y2 }
	] as const;
const tall = ({ width, height }: { width: number; height: number }) => height / width;

/** What can be put back of a ruler. */
export const standing = ({ x1, y1, x2, y2, mm, said }: RulerRow) => ({ x1, y1, x2, y2, mm, said });

export async function rulerRow(tx: Tx, ctx: Context, photoId: number): Promise<RulerRow | null> {
	const [row] = await tx
		.select()
		.from(ruler)
		.where(and(eq(ruler.shopId, ctx.shopId), eq(ruler.photoId, photoId)));
	return row ?? null;
}

/** Lays a ruler on a photo: two points and the length between them, as typed. Replaces the one that was there. */
export const setRuler = (
	ctx: Context,
	ref: string,
	photoId: number,
	{ length, ...ends }: RulerInput
): Promise<{ eventId: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const { id: donorId } = await donorRow(tx, ctx, ref, { lock: true });
		const photo = await donorPhotoRow(tx, ctx, donorId, photoId);
		const read = rulerLength(length, (await getShop(ctx)).units);
		if ('problem' in read) throw new Refused('bad input', read.problem, 'length');
		if (apart(...points(ends), tall(photo)) < LEAST_APART)
			throw new Refused('bad input', 'Set the two points farther apart.', 'length');
		const before = await rulerRow(tx, ctx, photoId);
		const set = { ...ends, mm: read.mm, said: length };
		const row = {
			shopId: ctx.shopId,
			donorId,
			photoId,
			...set,
			memberId: ctx.memberId,
			at: ctx.now
		};
		await tx
			.insert(ruler)
			.values(row)
			.onConflictDoUpdate({ target: [ruler.shopId, ruler.photoId], set: row });
		const detail = { photo: photoId, before: before && standing(before), after: set, said: length };
		const what = 'set the ruler on a photo';
		return { eventId: await record(tx, ctx, { about: 'donor', aboutId: donorId, what, detail }) };
	});

/** Notes a length measured on a photo on a part of the donor; its words find it from then on. */
export const noteMeasure = (
	ctx: Context,
	ref: string,
	photoId: number,
	input: MeasureInput
): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await donorRow(tx, ctx, ref);
		const photo = await donorPhotoRow(tx, ctx, donor.id, photoId);
		const row = await partFor(tx, ctx, input.part, 'edit');
		if (row.donorId !== donor.id)
			throw new Refused(
				'bad input',
				`${row.tag} is not off ${sayNumber(donor.number)}. Choose another.`,
				'part'
			);
		const scale = await rulerRow(tx, ctx, photoId);
		const [a, b] = points(input);
		const laid = scale && points(scale);
		const read =
			scale && laid && readLength({ from: laid[0], to: laid[1], mm: scale.mm }, a, b, tall(photo));
		if (!read) throw new Refused('gate', 'Set the ruler on this photo first.');
		if (apart(a, b, tall(photo)) < LEAST_APART)
			throw new Refused('bad input', 'Set the two points farther apart.', 'what');
		const line = measureLine(input.what, read, input.as ?? null);
		const note = [row.note, line].filter(Boolean).join('\n');
		if (note.length > 1000)
			throw new Refused('bad input', 'The note of this part is full. Shorten it first.', 'part');
		const detail = { changed: [`measured ${line}`], photo: photoId, ends: [a, b] };
		return changePart(tx, ctx, row, 'edit', { note }, detail);
	});
