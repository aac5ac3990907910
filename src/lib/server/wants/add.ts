import { numberKey } from '$lib/codes/number';
import type { CustomerInput } from '$lib/customers/input';
import type { WantInput } from '$lib/wants/input';
import type { TellBy } from '$lib/wants/words';
import { eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { customerRow, knownCustomer } from '../customers';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { shop } from '../people/tables';
import { enqueue } from '../queue/enqueue';
import { matchWant } from './match';
import { want } from './tables';

/** The next running number of the shop; the row's lock keeps two from getting the same. */
async function nextNumber(tx: Tx, ctx: Context): Promise<number> {
	const [row] = await tx
		.update(shop)
		.set({ lastWantNumber: sql`${shop.lastWantNumber} + 1` })
		.where(eq(shop.id, ctx.shopId))
		.returning({ number: shop.lastWantNumber });
	return row!.number;
}

/** Part numbers with the keys by which they are compared; what has no letter or digit is none. */
export function numbered(typed: readonly string[]) {
	const numbers = typed.filter((one) => numberKey(one) !== '');
	return { numbers, numberKeys: [...new Set(numbers.map(numberKey))] };
}

async function waiter(tx: Tx, ctx: Context, asked: number | CustomerInput | undefined) {
	if (asked === undefined) return null;
	const id = typeof asked === 'number' ? asked : (await knownCustomer(ctx, asked)).id;
	return customerRow(tx, ctx, id);
}

/** As they can be reached, where nobody said how to tell them. */
function usualWay(who: { email: string; phone: string } | null): TellBy {
	if (who?.email) return 'e-mail';
	return who?.phone ? 'phone' : 'in person';
}

export interface Added {
	id: number;
	number: number;
	/** How many things here answer it already. */
	matches: number;
}

/** Somebody waits: put on the list, and compared with the shelf and the donors at once. */
export const addWant = (ctx: Context, input: WantInput): Promise<Added> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const who = await waiter(tx, ctx, input.customer);
		const [row] = await tx
			.insert(want)
			.values({
				...{ shopId: ctx.shopId, number: await nextNumber(tx, ctx), memberId: ctx.memberId },
				...{ customerId: who?.id ?? null, job: input.job ?? '' },
				...{ kind: input.kind ?? '', engine: input.engine ?? '', measures: input.measures ?? '' },
				...numbered(input.numbers ?? []),
				...{ mostCents: input.mostCents ?? null, note: input.note ?? '' },
				...{ tellBy: input.tellBy ?? usualWay(who), state: 'waiting' },
				...{ addedAt: ctx.now, changedAt: ctx.now }
			})
			.returning();
		const { id, number } = row!;
		await record(tx, ctx, { about: 'want', aboutId: id, what: 'added', toState: 'waiting' });
		const matches = await matchWant(tx, ctx, row!, { at: ctx.now, isNew: true });
		// what comes in while this is not yet committed is found afterwards
		await enqueue(tx, 'wants.match', { shopId: ctx.shopId, wantId: id, at: ctx.now });
		return { id, number, matches };
	});
