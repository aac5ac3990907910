import type { TemplateInput } from '$lib/customers/settings';
import { TEMPLATES, type Template, type TemplateName } from '$lib/customers/templates';
import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { shop } from '../people/tables';
import { letterTemplate } from './tables';

const NAMES = Object.keys(TEMPLATES) as TemplateName[];

const ofShop = (tx: Tx, ctx: Context) =>
	tx.select().from(letterTemplate).where(eq(letterTemplate.shopId, ctx.shopId));

/** The words of a letter: the shop's own, or the usual. */
export async function templateFor(tx: Tx, ctx: Context, name: TemplateName): Promise<Template> {
	const own = (await ofShop(tx, ctx)).find((row) => row.name === name);
	return own ?? TEMPLATES[name];
}

/** Every letter with its words as they stand, and whether they are the shop's own. */
export const listTemplates = (ctx: Context) =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const rows = await ofShop(tx, ctx);
		return NAMES.map((name) => {
			const own = rows.find((row) => row.name === name);
			const { subject, text } = own ?? TEMPLATES[name];
			const { title, when } = TEMPLATES[name];
			return {
				name,
				title,
				when,
				subject,
				text,
				own: own !== undefined,
				version: own?.version ?? 0
			};
		});
	});

/** Keeps the shop's own words for a letter; `usual` goes back to what it says otherwise. */
export const saveTemplate = (ctx: Context, input: TemplateInput): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		await tx.select({ id: shop.id }).from(shop).where(eq(shop.id, ctx.shopId)).for('no key update');
		const { name, subject, text, version, usual } = input;
		const own = (await ofShop(tx, ctx)).find((row) => row.name === name);
		if ((own?.version ?? 0) !== version)
			throw new Refused(
				'changed',
				'Somebody saved this letter meanwhile. Your words are still here: compare and save again.'
			);
		const mine = and(eq(letterTemplate.shopId, ctx.shopId), eq(letterTemplate.name, name));
		const row = { subject, text, version: version + 1, changedAt: ctx.now };
		if (usual) await tx.delete(letterTemplate).where(mine);
		else
			await tx
				.insert(letterTemplate)
				.values({ shopId: ctx.shopId, name, ...row })
				.onConflictDoUpdate({ target: [letterTemplate.shopId, letterTemplate.name], set: row });
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'letter template',
			detail: { name, before: own && { subject: own.subject, text: own.text } }
		});
	});
