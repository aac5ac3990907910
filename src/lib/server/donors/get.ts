import { dayIn } from '$lib/donors/day';
import { gatesShut } from '$lib/donors/state';
import { SHOT_SAID } from '$lib/donors/shots';
import type { DonorPhotoView, DonorView, ReleaseView } from '$lib/donors/view';
import { may } from '$lib/people/role';
import { photoLinks } from '$lib/photos/links';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { getShop } from '../people';
import { member } from '../people/tables';
import { around, type Around } from './around';
import { donorEvents } from './history';
import { donorItem } from './item';
import { donorParts } from './parts-of';
import { donorRow, type DonorRow, type ReleaseRow } from './rows';

async function releaseView(tx: Tx, ctx: Context, row: ReleaseRow): Promise<ReleaseView> {
	const [who] = await tx
		.select({ name: member.name })
		.from(member)
		.where(and(eq(member.shopId, ctx.shopId), eq(member.id, row.memberId)));
	const { route, document, on, holdUntil } = row;
	return { route, document, on, holdUntil, by: who?.name ?? '' };
}

const photoViews = (near: Around, engine: string, slug: string): DonorPhotoView[] =>
	near.photos.map(({ id, shot, blur }) => ({
		id,
		shot,
		blur,
		alt: `${engine}: ${SHOT_SAID[shot]}`,
		links: photoLinks(slug, id)
	}));

const identity = (row: DonorRow) => ({
	maker: row.maker,
	model: row.model,
	typeCode: row.typeCode,
	dateCode: row.dateCode,
	serial: row.serial,
	emissionFamily: row.emissionFamily,
	displacementCc: row.displacementCc,
	shaft: row.shaft,
	fittings: row.fittings,
	secondCause: row.secondCause,
	safeTicks: row.safeTicks,
	note: row.note,
	strippedAt: row.strippedAt?.toISOString() ?? null,
	version: row.version
});

/** One donor with its boxes, photos, release, what is still to do, its parts and its history. */
export const getDonor = (ctx: Context, ref: string): Promise<DonorView> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await donorRow(tx, ctx, ref);
		const near = await around(tx, ctx, [row.id]);
		const { slug, timeZone } = await getShop(ctx);
		const today = dayIn(timeZone, ctx.now);
		const item = donorItem(row, near, slug, today);
		const release = near.releases.get(row.id) ?? null;
		return {
			...item,
			...identity(row),
			...(may(ctx.role, 'see costs') ? { paidCents: row.paidCents } : {}),
			boxes: near.boxes.map(({ tag }) => ({ tag })),
			photos: photoViews(near, item.engine, slug),
			release: release && (await releaseView(tx, ctx, release)),
			gates: gatesShut(row, release, today),
			parts: await donorParts(tx, ctx, row.id),
			events: await donorEvents(tx, ctx, row.id)
		};
	});
