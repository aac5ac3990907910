import { sayNumber } from '$lib/donors/reference';
import type { PinOnPhoto } from '$lib/parts/box/view';
import { photoLinks } from '$lib/photos/links';
import { and, asc, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { donor, donorPhoto } from '../donors/tables';
import { getShop } from '../people';
import { photo } from '../photos/tables';
import { partRow } from './row';
import { pin } from './tables';

/** Where a part is pinned on the photos of its donor. */
export const listPinsOfPart = (ctx: Context, tag: string): Promise<PinOnPhoto[]> =>
	inShop(ctx, async (tx, ctx) => {
		const { id } = await partRow(tx, ctx, tag);
		const { slug } = await getShop(ctx);
		const rows = await tx
			.select({ n: pin.n, photo: pin.photoId, shot: donorPhoto.shot, number: donor.number })
			.from(pin)
			.innerJoin(donor, and(eq(donor.shopId, pin.shopId), eq(donor.id, pin.donorId)))
			.innerJoin(photo, and(eq(photo.shopId, pin.shopId), eq(photo.id, pin.photoId)))
			.innerJoin(
				donorPhoto,
				and(
					...[eq(donorPhoto.shopId, pin.shopId), eq(donorPhoto.donorId, pin.donorId)],
					eq(donorPhoto.photoId, pin.photoId)
				)
			)
			.where(
				and(
					...[eq(pin.shopId, ctx.shopId), eq(pin.partId, id)],
					...[isNull(pin.removedAt), isNull(photo.deletedAt)]
				)
			)
			.orderBy(asc(pin.photoId), asc(pin.n));
		return rows.map(({ n, photo, shot, number }) => ({
			...{ n, photo, shot },
			donor: sayNumber(number),
			thumb: photoLinks(slug, photo).thumb
		}));
	});
