import type { ShopFigures } from '$lib/parts/learned-view';
import { verdictOf } from '$lib/parts/verdict';
import type { Verdict, VerdictSubject } from '$lib/parts/verdict-view';
import { may } from '$lib/people/role';
import type { Season } from '$lib/people/settings';
import { NotFound } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { donor } from '../donors/tables';
import { getShop } from '../people';
import { pricesFor } from '../prices';
import { figuresFor } from './figures';
import { proofsOf, queued, queueFor, rowsOf, wantable } from './verdict-rows';
import { priceOf, subjectOf } from './verdict-subject';
import { openWants, waitingOf } from './waiting';

export interface Shop {
	/** With what the history taught. */
	policy: ShopFigures;
	season: Season;
}

/** What verdicts on these kinds are counted with; null: on any. */
export async function shopFigures(
	ctx: Context,
	kinds: readonly string[] | null = null
): Promise<Shop> {
	const policy = await figuresFor(ctx, kinds);
	return { policy, season: (await getShop(ctx)).season };
}

/** Those who may not see the terms get the verdict without them. */
function shownTo(ctx: Context, verdict: Verdict): Verdict {
	return may(ctx.role, 'see terms') ? verdict : { ...verdict, terms: [], figures: null };
}

/** The verdicts on these parts of the shop; ids that are not there are left out. */
export const partVerdicts = (
	ctx: Context,
	partIds: readonly number[]
): Promise<Map<number, Verdict>> =>
	inShop(ctx, async (tx, ctx) => {
		const found = new Map<number, Verdict>();
		if (partIds.length === 0) return found;
		const rows = await rowsOf(tx, ctx, partIds);
		const kinds = [...new Set(rows.map(({ kind }) => kind))];
		const { policy, season } = await shopFigures(ctx, kinds);
		const proofs = await proofsOf(tx, ctx, partIds);
		const queue = (await queueFor(tx, ctx, rows)).map(queued);
		const open = await openWants(tx, ctx, rows);
		const prices = await pricesFor(
			tx,
			ctx,
			rows.map((row) => ({ ...row, key: String(row.id) }))
		);
		for (const row of rows) {
			const price = priceOf(prices.get(String(row.id)), ctx, policy);
			const subject: VerdictSubject = {
				...subjectOf({ ...row, ...queued(row) }, queue, price, policy),
				...waitingOf(wantable(row), open),
				proofs: proofs.get(row.id) ?? [],
				massGrams: row.massGrams,
				bin: { yearlyCostCents: row.binCostCents, litres: row.binLitres },
				stillOn: false
			};
			found.set(row.id, shownTo(ctx, verdictOf(subject, policy, season)));
		}
		return found;
	});

const LAST = Number.MAX_SAFE_INTEGER;

/** What verdicts on kinds still on a donor are made of: each as if pulled now, untested. */
export const kindSubjects = (
	ctx: Context,
	donorId: number,
	kindIds: readonly string[]
): Promise<Shop & { subjects: Map<string, VerdictSubject> }> =>
	inShop(ctx, async (tx, ctx) => {
		const [from] = await tx
			.select()
			.from(donor)
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, donorId)));
		if (!from) throw new NotFound();
		const { policy, season } = await shopFigures(ctx, kindIds);
		const { engineKey, searchWords: engineWords, cause, secondCause, sureness } = from;
		const asked = kindIds.map((kind) => ({ key: kind, kind, engineKey, numberKeys: [] }));
		const queue = (await queueFor(tx, ctx, asked)).map(queued);
		const open = await openWants(tx, ctx, asked);
		const prices = await pricesFor(tx, ctx, asked);
		const place = {
			id: LAST,
			pulledAt: LAST,
			grade: 'untested',
			state: 'pulled',
			inRedBin: false
		} as const;
		const subjects = asked.map((one): [string, VerdictSubject] => {
			const price = priceOf(prices.get(one.key), ctx, policy);
			const from = { ...one, ...place, cause, secondCause, sureness };
			const subject = subjectOf(from, queue, price, policy);
			const thing = { ...one, ...place, engineWords, words: '' };
			// it is not off yet, so it does not count among those the shop has
			return [one.kind, { ...subject, ...waitingOf(thing, open), have: subject.have - 1 }];
		});
		return { policy, season, subjects: new Map(subjects) };
	});

/** The verdicts on kinds that are still on a donor, as if each were pulled now, untested. */
export async function kindVerdicts(
	ctx: Context,
	donorId: number,
	kindIds: readonly string[]
): Promise<Map<string, Verdict>> {
	const { policy, season, subjects } = await kindSubjects(ctx, donorId, kindIds);
	return new Map(
		[...subjects].map(([kind, subject]) => [kind, shownTo(ctx, verdictOf(subject, policy, season))])
	);
}
