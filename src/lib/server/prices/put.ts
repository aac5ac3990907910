import { engineKey, numberKey } from '$lib/codes/number';
import type { PriceInput } from '$lib/prices/input';
import { money } from '$lib/format';
import { seenSaid } from '$lib/prices/seen';
import { priceFor, type PriceView } from '$lib/prices/view';
import { NotFound, Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import { and, eq, ne } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { getShop, record } from '../people';
import { getPrice } from './queries';
import { price } from './tables';

type Row = typeof price.$inferSelect;

const DAY = 86_400_000;

function rowOf(ctx: Context, input: PriceInput) {
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

const said = ({ newCents, copyCents, seenOn }: Amounts, currency: string) =>
	`${money(newCents, currency)} new, ${copyCents === null ? 'no copy' : `${money(copyCents, currency)} copy`}, seen ${seenSaid(seenOn)}`;

async function refuseChanged(ctx: Context, row: Row, values: Values, version?: number) {
	if (version === undefined || version === row.version) return;
	const { currency } = await getShop(ctx);
	throw new Refused(
		'changed',
		`Somebody saved this price meanwhile: it is now ${said(row, currency)}. You typed ${said(values, currency)}. Look and save again.`
	);
}

async function write(tx: Tx, ctx: Context, before: Row, values: Values): Promise<PriceView> {
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

const sameAs = (ctx: Context, values: Values) =>
	and(
		eq(price.shopId, ctx.shopId),
		eq(price.kind, values.kind),
		eq(price.engineKey, values.engineKey),
		eq(price.numberKey, values.numberKey)
	);

/** Puts a price on the list; the one for the same kind, engine and number is written over. */
export const putPrice = (ctx: Context, input: PriceInput): Promise<PriceView> =>
	inShop(ctx, async (tx, ctx) => {
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
		const [before] = await tx.select().from(price).where(sameAs(ctx, values)).for('update');
		if (!before)
			throw new Refused('changed', 'This price was taken off the list just now. Save again.');
		await refuseChanged(ctx, before, values, input.version);
		return write(tx, ctx, before, values);
	});

/** Changes a price that is on the list; what it is for may change with it. */
export const editPrice = (ctx: Context, id: number, input: PriceInput): Promise<PriceView> =>
	inShop(ctx, async (tx, ctx) => {
		const values = rowOf(ctx, input);
		const [before] = await tx
			.select()
			.from(price)
			.where(and(eq(price.shopId, ctx.shopId), eq(price.id, id)))
			.for('update');
		if (!before) throw new NotFound('This price is not on the list any more');
		await refuseChanged(ctx, before, values, input.version);
		const [twin] = await tx
			.select()
			.from(price)
			.where(and(sameAs(ctx, values), ne(price.id, id)));
		if (twin)
			throw new Refused(
				'taken',
				`There is a price for ${kind(twin.kind).name}, ${priceFor(twin)} already: ${said(twin, (await getShop(ctx)).currency)}. Change that one.`
			);
		return write(tx, ctx, before, values);
	});
