import type { LetterSettingsInput } from '$lib/customers/settings';
import { Refused } from '$lib/refusal';
import { eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { shop } from '../people/tables';
import { letterSetting } from './tables';

export type LetterSettings = LetterSettingsInput;

const USUAL: LetterSettings = { replyTo: '', tellByItself: false, quietDays: 7, version: 0 };

/** How the shop's letters leave; the usual where it has said nothing. */
export const letterSettings = (ctx: Context): Promise<LetterSettings> =>
	inShop(ctx, async (tx, ctx) => {
		const { replyTo, tellByItself, quietDays, version } = letterSetting;
		const [row] = await tx
			.select({ replyTo, tellByItself, quietDays, version })
			.from(letterSetting)
			.where(eq(letterSetting.shopId, ctx.shopId));
		return row ?? USUAL;
	});

export const saveLetterSettings = (ctx: Context, input: LetterSettings): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		await tx.select({ id: shop.id }).from(shop).where(eq(shop.id, ctx.shopId)).for('no key update');
		const { version, ...before } = await letterSettings(ctx);
		if (version !== input.version)
			throw new Refused('changed', 'Somebody saved these settings meanwhile. Look and save again.');
		const row = { ...input, version: version + 1, changedAt: ctx.now };
		await tx
			.insert(letterSetting)
			.values({ shopId: ctx.shopId, ...row })
			.onConflictDoUpdate({ target: letterSetting.shopId, set: row });
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'letters',
			detail: { before, after: input }
		});
	});
