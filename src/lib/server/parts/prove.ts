import type { Proof } from '$lib/parts/input';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { redPlace } from './place';
import { changePart, partFor, type Done, type PartRow } from './row';
import { proof } from './tables';

/** Writes how it was checked; a part that fails goes to the red bin, and nobody is promised it any more. */
export const provePart = (ctx: Context, tag: string, input: Proof): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'prove');
		await writeProof(tx, ctx, row.id, input);
		const figure = input.figure === undefined ? '' : `${input.figure} ${input.unit ?? ''}`.trim();
		const detail = { how: input.how, passed: input.passed, figure };
		return changePart(tx, ctx, row, 'prove', input.passed ? {} : await failed(tx, ctx), detail);
	});

export async function writeProof(
	tx: Tx,
	ctx: Context,
	partId: number,
	{ how, figure, unit, passed, note }: Proof
): Promise<void> {
	await tx.insert(proof).values({
		shopId: ctx.shopId,
		partId,
		how,
		figure: figure ?? null,
		unit: unit ?? '',
		note: note ?? '',
		passed,
		memberId: ctx.memberId,
		at: ctx.now
	});
}

async function failed(tx: Tx, ctx: Context): Promise<Partial<PartRow>> {
	const { binId, boxId } = await redPlace(tx, ctx);
	return { state: 'back', binId, boxId, heldFor: null, heldUntil: null };
}
