import { saidFilters } from '$lib/find/filters';
import type { FindQuery } from '$lib/find/input';
import { readSearch, type Plan } from '$lib/find/plan';
import type { Found } from '$lib/find/view';
import { findKind } from '$lib/trade';
import { sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import type { Answer } from './answer';
import { countAsked } from './asked';
import { facetsOf } from './facets';
import { itemOf } from './item';
import { nearestKinds } from './nearest';
import { questionOf } from './question';
import { shopOf, type ShopOf } from './shop-figures';
import { wordsOfShop, wordsRead } from './shop-words';
import { askedKinds, donorsWith, type OpenDonor } from './still-on';

/** The plan of what was typed; the words of the shop are read anew only where one is not known. */
async function planOf(tx: Tx, ctx: Context, typed: string): Promise<Plan> {
	const known = wordsRead(ctx);
	const plan = readSearch(typed, known);
	const strange = plan.literally.some(
		({ exact: [word = ''] }) => /^\p{L}{3,}$/u.test(word) && !known.has(word)
	);
	return strange ? readSearch(typed, await wordsOfShop(tx, ctx)) : plan;
}

interface Row extends Record<string, unknown> {
	answer: Answer;
	donors: OpenDonor[] | null;
}

const list = (values: readonly string[]) => sql`${sql.param([...values])}::text[]`;

async function look(
	tx: Tx,
	ctx: Context,
	plan: Plan,
	query: FindQuery,
	{ policy }: ShopOf
): Promise<Row> {
	const asked = askedKinds(plan, query.kind);
	const classes = [...new Set(asked.flatMap((one) => one.on))];
	const ids = asked.map(({ id }) => id);
	const donors =
		asked.length === 0 || query.cursor
			? sql`null`
			: sql`find_on_donors(${list(ids)}, ${list(classes)}, ${list(plan.engine)}, ${plan.donorNumber}::int)`;
	const { rows } = await tx.execute<Row>(
		sql`select find_parts(${questionOf(ctx.shopId, plan, query, policy)}::json) as answer, ${donors} as donors`
	);
	return rows[0]!;
}

function saidInWords(plan: Plan, query: FindQuery): Found['said'] {
	const { price, proof, grade } = saidFilters(plan, query);
	const whole = (cents: number | null) => (cents === null ? '' : `${cents / 100}`);
	return [
		...(price
			? [{ name: 'price' as const, value: `${whole(price.low)}-${whole(price.high)}` }]
			: []),
		...(proof ? [{ name: 'proof' as const, value: proof }] : []),
		...(grade ? [{ name: 'grade' as const, value: grade }] : [])
	];
}

const askedWhich = ({ ask }: Plan): Found['ask'] =>
	ask.length === 0
		? null
		: { kinds: ask.map((kind) => ({ kind, kindName: findKind(kind)?.name ?? kind })) };

/**
 * Looks for parts: a page of them, what the answer could be narrowed to, donors that still carry one, what went
 * out, and, where nothing answers, the kinds that come nearest. Looking in vain is counted as a call.
 */
export const findParts = (ctx: Context, query: FindQuery): Promise<Found> =>
	inShop(ctx, async (tx, ctx) => {
		const plan = await planOf(tx, ctx, query.q ?? '');
		const shop = await shopOf(tx, ctx);
		const { answer, donors } = await look(tx, ctx, plan, query, shop);
		const said = { plan, now: ctx.now, ...shop };
		const hits = (answer.page ?? []).slice(0, query.limit);
		const isMore = (answer.page ?? []).length > query.limit;
		await countAsked(tx, ctx, plan, query, { ...answer, timeZone: shop.timeZone });
		return {
			items: hits.map((hit) => itemOf(hit, said)),
			total: answer.total,
			facets: facetsOf(answer),
			donors: donorsWith(donors ?? [], askedKinds(plan, query.kind)),
			gone: (answer.gone ?? []).map((hit) => itemOf(hit, said)),
			nearest: answer.total === 0 ? await nearestKinds(tx, ctx, plan, query.kind) : [],
			ask: askedWhich(plan),
			said: saidInWords(plan, query),
			without: answer.level === 3 ? plan.words : [],
			next: isMore ? (hits.at(-1)?.at.join('.') ?? null) : null
		};
	});
