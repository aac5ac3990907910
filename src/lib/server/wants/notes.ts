import { lexemesOf } from '$lib/donors/lexemes';
import { fitOf, namesEngine, type FitRank, type Wantable, type Wanted } from '$lib/parts/wanted';
import { and, eq, inArray, or } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { fit } from '../parts/tables';
import { supersession } from '../prices/tables';

type FitNote = Pick<
	typeof fit.$inferSelect,
	'kind' | 'fromKey' | 'engine' | 'engineKey' | 'fits' | 'bothWays'
>;

/** What was tried on which engine, of these kinds. */
export async function fitNotes(tx: Tx, ctx: Context, kinds: readonly string[]): Promise<FitNote[]> {
	if (kinds.length === 0) return [];
	const { kind, fromKey, engine, engineKey, fits, bothWays } = fit;
	return tx
		.select({ kind, fromKey, engine, engineKey, fits, bothWays })
		.from(fit)
		.where(and(eq(fit.shopId, ctx.shopId), inArray(fit.kind, [...new Set(kinds)])));
}

/** As a rule alone says it, and by what was tried: what does not fit is none, what fits another engine is one for it. */
export function fitBy(want: Wanted, thing: Wantable, notes: readonly FitNote[]): FitRank | null {
	const about = notes.filter((one) => one.kind === thing.kind && one.fromKey === thing.engineKey);
	const named = about.filter((one) =>
		namesEngine(want.engine, { engineKey: one.engineKey, engineWords: lexemesOf(one.engine) })
	);
	const rank = fitOf(want, thing);
	if (rank === 1) return 1;
	if (named.some(({ fits }) => !fits)) return null;
	return rank ?? (want.kind === thing.kind && named.length > 0 ? 2 : null);
}

const MOST_STEPS = 4;

type Way = 'answering' | 'answered by';

/** One step along the list of replaced numbers. */
const step = (keys: string[], way: Way) =>
	way === 'answering'
		? or(
				inArray(supersession.oldKey, keys),
				and(inArray(supersession.newKey, keys), eq(supersession.bothWays, true))
			)
		: or(
				inArray(supersession.newKey, keys),
				and(inArray(supersession.oldKey, keys), eq(supersession.bothWays, true))
			);

/**
 * Numbers that answer a call for these (what replaced them, and what they replaced where it goes both ways), or
 * numbers that are answered by these. Chains are short; a ring ends by itself.
 */
export async function replacedKeys(
	tx: Tx,
	ctx: Context,
	keys: readonly string[],
	way: Way
): Promise<string[]> {
	const all = new Set(keys);
	let last = [...keys];
	for (let steps = 0; steps < MOST_STEPS && last.length > 0; steps++) {
		const rows = await tx
			.select()
			.from(supersession)
			.where(and(eq(supersession.shopId, ctx.shopId), step(last, way)));
		last = rows.flatMap((row) => [row.newKey, row.oldKey]).filter((key) => !all.has(key));
		for (const key of last) all.add(key);
	}
	return [...all];
}
