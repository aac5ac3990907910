import type { FindQuery } from '$lib/find/input';
import type { Plan } from '$lib/find/plan';
import { dayIn } from '$lib/donors/day';
import { inShop, type Context } from '../context';
import type { Answer } from './answer';
import { asked } from './tables';

const isNarrowed = ({
	kind,
	grade,
	bin,
	state,
	donor,
	engine,
	price,
	proof,
	same,
	cursor
}: FindQuery) => [kind, grade, bin, state, donor, engine, price, proof, same, cursor].some(Boolean);

/** A search for one kind that ends in nothing counts as a call: one for each person, kind and day. */
export async function countAsked(
	ctx: Context,
	plan: Plan,
	query: FindQuery,
	{ total, level, timeZone }: Pick<Answer, 'total' | 'level'> & { timeZone: string }
): Promise<void> {
	const [kind] = plan.kinds;
	const inVain = total === 0 || level === 3;
	if (!inVain || !kind || plan.kinds.length > 1 || plan.donorNumber !== null || isNarrowed(query))
		return;
	const row = {
		shopId: ctx.shopId,
		memberId: ctx.memberId,
		kind,
		on: dayIn(timeZone, ctx.now),
		engine: plan.engine.join(' '),
		words: plan.text,
		at: ctx.now
	};
	await inShop(ctx, (tx) => tx.insert(asked).values(row).onConflictDoNothing());
}
