import { sayNumber } from '$lib/donors/reference';
import { happened, mayUndo, UNDO_DAYS } from '$lib/parts/history';
import { MISTAKE } from '$lib/parts/state';
import type { Happening, PartItem, PartView, ProofView } from '$lib/parts/view';
import type { Verdict } from '$lib/parts/verdict-view';
import { may } from '$lib/people/role';
import { photoLinks } from '$lib/photos/links';
import { kind } from '$lib/trade';
import { and, asc, desc, eq, isNull, ne, or } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { getShop } from '../people';
import { event, member } from '../people/tables';
import { photo } from '../photos/tables';
import { isDoubtful } from './doubt';
import { itemOf, partsByIds, placedParts, type PlacedPart } from './items';
import { partRow } from './row';
import { part, partPhoto, proof } from './tables';
import { nextLike, takenWords } from './taken';
import { partVerdicts } from './verdicts';

const proofsOf = (tx: Tx, ctx: Context, partId: number): Promise<ProofView[]> =>
	tx
		.select({
			how: proof.how,
			figure: proof.figure,
			unit: proof.unit,
			note: proof.note,
			passed: proof.passed,
			by: member.name,
			at: proof.at
		})
		.from(proof)
		.innerJoin(member, and(eq(member.shopId, proof.shopId), eq(member.id, proof.memberId)))
		.where(and(eq(proof.shopId, ctx.shopId), eq(proof.partId, partId)))
		.orderBy(asc(proof.at), asc(proof.id));

async function historyOf(tx: Tx, ctx: Context, partId: number): Promise<Happening[]> {
	const rows = await tx
		.select({ event, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(
			and(eq(event.shopId, ctx.shopId), eq(event.about, 'part'), eq(event.aboutId, partId))
		)
		.orderBy(desc(event.id));
	const since = ctx.now.getTime() - UNDO_DAYS * 24 * 3600 * 1000;
	return rows.map(({ event: { id, at, ...one }, by }, place) => ({
		id,
		at,
		by,
		said: happened(one),
		undo: place === 0 && mayUndo(one.what) && at.getTime() >= since
	}));
}

async function photosOf(tx: Tx, ctx: Context, partId: number, slug: string, alt: string) {
	const rows = await tx
		.select({ id: photo.id })
		.from(partPhoto)
		.innerJoin(photo, and(eq(photo.shopId, partPhoto.shopId), eq(photo.id, partPhoto.photoId)))
		.where(
			and(
				eq(partPhoto.shopId, ctx.shopId),
				eq(partPhoto.partId, partId),
				isNull(photo.deletedAt)
			)
		)
		.orderBy(asc(photo.id));
	return rows.map(({ id }) => ({ id, links: photoLinks(slug, id), alt }));
}

const donorOf = ({ donor }: PlacedPart): PartView['donorOf'] =>
	donor && {
		id: donor.id,
		number: sayNumber(donor.number),
		state: donor.state,
		cause: donor.cause,
		secondCause: donor.secondCause,
		sureness: donor.sureness
	};

function viewOf(ctx: Context, placed: PlacedPart, worth: Verdict | null, slug: string) {
	const { photo: _, ...item } = itemOf(placed, worth, slug);
	const row = placed.part;
	return {
		...item,
		version: row.version,
		system: kind(row.kind).system,
		numbers: row.numbers,
		set: row.set,
		setMissing: row.setMissing,
		checklist: row.checklist,
		massGrams: row.massGrams,
		note: row.note,
		binPlace: placed.bin?.place ?? '',
		inRedBin: placed.bin?.red ?? false,
		donorOf: donorOf(placed),
		heldUntil: row.heldUntil,
		outAs: row.outAs,
		outTo: row.outTo,
		outCents: may(ctx.role, 'see costs') ? row.outCents : null,
		scrapReason: row.scrapReason,
		destroyed: row.destroyed,
		pulledAt: row.pulledAt,
		worth
	};
}

/** One part with everything that is known of it. */
export const getPart = (ctx: Context, tag: string): Promise<PartView> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partRow(tx, ctx, tag);
		const { slug } = await getShop(ctx);
		const [placed] = await placedParts(tx, ctx, [row.id]);
		const worth = (await partVerdicts(ctx, [row.id])).get(row.id) ?? null;
		const like = await nextLike(tx, ctx, row);
		const gone = ['held', 'out', 'missing', 'scrapped'].includes(row.state);
		return {
			...viewOf(ctx, placed!, worth, slug),
			doubtful: await isDoubtful(tx, ctx, row.id),
			proofs: await proofsOf(tx, ctx, row.id),
			photos: await photosOf(tx, ctx, row.id, slug, kind(row.kind).name),
			history: await historyOf(tx, ctx, row.id),
			next: like ? ((await partsByIds(ctx, [like.id]))[0] ?? null) : null,
			taken: gone ? await takenWords(tx, ctx, row) : null
		};
	});

const notMistaken = or(isNull(part.scrapReason), ne(part.scrapReason, MISTAKE));

/** How many parts were logged off a donor. */
export const countDonorParts = (ctx: Context, donorId: number): Promise<number> =>
	inShop(ctx, (tx) =>
		tx.$count(
			part,
			and(eq(part.shopId, ctx.shopId), eq(part.donorId, donorId), notMistaken)
		)
	);

/** The parts logged off a donor, oldest first; what was logged by mistake is left out. */
export const listDonorParts = (ctx: Context, donorId: number): Promise<PartItem[]> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await tx
			.select({ id: part.id })
			.from(part)
			.where(
				and(
					eq(part.shopId, ctx.shopId),
					eq(part.donorId, donorId),
					notMistaken
				)
			)
			.orderBy(asc(part.id));
		return partsByIds(
			ctx,
			rows.map(({ id }) => id)
		);
	});
