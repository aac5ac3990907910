import { engineKey } from '$lib/codes/number';
import type { Pull } from '$lib/parts/input';
import { searchWords } from '$lib/parts/search-words';
import type { PartState } from '$lib/parts/words';
import type { Context } from '../context';
import type { Tx } from '../db';
import type { donor } from '../donors/tables';
import type { KeptPhoto } from '../photos';
import { keysOf } from './edit';
import type { Place } from './place';
import { part } from './tables';

/** Where a part comes from: its donor, or old stock that says itself which engine it fits. */
export interface Origin {
	donor: typeof donor.$inferSelect | null;
	engine: string;
	/** Pictures that are in the store already. */
	kept?: readonly KeptPhoto[];
}

interface NewPart {
	input: Pull;
	origin: Origin;
	place: Place | null;
	state: PartState;
	tag: string;
}

/** The row of a new part. Returns its number. */
export async function insertPart(
	tx: Tx,
	ctx: Context,
	{ input, origin, place, state, tag }: NewPart
): Promise<number> {
	const numbers = input.numbers ?? [];
	const from = origin.donor;
	const row = {
		shopId: ctx.shopId,
		tag,
		kind: input.kind,
		donorId: from?.id ?? null,
		engine: from ? '' : origin.engine,
		engineKey: from ? from.engineKey : engineKey(origin.engine),
		grade: input.grade ?? 'core',
		state,
		binId: place?.binId ?? null,
		boxId: place?.boxId ?? null,
		label: input.label ?? '',
		numbers,
		numberKeys: keysOf(numbers),
		set: input.set ?? '',
		setMissing: input.setMissing ?? '',
		checklist: input.checklist ?? [],
		massGrams: input.massGrams ?? null,
		note: input.note ?? '',
		scrapReason: input.scrapped?.reason ?? null,
		destroyed: input.scrapped?.destroyed ?? false,
		pulledAt: ctx.now,
		changedAt: ctx.now
	};
	const [made] = await tx
		.insert(part)
		.values({ ...row, searchWords: searchWords(row) })
		.returning({ id: part.id });
	return made!.id;
}
