import { SHOT_SAID } from '$lib/donors/shots';
import { sayEngine } from '$lib/donors/reference';
import type { PinnedPhoto, PinView, RulerView } from '$lib/parts/box/view';
import { photoLinks } from '$lib/photos/links';
import { NotFound } from '$lib/refusal';
import { findKind } from '$lib/trade';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow } from '../donors';
import { box, donorPhoto } from '../donors/tables';
import { getShop } from '../people';
import { photo } from '../photos/tables';
import { part, pin, ruler } from './tables';

/** A photo of the donor that was not taken away. */
export async function donorPhotoRow(tx: Tx, ctx: Context, donorId: number, photoId: number) {
	const [row] = await tx
		.select({
			...{ id: photo.id, shot: donorPhoto.shot, takenAt: photo.takenAt },
			...{ width: photo.width, height: photo.height, blur: photo.blur }
		})
		.from(donorPhoto)
		.innerJoin(photo, and(eq(photo.shopId, donorPhoto.shopId), eq(photo.id, donorPhoto.photoId)))
		.where(
			and(
				...[eq(donorPhoto.shopId, ctx.shopId), eq(donorPhoto.donorId, donorId)],
				...[eq(donorPhoto.photoId, photoId), isNull(photo.deletedAt)]
			)
		);
	if (!row) throw new NotFound();
	return row;
}

const partOf = {
	tag: part.tag,
	label: part.label,
	grade: part.grade,
	state: part.state,
	place: sql<string | null>`coalesce(${bin.address}, ${box.tag})`
};

/** The pins on the photos of a donor, by photo and number. */
export async function pinsOf(tx: Tx, ctx: Context, donorId: number): Promise<PinView[]> {
	const rows = await tx
		.select({ pin, tag: part.tag, part: partOf })
		.from(pin)
		.innerJoin(photo, and(eq(photo.shopId, pin.shopId), eq(photo.id, pin.photoId)))
		.leftJoin(part, and(eq(part.shopId, pin.shopId), eq(part.id, pin.partId)))
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
		.leftJoin(box, and(eq(box.shopId, part.shopId), eq(box.id, part.boxId)))
		.where(
			and(
				...[eq(pin.shopId, ctx.shopId), eq(pin.donorId, donorId)],
				...[isNull(pin.removedAt), isNull(photo.deletedAt)]
			)
		)
		.orderBy(asc(pin.photoId), asc(pin.n));
	return rows.map(({ pin: { id, photoId, n, x, y, kind }, tag, part }) => ({
		...{ id, photo: photoId, n, x, y, kind },
		kindName: findKind(kind)?.name ?? kind,
		part: tag === null ? null : (part as PinView['part'])
	}));
}

/** The pins on the photos of a donor. */
export const listPins = (ctx: Context, ref: string): Promise<PinView[]> =>
	inShop(ctx, async (tx, ctx) => pinsOf(tx, ctx, (await donorRow(tx, ctx, ref)).id));

async function rulerOf(tx: Tx, ctx: Context, photoId: number): Promise<RulerView | null> {
	const { x1, y1, x2, y2, mm, said } = ruler;
	const [row] = await tx
		.select({ x1, y1, x2, y2, mm, said })
		.from(ruler)
		.where(and(eq(ruler.shopId, ctx.shopId), eq(ruler.photoId, photoId)));
	return row ?? null;
}

/** One photo of a donor with its pins and its ruler. */
export const getPinnedPhoto = (ctx: Context, ref: string, photoId: number): Promise<PinnedPhoto> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, ref);
		const row = await donorPhotoRow(tx, ctx, donor.id, photoId);
		return {
			...row,
			alt: `${sayEngine(donor)}: ${SHOT_SAID[row.shot]}`,
			links: photoLinks((await getShop(ctx)).slug, row.id),
			pins: (await pinsOf(tx, ctx, donor.id)).filter(({ photo }) => photo === row.id),
			ruler: await rulerOf(tx, ctx, row.id)
		};
	});
