import type { Measures, OwnMeasures, StockId } from '$lib/labels/stocks';
import { Refused } from '$lib/refusal';
import { eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { labelSettings } from './tables';

export interface LabelSettings {
	stocks: OwnMeasures;
	saysOwner: boolean;
	version: number;
}

const settingsOf = async (tx: Tx, ctx: Context, lock = false): Promise<LabelSettings> => {
	const asked = tx.select().from(labelSettings).where(eq(labelSettings.shopId, ctx.shopId));
	const [row] = await (lock ? asked.for('no key update') : asked);
	return row ?? { stocks: {}, saysOwner: false, version: 0 };
};

/** What the shop has said of its labels. */
export const getLabelSettings = (ctx: Context): Promise<LabelSettings> =>
	inShop(ctx, async (tx) => {
		const { stocks, saysOwner, version } = await settingsOf(tx, ctx);
		return { stocks, saysOwner, version };
	});

type Change = Pick<LabelSettings, 'stocks' | 'saysOwner'>;

async function change(
	tx: Tx,
	ctx: Context,
	what: string,
	make: (now: LabelSettings) => Partial<Change>
): Promise<void> {
	await tx
		.insert(labelSettings)
		.values({ shopId: ctx.shopId, stocks: {}, saysOwner: false, version: 0, changedAt: ctx.now })
		.onConflictDoNothing();
	const now = await settingsOf(tx, ctx, true);
	const set = make(now);
	await tx
		.update(labelSettings)
		.set({ ...set, version: now.version + 1, changedAt: ctx.now })
		.where(eq(labelSettings.shopId, ctx.shopId));
	const before = { stocks: now.stocks, saysOwner: now.saysOwner };
	await record(tx, ctx, {
		about: 'shop',
		aboutId: ctx.shopId,
		what,
		detail: { before, after: set }
	});
}

const meanwhile = () =>
	new Refused(
		'changed',
		'Somebody saved the measures of these labels meanwhile. Yours are still here: compare them and save again.'
	);

/** Keeps the measures of the shop's own sheet. */
export const saveStock = (
	ctx: Context,
	input: { stock: StockId; measures: Measures; version: number }
): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		await change(tx, ctx, 'measured its labels', (now) => {
			if (now.version !== input.version) throw meanwhile();
			return { stocks: { ...now.stocks, [input.stock]: input.measures } };
		});
	});

/** Back to the measures that such a sheet is sold with. */
export const resetStock = (ctx: Context, stock: StockId): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		await change(tx, ctx, 'took back its measures of labels', (now) => {
			const { [stock]: _, ...rest } = now.stocks;
			return { stocks: rest };
		});
	});

/** Whether a stranger who scans a tag is told whose it is. */
export const sayWhose = (ctx: Context, saysOwner: boolean): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		await change(
			tx,
			ctx,
			saysOwner ? 'lets strangers know whose tags they are' : 'keeps to itself whose tags they are',
			() => ({ saysOwner })
		);
	});
