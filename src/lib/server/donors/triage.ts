import type { TriageInput, TriageView } from '$lib/donors/triage';
import { Refused } from '$lib/refusal';
import { and, desc, eq, inArray } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { event, member } from '../people/tables';
import { donorRow, type DonorRow } from './rows';
import { triage, type InPlace } from './tables';

const LOOKED = 'looked it over';
const TOOK_BACK = 'took back the look';

interface Look {
	answers: TriageView['answers'];
	inPlace: Record<string, InPlace>;
}

const NONE: Look = { answers: {}, inPlace: {} };

const of = (ctx: Context, donorId: number) =>
	and(eq(triage.shopId, ctx.shopId), eq(triage.donorId, donorId));

async function lookAt(tx: Tx, ctx: Context, donorId: number) {
	const [row] = await tx
		.select({ triage, by: member.name })
		.from(triage)
		.innerJoin(member, and(eq(member.shopId, triage.shopId), eq(member.id, triage.memberId)))
		.where(of(ctx, donorId));
	return row ?? null;
}

async function newest(tx: Tx, ctx: Context, donorId: number) {
	const [row] = await tx
		.select()
		.from(event)
		.where(
			and(
				...[eq(event.shopId, ctx.shopId), eq(event.about, 'donor'), eq(event.aboutId, donorId)],
				inArray(event.what, [LOOKED, TOOK_BACK])
			)
		)
		.orderBy(desc(event.id))
		.limit(1);
	return row ?? null;
}

/** What the first minute at the tailgate showed of a donor. */
export const getTriage = (ctx: Context, ref: string): Promise<TriageView> =>
	inShop(ctx, async (tx, ctx) => {
		const { id } = await donorRow(tx, ctx, ref);
		const look = await lookAt(tx, ctx, id);
		const last = await newest(tx, ctx, id);
		return {
			answers: look?.triage.answers ?? {},
			inPlace: look?.triage.inPlace ?? {},
			by: look?.by ?? null,
			at: look?.triage.at ?? null,
			version: look?.triage.version ?? 0,
			undo: last?.what === LOOKED ? last.id : null
		};
	});

/** The donor, locked, while it may still be looked over. */
async function openDonor(tx: Tx, ctx: Context, ref: string): Promise<DonorRow> {
	allow(ctx, 'work');
	const row = await donorRow(tx, ctx, ref, { lock: true });
	if (row.state === 'stripped' || row.state === 'gone')
		throw new Refused('gate', `It is ${row.state}: the look at it stays as it was.`);
	return row;
}

async function write(tx: Tx, ctx: Context, donorId: number, look: Look, version: number) {
	const { answers, inPlace } = look;
	const row = { answers, inPlace, memberId: ctx.memberId, at: ctx.now, version };
	await tx
		.insert(triage)
		.values({ shopId: ctx.shopId, donorId, ...row })
		.onConflictDoUpdate({ target: [triage.shopId, triage.donorId], set: row });
}

/** Keeps what the first minute showed. Returns the event that can be undone. */
export const saveTriage = (
	ctx: Context,
	ref: string,
	input: TriageInput
): Promise<{ eventId: number }> =>
	inShop(ctx, async (tx, ctx) => {
		const { id } = await openDonor(tx, ctx, ref);
		const before = await lookAt(tx, ctx, id);
		const version = before?.triage.version ?? 0;
		if (version !== input.version)
			throw new Refused(
				'changed',
				`${before?.by ?? 'Somebody'} looked it over meanwhile. Compare the answers and save again.`
			);
		const { answers, inPlace } = input;
		await write(tx, ctx, id, { answers, inPlace }, version + 1);
		const was = before ? { answers: before.triage.answers, inPlace: before.triage.inPlace } : NONE;
		const detail = { answers, inPlace, before: was };
		const eventId = await record(tx, ctx, { about: 'donor', aboutId: id, what: LOOKED, detail });
		return { eventId };
	});

/** Takes back the newest look, to what was answered before. */
export const undoTriage = (ctx: Context, ref: string, eventId: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		const { id } = await openDonor(tx, ctx, ref);
		const last = await newest(tx, ctx, id);
		if (last?.id !== eventId || last.what !== LOOKED)
			throw new Refused('changed', 'It was looked over again since. Change the answers by hand.');
		const version = (await lookAt(tx, ctx, id))?.triage.version ?? 0;
		await write(tx, ctx, id, last.detail.before as Look, version + 1);
		const detail = { undone: eventId };
		await record(tx, ctx, { about: 'donor', aboutId: id, what: TOOK_BACK, detail });
	});
