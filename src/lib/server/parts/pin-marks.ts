import { sayNumber } from '$lib/donors/reference';
import { Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import type { Context } from '../context';
import type { Tx } from '../db';
import type { DonorRow } from '../donors';
import { partRow } from './row';
import { kindsThere } from './still-on';

type What = { kind?: string | undefined; part?: string | undefined };

/** What a pin marks: a part off this donor, or a kind that is still on it. */
export async function marked(tx: Tx, ctx: Context, donor: DonorRow, what: What) {
	const number = sayNumber(donor.number);
	if (what.part !== undefined) {
		const row = await partRow(tx, ctx, what.part);
		if (row.donorId !== donor.id)
			throw new Refused('bad input', `${row.tag} is not off ${number}. Choose another.`, 'what');
		return { kind: row.kind, partId: row.id };
	}
	const id = what.kind ?? '';
	const there = await kindsThere(tx, ctx, donor);
	if (donor.engineClass !== null && !there.some((one) => one.id === id)) {
		const said = `${kind(id).name} is not on ${number}. If it was logged, choose the part.`;
		throw new Refused('bad input', said, 'what');
	}
	return { kind: id, partId: null };
}
