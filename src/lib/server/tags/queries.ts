import { readTag } from '$lib/codes';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { tag } from './tables';

export interface FoundTag {
	code: string;
	/** 'blank' until its first scan says what it hangs on. */
	what: 'box' | 'part' | 'bin' | 'blank';
}

/** What a typed or scanned code was given to, or null when it is no code of this shop. */
export async function findTag(ctx: Context, typed: string): Promise<FoundTag | null> {
	const reading = readTag(typed);
	if (!('tag' in reading)) return null;
	return inShop(ctx, async (tx) => {
		const [row] = await tx
			.select({ code: tag.code, what: tag.what })
			.from(tag)
			.where(and(eq(tag.shopId, ctx.shopId), eq(tag.code, reading.tag)));
		return row ?? null;
	});
}
