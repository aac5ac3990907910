import { PLATE_LABELS, type TakeLabel } from '$lib/donors/label-form';
import type { PlateField } from '$lib/donors/plate-fields';
import type { DonorEdit } from '$lib/donors/input';
import { NotFound, Refused } from '$lib/refusal';
import { and, desc, eq, inArray } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { event } from '../people/tables';
import { donorColumns } from './columns';
import { saveDonor } from './edit';
import { donorRow, type DonorRow } from './rows';
import { labelReading } from './tables';

const TOOK = 'took over from the plate';
const PUT_BACK = 'put back what stood before the plate was read';

const labels = (fields: readonly PlateField[]) =>
	fields.map((field) => PLATE_LABELS[field].toLowerCase()).join(', ');

const standing = (row: DonorRow, fields: readonly string[]) =>
	Object.fromEntries(fields.map((field) => [field, row[field as PlateField]]));

async function needReading(tx: Tx, ctx: Context, ref: string, id: number): Promise<void> {
	const { id: donorId } = await donorRow(tx, ctx, ref);
	const [row] = await tx
		.select({ id: labelReading.id })
		.from(labelReading)
		.where(
			and(
				...[eq(labelReading.shopId, ctx.shopId), eq(labelReading.id, id)],
				eq(labelReading.donorId, donorId)
			)
		);
	if (!row) throw new NotFound();
}

/** Takes what was accepted or corrected of a reading. Returns the event that can be undone. */
export const takeLabel = (
	ctx: Context,
	ref: string,
	{ reading, fields, edit }: TakeLabel
): Promise<{ eventId: number; said: string }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		await needReading(tx, ctx, ref, reading);
		const said = labels(fields);
		const eventId = await saveDonor(
			ctx,
			ref,
			edit.version,
			(row) => donorColumns(ctx, edit, row),
			TOOK,
			(row) => ({ said, reading, fields, before: standing(row, fields) })
		);
		return { eventId, said };
	});

async function lastTaken(tx: Tx, ctx: Context, donorId: number) {
	const [row] = await tx
		.select({ id: event.id, what: event.what, detail: event.detail })
		.from(event)
		.where(
			and(
				...[eq(event.shopId, ctx.shopId), eq(event.about, 'donor'), eq(event.aboutId, donorId)],
				inArray(event.what, [TOOK, PUT_BACK])
			)
		)
		.orderBy(desc(event.id))
		.limit(1);
	return row?.what === TOOK ? row : null;
}

const same = (one: unknown, other: unknown) => JSON.stringify(one) === JSON.stringify(other);

/** Puts back what stood in the fields before, as long as nobody has changed them since. */
export const undoTakeLabel = (ctx: Context, ref: string, eventId: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		const last = await lastTaken(tx, ctx, row.id);
		if (!last) throw new NotFound();
		const { fields, before } = last.detail as { fields: string[]; before: DonorEdit };
		const taken = Object.fromEntries(fields.map((field) => [field, last.detail[field]]));
		if (last.id !== eventId || !same(standing(row, fields), taken))
			throw new Refused('changed', 'It was changed again since. Change it by hand.');
		await saveDonor(ctx, ref, undefined, (row) => donorColumns(ctx, before, row), PUT_BACK);
	});
