import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { findPlace, redBin, type BinRow } from '../bins';
import type { Context } from '../context';
import type { Tx } from '../db';
import { box, donor } from '../donors/tables';
import { findTag } from '../tags';

/** Where a part lies: a bin or a donor's box. */
export interface Place {
	binId: number | null;
	boxId: number | null;
	red: boolean;
	said: string;
}

const inBin = (row: BinRow): Place => ({
	binId: row.id,
	boxId: null,
	red: row.red,
	said: row.address
});

async function boxPlace(tx: Tx, ctx: Context, typed: string): Promise<Place | null> {
	const tag = await findTag(ctx, typed);
	if (tag?.what === 'part')
		throw new Refused('bad input', 'That is the tag of a part. Scan the bin or the box.', 'bin');
	if (tag?.what !== 'box') return null;
	const [row] = await tx
		.select({ id: box.id, number: donor.number })
		.from(box)
		.innerJoin(donor, and(eq(donor.shopId, box.shopId), eq(donor.id, box.donorId)))
		.where(and(eq(box.shopId, ctx.shopId), eq(box.tag, tag.code)));
	return row ? { binId: null, boxId: row.id, red: false, said: `the box of D${row.number}` } : null;
}

/** The place that an address, a bin's tag or a box's tag names. */
export async function placeNamed(tx: Tx, ctx: Context, typed: string): Promise<Place> {
	const row = await findPlace(tx, ctx, typed, 'share');
	if (row) return inBin(row);
	const place = await boxPlace(tx, ctx, typed);
	if (place) return place;
	throw new Refused(
		'bad input',
		`There is no bin ${typed.trim()}. Type an address like K3-1, or the tag of a bin or a box.`,
		'bin'
	);
}

/** The red bin of the shop; where it has none, nowhere in particular. */
export async function redPlace(tx: Tx, ctx: Context): Promise<Place> {
	const row = await redBin(tx, ctx);
	return row ? inBin(row) : { binId: null, boxId: null, red: true, said: 'the red bin' };
}
