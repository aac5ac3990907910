import type { Plan } from '$lib/find/plan';
import type { StillOnDonor } from '$lib/find/view';
import { sayEngine, sayNumber } from '$lib/donors/reference';
import { MISTAKE } from '$lib/parts/state';
import { findKind, kindsOn, minutesToPull, type EngineClass, type Fitting } from '$lib/trade';
import { and, desc, eq, inArray, isNull, ne, or } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { chanceOn } from '../parts';
import { part } from '../parts/tables';

type Donor = typeof donor.$inferSelect;

const MOST = 8;
/** Enough to choose from; a yard with more open donors shows its newest. */
const CANDIDATES = 400;

const openDonors = (tx: Tx, ctx: Context, classes: readonly string[]): Promise<Donor[]> =>
	tx
		.select()
		.from(donor)
		.where(
			and(
				eq(donor.shopId, ctx.shopId),
				inArray(donor.state, ['whole', 'on the bench', 'parked']),
				inArray(donor.engineClass, [...classes])
			)
		)
		.orderBy(desc(donor.id))
		.limit(CANDIDATES);

async function loggedOn(tx: Tx, ctx: Context, ids: readonly number[]): Promise<Set<string>> {
	const rows = await tx
		.selectDistinct({ donorId: part.donorId, kind: part.kind })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				inArray(part.donorId, [...ids]),
				or(isNull(part.scrapReason), ne(part.scrapReason, MISTAKE))
			)
		);
	return new Set(rows.map((row) => `${row.donorId} ${row.kind}`));
}

/** The kinds that are still there, a piece having gone with its whole. */
function left(row: Donor, logged: ReadonlySet<string>): string[] {
	const gone = (id: string | null) => id !== null && logged.has(`${row.id} ${id}`);
	return kindsOn(row.engineClass as EngineClass, row.fittings as Fitting[])
		.filter((each) => !gone(each.id) && !gone(each.partOf))
		.map((each) => each.id);
}

/** Where the words name an engine, only such engines; else all of them. */
function ofEngine(rows: Donor[], plan: Plan): Donor[] {
	const named = rows.filter((row) => {
		const said = `${row.maker} ${row.model} ${row.typeCode} ${row.engineKey}`.toLowerCase();
		return plan.words.some(
			(word) => said.includes(word.replace(/[-./]/g, '')) || said.includes(word)
		);
	});
	const numbered = rows.filter((row) => row.number === plan.donorNumber);
	if (plan.donorNumber !== null) return numbered;
	return named.length > 0 ? named : rows;
}

async function asAnswer(ctx: Context, row: Donor, kind: string, present: string[]) {
	const { never } = await chanceOn(ctx, kind, row);
	if (never !== null || !present.includes(kind)) return null;
	const kindName = findKind(kind)?.name ?? kind;
	const minutes = minutesToPull(kind, present);
	return {
		number: sayNumber(row.number),
		engine: sayEngine(row),
		minutes,
		kind,
		kindName,
		state: row.state
	};
}

/** Donors not yet taken apart that still carry one of the kinds asked for, the quickest to pull first. */
export async function donorsWith(
	tx: Tx,
	ctx: Context,
	plan: Plan,
	kind: string | undefined
): Promise<StillOnDonor[]> {
	const asked = (kind ? [kind] : plan.kinds).map(findKind).filter((one) => one !== null);
	if (asked.length === 0) return [];
	const classes = [...new Set(asked.flatMap((one) => one.on))];
	const open = ofEngine(await openDonors(tx, ctx, classes), plan);
	if (open.length === 0) return [];
	const logged = await loggedOn(
		tx,
		ctx,
		open.map((row) => row.id)
	);
	const found: StillOnDonor[] = [];
	for (const row of open) {
		const present = left(row, logged);
		const first = asked.find((one) => present.includes(one.id));
		const answer = first ? await asAnswer(ctx, row, first.id, present) : null;
		if (answer) found.push(answer);
	}
	return found.sort((a, b) => a.minutes - b.minutes).slice(0, MOST);
}
