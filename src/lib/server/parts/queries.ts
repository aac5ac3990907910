import { ageClock } from '$lib/bins/age';
import { sayNumber } from '$lib/donors/reference';
import type { PartView } from '$lib/parts/view';
import type { Verdict } from '$lib/parts/verdict-view';
import { may } from '$lib/people/role';
import { kind } from '$lib/trade';
import { inShop, type Context } from '../context';
import { getShop } from '../people';
import { historyOf, photosOf, proofsOf } from './around';
import { isDoubtful } from './doubt';
import { itemOf, partsByIds, placedParts, type PlacedPart } from './items';
import { partRow } from './row';
import { nextLike, takenWords } from './taken';
import { partVerdicts } from './verdicts';

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

/** Its age clock; a passed test puts off the next look. */
function ageOf(ctx: Context, row: { kind: string; pulledAt: Date }, proofs: PartView['proofs']) {
	const tested = proofs.findLast((one) => one.passed)?.at ?? null;
	return ageClock(row.kind, row.pulledAt, tested, ctx.now);
}

/** One part with everything that is known of it. */
export const getPart = (ctx: Context, tag: string): Promise<PartView> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partRow(tx, ctx, tag);
		const { slug } = await getShop(ctx);
		const [placed] = await placedParts(tx, ctx, [row.id]);
		const worth = (await partVerdicts(ctx, [row.id])).get(row.id) ?? null;
		const like = await nextLike(tx, ctx, row);
		const proofs = await proofsOf(tx, ctx, row.id);
		const gone = ['held', 'out', 'missing', 'scrapped'].includes(row.state);
		return {
			...viewOf(ctx, placed!, worth, slug),
			doubtful: await isDoubtful(tx, ctx, row.id),
			proofs,
			age: ageOf(ctx, row, proofs),
			photos: await photosOf(tx, ctx, row.id, slug, kind(row.kind).name),
			history: await historyOf(tx, ctx, row.id),
			next: like ? ((await partsByIds(ctx, [like.id]))[0] ?? null) : null,
			taken: gone ? await takenWords(tx, ctx, row) : null
		};
	});
