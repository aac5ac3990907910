import type { Proof } from '$lib/parts/input';
import type { ProofFigure } from '$lib/parts/view';
import { Refused } from '$lib/refusal';
import { testFields } from '$lib/trade';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { redPlace } from './place';
import { changePart, partFor, type Done, type PartRow } from './row';
import { proof } from './tables';

/** Writes how it was checked; a part that fails goes to the red bin, and nobody is promised it any more. */
export const provePart = (ctx: Context, tag: string, input: Proof): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'prove');
		const read = await writeProof(tx, ctx, row, input);
		const figure = readSaid(read);
		const detail = { how: input.how, passed: input.passed, figure };
		return changePart(tx, ctx, row, 'prove', input.passed ? {} : await failed(tx, ctx), detail);
	});

/** What was read in words: "Coil 3.1 ohm, 18 A". */
const readSaid = (read: readonly ProofFigure[]) =>
	read.map(({ field, value, unit }) => `${field} ${value} ${unit}`.trim()).join(', ');

/** The figures of a test by the names of its fields; one that the kind's test does not read is refused. */
function readings(kindId: string, { figure, unit, figures = {} }: Proof): ProofFigure[] {
	const fields = testFields(kindId);
	const named = Object.entries(figures).map(([id, value]) => {
		const field = fields.find((one) => one.id === id);
		if (!field)
			throw new Refused('bad input', `The test of this kind reads no “${id}”.`, `read-${id}`);
		return { field: field.said, value, unit: field.unit };
	});
	return figure === undefined ? named : [...named, { field: '', value: figure, unit: unit ?? '' }];
}

/** Writes how a part was checked, with what was read. */
export async function writeProof(
	tx: Tx,
	ctx: Context,
	{ id: partId, kind }: { id: number; kind: string },
	input: Proof
): Promise<ProofFigure[]> {
	const read = readings(kind, input);
	await tx.insert(proof).values({
		shopId: ctx.shopId,
		partId,
		how: input.how,
		figure: read[0]?.value ?? null,
		unit: read[0]?.unit ?? '',
		figures: read,
		note: input.note ?? '',
		passed: input.passed,
		memberId: ctx.memberId,
		at: ctx.now
	});
	return read;
}

async function failed(tx: Tx, ctx: Context): Promise<Partial<PartRow>> {
	const { binId, boxId } = await redPlace(tx, ctx);
	return { state: 'back', binId, boxId, heldFor: null, heldUntil: null };
}
