import { engineKey } from '$lib/codes/number';
import type { FitNote, FitView } from '$lib/parts/fits';
import { Refused } from '$lib/refusal';
import { and, desc, eq, or, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { member } from '../people/tables';
import { partRow } from './row';
import { fit } from './tables';

/** Notes that a part was tried on an engine. It stands for all parts of its kind off the same engine. */
export const noteFit = (ctx: Context, tag: string, input: FitNote): Promise<{ tag: string }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await partRow(tx, ctx, tag, 'lock');
		const tried = engineKey(input.engine);
		if (tried === row.engineKey)
			throw new Refused('bad input', 'It is from that engine: name another one.', 'engine');
		const said = {
			partId: row.id,
			engine: input.engine,
			fits: input.fits === 'yes',
			because: input.because,
			bothWays: input.ways === 'both'
		};
		const from = { kind: row.kind, fromKey: row.engineKey, engineKey: tried };
		const who = { shopId: ctx.shopId, memberId: ctx.memberId, at: ctx.now };
		await tx.insert(fit).values({ ...who, ...from, ...said });
		// about the shop: the events of a part are its moves and nothing else
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'noted a fit',
			detail: said
		});
		return { tag: row.tag };
	});

/** What is known about where a part fits: its own notes and those of its like, the newest first. */
export const listFits = (ctx: Context, tag: string): Promise<FitView[]> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partRow(tx, ctx, tag);
		const like = and(
			eq(fit.kind, row.kind),
			eq(fit.fromKey, row.engineKey),
			sql`${fit.fromKey} <> ''`
		);
		const { id, engine, fits, because, bothWays, at } = fit;
		return tx
			.select({ id, engine, fits, because, bothWays, at, by: member.name })
			.from(fit)
			.innerJoin(member, and(eq(member.shopId, fit.shopId), eq(member.id, fit.memberId)))
			.where(and(eq(fit.shopId, ctx.shopId), or(eq(fit.partId, row.id), like)))
			.orderBy(desc(fit.id))
			.limit(20);
	});
