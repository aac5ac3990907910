import { saidFilters } from '$lib/find/filters';
import type { FindQuery } from '$lib/find/input';
import { readSearch, type Plan } from '$lib/find/plan';
import type { Found } from '$lib/find/view';
import type { Lexicon } from '$lib/find/lexicon';
import { findKind } from '$lib/trade';
import { inShop, readInShop, type Context } from '../context';
import { waitedFor } from '../parts';
import type { Answer } from './answer';
import { countAsked } from './asked';
import { facetsOf } from './facets';
import { itemOf } from './item';
import { nearestKinds } from './nearest';
import { questionOf } from './question';
import { shopOf, type ShopOf, type ShopSaid } from './shop-figures';
import { wordsOfShop, wordsRead } from './shop-words';
import { askedKinds, donorsWith, type OpenDonor } from './still-on';

interface Row extends Record<string, unknown> {
	shop: ShopSaid;
	answer: Answer;
	donors: OpenDonor[] | null;
}

const LOOK = `find_shop() as shop, find_on_shelf($2::json) as answer,
	find_on_donors($3::text[], $4::text[], $5::text[], $6::int) as donors`;

const look = (ctx: Context, plan: Plan, query: FindQuery, { policy }: ShopOf): Promise<Row> => {
	const asked = query.cursor ? [] : askedKinds(plan, query.kind);
	const classes = [...new Set(asked.flatMap((one) => one.on))];
	const question = questionOf(ctx.shopId, plan, query, policy);
	const ids = asked.map(({ id }) => id);
	return readInShop(ctx, 'find', LOOK, [question, ids, classes, plan.engine, plan.donorNumber]);
};

/** Whether something was typed that the shop had not written when its words were read. */
const isStrange = ({ literally }: Plan, words: Lexicon) =>
	literally.some(({ exact: [word = ''] }) => /^\p{L}{3,}$/u.test(word) && !words.has(word));

/** Asks with what is known of the shop and its words, and once more where the answer says that they have changed. */
async function asked(ctx: Context, query: FindQuery) {
	const typed = query.q ?? '';
	const words = wordsRead(ctx);
	const [plan, shop] = [readSearch(typed, words.list), await shopOf(ctx)];
	const row = await look(ctx, plan, query, shop);
	const hasNewWords = row.shop.words > words.last && isStrange(plan, words.list);
	if (row.shop.said === shop.said && !hasNewWords) return { plan, shop, row };
	const anew = hasNewWords
		? readSearch(typed, await inShop(ctx, (tx, ctx) => wordsOfShop(tx, ctx)))
		: plan;
	const shopNow = await shopOf(ctx, row.shop.said);
	return { plan: anew, shop: shopNow, row: await look(ctx, anew, query, shopNow) };
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
export async function findParts(ctx: Context, query: FindQuery): Promise<Found> {
	const { plan, shop, row } = await asked(ctx, query);
	const { answer, donors } = row;
	const hits = (answer.page ?? []).slice(0, query.limit);
	const shown = [...hits, ...(answer.gone ?? [])].map(({ id }) => id);
	const waited = row.shop.waited ? await waitedFor(ctx, shown) : new Set<number>();
	const said = { plan, waited, ...shop };
	const isMore = (answer.page ?? []).length > query.limit;
	await countAsked(ctx, plan, query, { ...answer, timeZone: shop.timeZone });
	return {
		items: hits.map((hit) => itemOf(hit, said)),
		total: answer.total,
		facets: facetsOf(answer),
		donors: donorsWith(donors ?? [], askedKinds(plan, query.kind)),
		gone: (answer.gone ?? []).map((hit) => itemOf(hit, said)),
		nearest: answer.total === 0 ? await nearestKinds(ctx, plan, query.kind) : [],
		ask: askedWhich(plan),
		said: saidInWords(plan, query),
		without: answer.level === 3 ? plan.words : [],
		next: isMore ? (hits.at(-1)?.at ?? null) : null
	};
}
