import { ENGINE_FIGURES } from '$lib/parts/engine-figures';
import type { PlanStep } from '$lib/parts/plan-view';
import { may } from '$lib/people/role';
import { kind, scrapCentsPerGram, type EngineClass } from '$lib/trade';
import { carcassGrams, USUAL_CLASS } from '$lib/yard/carcass';
import type { Finish } from '$lib/yard/input';
import type { FinishView, LeftOn } from '$lib/yard/view';
import { and, eq, ne } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow, finishDonor, type DonorRow } from '../donors';
import { planFor } from '../parts';
import { part } from '../parts/tables';
import { allow } from '../people';
import { accountOf } from './account';
import { carcass } from './tables';

const USUAL_GRAMS = 16_000;

async function roughGrams(tx: Tx, ctx: Context, donor: DonorRow): Promise<number> {
	const off = await tx
		.select({ kind: part.kind, massGrams: part.massGrams })
		.from(part)
		.where(
			and(eq(part.shopId, ctx.shopId), eq(part.donorId, donor.id), ne(part.state, 'scrapped'))
		);
	const whole = ENGINE_FIGURES[donor.engineClass as EngineClass]?.grams ?? USUAL_GRAMS;
	const grams = off.map(({ kind: id, massGrams }) => {
		const { massLowGrams, massHighGrams } = kind(id);
		return massGrams ?? (massLowGrams + massHighGrams) / 2;
	});
	return carcassGrams(whole, grams);
}

export async function findCarcass(tx: Tx, ctx: Context, donorId: number) {
	const [row] = await tx
		.select()
		.from(carcass)
		.where(and(eq(carcass.shopId, ctx.shopId), eq(carcass.donorId, donorId)));
	return row ?? null;
}

const before = (order: PlanStep[], at: number) => order[at - 1]?.runningCents ?? 0;

/** What would be left behind: what is still on it that would pay, the carcass, and the account by now. */
export const getFinish = (ctx: Context, ref: string): Promise<FinishView> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, ref);
		const known = await findCarcass(tx, ctx, donor.id);
		const { grams, scrapClass, drained } = known ?? {
			grams: await roughGrams(tx, ctx, donor),
			scrapClass: USUAL_CLASS,
			drained: []
		};
		const { order } = await planFor(ctx, ref);
		const left = order.flatMap(({ id, kindName, keep, minutes, runningCents }, at): LeftOn[] =>
			keep ? [{ kind: id, kindName, minutes, gainCents: runningCents - before(order, at) }] : []
		);
		const scrapCents = scrapCentsPerGram(scrapClass) * grams;
		const account = may(ctx.role, 'see costs') ? await accountOf(tx, ctx, donor, scrapCents) : null;
		return { left, grams, scrapClass, drained, account };
	});

/** Stripped, with what is left of it; returns the event, to undo it by. */
export const finishStripping = (ctx: Context, ref: string, input: Finish): Promise<number> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await donorRow(tx, ctx, ref, { lock: true });
		const eventId = await finishDonor(ctx, ref);
		const set = { ...input, memberId: ctx.memberId, at: ctx.now };
		await tx
			.insert(carcass)
			.values({ shopId: ctx.shopId, donorId: donor.id, ...set })
			.onConflictDoUpdate({ target: [carcass.shopId, carcass.donorId], set });
		return eventId;
	});
