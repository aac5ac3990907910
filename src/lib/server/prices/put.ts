import { engineKey, numberKey } from '$lib/codes/number';
import type { PriceInput } from '$lib/prices/input';
import { money } from '$lib/format';
import { seenSaid } from '$lib/prices/seen';
import type { PriceView } from '$lib/prices/view';
import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, getShop, record } from '../people';
import { getPrice } from './queries';
import { price } from './tables';

type Row = typeof price.$inferSelect;

const DAY = 86_400_000;

/** The row of an input; a day ahead of today is refused. */
export function rowOf(ctx: Context, input: PriceInput) {
	if (Date.parse(input.seenOn) > ctx.now.getTime() + DAY)
		throw new Refused(
			'bad input',
			'Enter the day you saw the price: this one lies ahead',
			'seenOn'
		);
	const { kind, engine = '', number = '', newCents, copyCents = null, source, seenOn } = input;
	return {
		kind,
		engine,
		engineKey: engineKey(engine),
		number,
		numberKey: numberKey(number),
		newCents,
		copyCents,
		source,
		seenOn,
		changedAt: ctx.now
	};
}

type Values = ReturnType<typeof rowOf>;

type Amounts = Pick<Row, 'newCents' | 'copyCents' | 'seenOn'>;

export const said = ({ newCents, copyCents, seenOn }: Amounts, currency: string) =>
	`${money(newCents, currency)} new, ${copyCents === null ? 'no copy' : `${money(copyCents, currency)} copy`}, seen ${seenSaid(seenOn)}`;

export async function refuseChanged(ctx: Context, row: Row, values: Values, version?: number) {
	if (version === undefined || version === row.version) return;
	const { currency } = await getShop(ctx);
	throw new Refused(
		'changed',
		`Somebody saved this price meanwhile: it is now ${said(row, currency)}. You typed ${said(values, currency)}. Look and save again.`
	);
}

export async function write(tx: Tx, ctx: Context, before: Row, values: Values): Promise<PriceView> {
	await tx
		.update(price)
		.set({ ...values, version: before.version + 1 })
		.where(and(eq(price.shopId, ctx.shopId), eq(price.id, before.id)));
	await record(tx, ctx, {
		about: 'price',
		aboutId: before.id,
		what: 'changed',
		detail: { before, after: values }
	});
	return getPrice(ctx, before.id);
}

export const sameAs = (ctx: Context, values: Values) =>
	and(
		eq(price.shopId, ctx.shopId),
		eq(price.kind, values.kind),
		eq(price.engineKey, values.engineKey),
		eq(price.numberKey, values.numberKey)
	);

/** Puts a price on the list; the one for the same kind, engine and number is written over. */
export const putPrice = (ctx: Context, input: PriceInput): Promise<PriceView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const values = rowOf(ctx, input);
		const [added] = await tx
			.insert(price)
			.values({ shopId: ctx.shopId, ...values })
			.onConflictDoNothing()
			.returning({ id: price.id });
		if (added) {
			const detail = { after: values };
			await record(tx, ctx, { about: 'price', aboutId: added.id, what: 'added', detail });
			return getPrice(ctx, added.id);
		}
		const [before] = await tx.select().from(price).where(sameAs(ctx, values)).for('no key update');
		if (!before)
			throw new Refused('changed', 'This price was taken off the list just now. Save again.');
		await refuseChanged(ctx, before, values, input.version);
		return write(tx, ctx, before, values);
	});
