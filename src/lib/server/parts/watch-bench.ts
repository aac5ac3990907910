import { inShop, type Context } from '../context';
import { listenTo } from '../db/listen';
import { donorRow } from '../donors';

/** Hears of every part logged off a donor, left on it or undone, whoever did it; returns how to watch. */
export const watchBench = async (
	ctx: Context,
	ref: string
): Promise<(hear: () => void) => () => void> => {
	const { id } = await inShop(ctx, (tx, ctx) => donorRow(tx, ctx, ref));
	return (hear) => listenTo(`${ctx.shopId}:${id}`, hear);
};
