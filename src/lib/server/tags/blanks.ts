import { MOST_BLANKS, MOST_UNUSED } from '$lib/tags/input';
import { NotFound, Refused } from '$lib/refusal';
import { and, asc, eq, inArray } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { event } from '../people/tables';
import { mintBlank } from './mint';
import { tag } from './tables';

const unused = (ctx: Context) => and(eq(tag.shopId, ctx.shopId), eq(tag.what, 'blank'));

/** Tags to be printed in advance; the first scan of each says what it hangs on. Returns the event that names them. */
export const mintBlanks = (
	ctx: Context,
	{ count }: { count: number }
): Promise<{ batch: number; tags: string[] }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const waiting = await tx.$count(tag, unused(ctx));
		if (count > MOST_BLANKS || waiting + count > MOST_UNUSED)
			throw new Refused(
				'gate',
				`There are ${waiting} blank tags that nobody has used. Print those again, or use some up first.`,
				'count'
			);
		const tags: string[] = [];
		while (tags.length < count) tags.push(await mintBlank(tx, ctx));
		const batch = await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'made blank tags',
			detail: { tags }
		});
		return { batch, tags };
	});

/** The blank tags that hang on nothing yet, oldest first; of one batch, or all. */
export const listBlanks = (ctx: Context, batch?: number): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const only = batch === undefined ? undefined : inArray(tag.code, await tagsOf(ctx, batch));
		const rows = await tx
			.select({ code: tag.code })
			.from(tag)
			.where(and(unused(ctx), only))
			.orderBy(asc(tag.mintedAt), asc(tag.code));
		return rows.map((row) => row.code);
	});

const tagsOf = (ctx: Context, batch: number): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const [row] = await tx
			.select({ detail: event.detail })
			.from(event)
			.where(
				and(
					eq(event.shopId, ctx.shopId),
					eq(event.id, batch),
					eq(event.about, 'shop'),
					eq(event.what, 'made blank tags')
				)
			);
		if (!row) throw new NotFound();
		return row.detail.tags as string[];
	});
