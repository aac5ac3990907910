import { ReleaseInput, type TakeIn } from '../../src/lib/donors/input';
import { replay, type Step } from '../../src/lib/parts/state';
import { SAFE_TICKS } from '../../src/lib/trade';
import { addBin } from '../../src/lib/server/bins';
import { inShop, type Context } from '../../src/lib/server/context';
import { releaseDonor, stripDonor, takeIn, tickSafe } from '../../src/lib/server/donors';
import { part } from '../../src/lib/server/parts/tables';
import { event } from '../../src/lib/server/people/tables';
import { BinInput } from '../../src/lib/bins/input';
import { and, asc, eq } from 'drizzle-orm';

const ENGINE: TakeIn = {
	maker: 'Ondrake',
	model: 'TARN-21L',
	class: 'GP',
	fittings: ['recoil'],
	cause: 'stale-fuel',
	sureness: 'seen'
};

/** A donor that lies on the bench, released, safe and with its cause named. Returns its number. */
export async function donorOnBench(ctx: Context, over: TakeIn = {}): Promise<string> {
	const { number } = await takeIn(ctx, { ...ENGINE, ...over });
	await releaseDonor(ctx, number, ReleaseInput.parse({ route: 'own' }));
	await tickSafe(ctx, number, { ticks: SAFE_TICKS.map((tick) => tick.id), version: 2 });
	await stripDonor(ctx, number);
	return number;
}

export const bin = (ctx: Context, address: string, red = false) =>
	addBin(ctx, BinInput.parse({ address, size: 'm', red }));

/** Every part of the shop with the state of its row and the one its events lead to. */
export const statesAndReplays = (ctx: Context) =>
	inShop(ctx, async (tx) => {
		const rows = await tx.select().from(part).where(eq(part.shopId, ctx.shopId));
		const states = [];
		for (const row of rows) {
			const about = and(eq(event.about, 'part'), eq(event.aboutId, row.id));
			const steps: Step[] = await tx
				.select()
				.from(event)
				.where(and(eq(event.shopId, ctx.shopId), about))
				.orderBy(asc(event.id));
			states.push({ tag: row.tag, state: row.state, replayed: replay(steps) });
		}
		return states;
	});
