import { comesIn } from '$lib/parts/coming';
import type { Pull } from '$lib/parts/input';
import { unticked } from '$lib/parts/keeping';
import type { PartState } from '$lib/parts/words';
import { kind } from '$lib/trade';
import { Refused } from '$lib/refusal';
import type { Context } from '../context';
import type { Tx } from '../db';
import { getPolicy } from '../people';
import { mintTag } from '../tags';
import { announcePart } from './announce';
import { chanceBy } from './chance-on';
import { insertPart, type Origin } from './insert-part';
import { hangKept } from './photo';
import { pinsFollow } from './pins-follow';
import { placeNamed, redPlace, type Place } from './place';
import { writeProof } from './prove';
import { recordPart, type Done } from './row';

export interface Logged extends Done {
	id: number;
	state: PartState;
	to: string | null;
}

/** Never-reuse kinds and ruined ones become no stock; safety kinds only with every tick of their list. */
async function askRules(ctx: Context, input: Pull, from: Origin['donor']): Promise<void> {
	if (input.scrapped) return;
	const { never } = chanceBy(await getPolicy(ctx), input.kind, from);
	if (never)
		throw new Refused('gate', `${never} It can be logged as scrapped or destroyed.`, 'kind');
	const left = unticked(input.kind, input.checklist ?? []);
	if (left.length)
		throw new Refused(
			'gate',
			`${kind(input.kind).name} is kept only through its checklist. Still to tick: ${left.join(' ')}`,
			'checklist'
		);
}

/** Where it goes first: nowhere yet, a bin, or the red bin when its test was failed. */
async function firstPlace(
	tx: Tx,
	ctx: Context,
	input: Pull
): Promise<{ place: Place | null; state: PartState }> {
	if (input.scrapped) return { place: null, state: 'scrapped' };
	if (input.proof && !input.proof.passed) return { place: await redPlace(tx, ctx), state: 'back' };
	if (!input.bin) return { place: null, state: 'pulled' };
	const place = await placeNamed(tx, ctx, input.bin);
	return { place, state: place.red ? 'back' : 'shelved' };
}

/** Makes the part: its tag, its row, its proof and the event that says all of it happened. */
export async function logPart(tx: Tx, ctx: Context, input: Pull, origin: Origin): Promise<Logged> {
	await askRules(ctx, input, origin.donor);
	const { place, state } = await firstPlace(tx, ctx, input);
	const tag = await mintTag(tx, ctx, 'part', input.tag);
	const id = await insertPart(tx, ctx, { input, origin, place, state, tag });
	if (input.proof) await writeProof(tx, ctx, { id, kind: input.kind }, input.proof);
	for (const kept of origin.kept ?? []) await hangKept(tx, ctx, id, kept);
	if (origin.donor) await pinsFollow(tx, ctx, { id, donorId: origin.donor.id, kind: input.kind });
	const detail = {
		kind: input.kind,
		grade: input.grade ?? 'core',
		to: place?.said,
		reason: input.scrapped?.reason,
		proof: input.proof
	};
	const eventId = await recordPart(tx, ctx, { id, state: null }, 'pull', state, detail);
	if (comesIn(null, state)) await announcePart(tx, ctx, id, true);
	return { id, tag, eventId, state, to: place?.said ?? null };
}
