import { inShop, type Context } from '../context';
import { placeNamed } from './place';
import { changePart, partFor, type Done } from './row';

/** A missing part belongs elsewhere from now on; it stays missing until somebody finds it. */
export const rehomePart = (ctx: Context, tag: string, bin: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'edit');
		const { binId, boxId, said } = await placeNamed(tx, ctx, bin);
		return changePart(tx, ctx, row, 'edit', { binId, boxId }, { changed: [`belongs in ${said}`] });
	});
