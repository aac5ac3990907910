import { sayEngine, sayNumber } from '$lib/donors/reference';
import type { PartItem } from '$lib/parts/view';
import type { Verdict } from '$lib/parts/verdict-view';
import { photoLinks } from '$lib/photos/links';
import { kind } from '$lib/trade';
import { aliasedTable, and, eq, inArray, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { box, donor } from '../donors/tables';
import { getShop } from '../people';
import { photo } from '../photos/tables';
import { part, partPhoto } from './tables';
import { partVerdicts } from './verdicts';

const boxDonor = aliasedTable(donor, 'box_donor');

const firstPhoto = sql<string | null>`(
	select min(pp.photo_id) from ${partPhoto} pp
	join ${photo} f on f.shop_id = pp.shop_id and f.id = pp.photo_id and f.deleted_at is null
	where pp.shop_id = ${part.shopId} and pp.part_id = ${part.id})`;

/** Parts with the place they lie in and the donor they came off. */
export const placedParts = (tx: Tx, ctx: Context, ids: readonly number[]) =>
	tx
		.select({ part, bin, donor, boxNumber: boxDonor.number, photoId: firstPhoto })
		.from(part)
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
		.leftJoin(box, and(eq(box.shopId, part.shopId), eq(box.id, part.boxId)))
		.leftJoin(boxDonor, and(eq(boxDonor.shopId, box.shopId), eq(boxDonor.id, box.donorId)))
		.leftJoin(donor, and(eq(donor.shopId, part.shopId), eq(donor.id, part.donorId)))
		.where(and(eq(part.shopId, ctx.shopId), inArray(part.id, [...ids])));

export type PlacedPart = Awaited<ReturnType<typeof placedParts>>[number];

export function itemOf(row: PlacedPart, verdict: Verdict | null, slug: string): PartItem {
	const { id, tag, label, grade, state, heldFor, setMissing } = row.part;
	return {
		id,
		tag,
		kind: row.part.kind,
		kindName: kind(row.part.kind).name,
		label,
		grade,
		state,
		bin: row.bin?.address ?? (row.boxNumber === null ? null : `box D${row.boxNumber}`),
		donor: row.donor ? sayNumber(row.donor.number) : null,
		engine: row.donor ? sayEngine(row.donor) : row.part.engine,
		askedCents: verdict?.askedCents ?? null,
		copyCents: verdict?.copyCents ?? null,
		newCents: verdict?.newCents ?? null,
		verdict: verdict?.verdict ?? null,
		gainCents: verdict?.gainCents ?? null,
		photo: row.photoId === null ? null : photoLinks(slug, Number(row.photoId)).thumb,
		heldBy: heldFor,
		setMissing
	};
}

/** Parts as lists show them, in the order of the ids; an id that is not of this shop is left out. */
export const partsByIds = (ctx: Context, ids: readonly number[]): Promise<PartItem[]> =>
	inShop(ctx, async (tx, ctx) => {
		if (ids.length === 0) return [];
		const rows = new Map((await placedParts(tx, ctx, ids)).map((row) => [row.part.id, row]));
		const verdicts = await partVerdicts(ctx, [...rows.keys()]);
		const { slug } = await getShop(ctx);
		return ids.flatMap((id) => {
			const row = rows.get(id);
			return row ? [itemOf(row, verdicts.get(id) ?? null, slug)] : [];
		});
	});
