import type { ShopEdit } from '$lib/people/input';
import { Policy, withDefaults } from '$lib/people/policy';
import type { Season, ShopSettings } from '$lib/people/settings';
import { NotFound, Refused } from '$lib/refusal';
import { eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from './allow';
import { record } from './record';
import { policy, shop } from './tables';

export const getShop = (ctx: Context): Promise<ShopSettings> =>
	inShop(ctx, async (tx) => {
		const [row] = await tx.select().from(shop).where(eq(shop.id, ctx.shopId));
		if (!row) throw new NotFound();
		const { slug, name, currency, timeZone, units, season, version } = row;
		return { slug, name, currency, timeZone, units, season, version };
	});

/** Changes the settings; refused when somebody saved in between, with both values said. */
export const editShop = (ctx: Context, input: ShopEdit): Promise<ShopSettings> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const [now] = await tx.select().from(shop).where(eq(shop.id, ctx.shopId)).for('no key update');
		if (!now) throw new NotFound();
		if (now.version !== input.version)
			throw new Refused(
				'changed',
				`Somebody saved these settings meanwhile: the name is now “${now.name}”, the season ${now.season}. You typed “${input.name}”, ${input.season}. Look and save again.`
			);
		const { version, ...change } = input;
		await tx
			.update(shop)
			.set({ ...change, version: version + 1 })
			.where(eq(shop.id, ctx.shopId));
		await record(tx, ctx, { about: 'shop', aboutId: ctx.shopId, what: 'settings', detail: change });
		return getShop(ctx);
	});

export const setSeason = (ctx: Context, season: Season): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const [row] = await tx.select().from(shop).where(eq(shop.id, ctx.shopId)).for('no key update');
		if (!row) throw new NotFound();
		await tx
			.update(shop)
			.set({ season, version: row.version + 1 })
			.where(eq(shop.id, ctx.shopId));
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'season',
			detail: { season }
		});
	});

/** The shop's policy: its own figures over the defaults, and which figures are its own. */
export const getPolicyRow = (
	ctx: Context
): Promise<{ policy: Policy; own: Partial<Policy>; version: number }> =>
	inShop(ctx, async (tx) => {
		const [row] = await tx.select().from(policy).where(eq(policy.shopId, ctx.shopId));
		const own = (row?.figures ?? {}) as Partial<Policy>;
		return { policy: withDefaults(own), own, version: row?.version ?? 0 };
	});

export const getPolicy = async (ctx: Context): Promise<Policy> => (await getPolicyRow(ctx)).policy;

/** Keeps the shop's own figures; `own` is the whole set, a figure left out goes back to its default. */
export const editPolicy = (
	ctx: Context,
	input: { own: Partial<Policy>; version: number }
): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const checked = withDefaults(input.own);
		await tx.select().from(shop).where(eq(shop.id, ctx.shopId)).for('no key update');
		const { version, own: before } = await getPolicyRow(ctx);
		if (version !== input.version)
			throw new Refused(
				'changed',
				'Somebody saved the policy meanwhile. Your figures are still here: compare them with the saved ones and save again.'
			);
		const own = Object.fromEntries(
			Object.keys(input.own).map((key) => [key, checked[key as keyof Policy]])
		);
		const row = { figures: own, version: version + 1, changedAt: ctx.now };
		await tx
			.insert(policy)
			.values({ shopId: ctx.shopId, ...row })
			.onConflictDoUpdate({ target: policy.shopId, set: row });
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'policy',
			detail: { before, after: own }
		});
	});
