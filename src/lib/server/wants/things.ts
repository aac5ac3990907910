import type { Wantable } from '$lib/parts/wanted';
import { lexemesOf } from '$lib/donors/lexemes';
import { whyNotStock } from '$lib/parts/keeping';
import { MISTAKE } from '$lib/parts/state';
import { chanceLevel, isCauseId, kindsOn, type EngineClass, type Fitting } from '$lib/trade';
import { and, eq, inArray, isNotNull, sql, type SQL } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';

export type PartThing = Wantable & { id: number };
/** A donor with the kinds that are still on it and may become stock. */
export interface DonorThing {
	id: number;
	kinds: string[];
	engineKey: string;
	engineWords: string;
}

/** In the shop and not promised; the red bin is said where it is shown. */
export const HERE = ['pulled', 'shelved', 'back'] as const;

/** Parts here as wants ask about them. */
export async function partThings(
	tx: Tx,
	ctx: Context,
	which: SQL | undefined
): Promise<PartThing[]> {
	const rows = await tx
		.select({
			id: part.id,
			kind: part.kind,
			engineKey: sql<string>`coalesce(nullif(${part.engineKey}, ''), ${donor.engineKey}, '')`,
			ownEngine: part.engine,
			donorWords: donor.searchWords,
			words: part.searchWords,
			numberKeys: part.numberKeys
		})
		.from(part)
		.leftJoin(donor, and(eq(donor.shopId, part.shopId), eq(donor.id, part.donorId)))
		.where(and(eq(part.shopId, ctx.shopId), inArray(part.state, [...HERE]), which));
	return rows.map(({ ownEngine, donorWords, ...row }) => ({
		...row,
		engineWords: donorWords ?? lexemesOf(ownEngine)
	}));
}

const logged = sql<
	string[]
>`array(select distinct p.kind from ${part} p where p.shop_id = ${donor.shopId}
	and p.donor_id = ${donor.id} and p.scrap_reason is distinct from ${MISTAKE})`;

interface Dead {
	engineClass: string | null;
	fittings: string[];
	cause: string | null;
	secondCause: string | null;
	logged: string[];
}

/** The kinds still there, a piece having gone with its whole. */
export function kindsThere({ engineClass, fittings, logged }: Omit<Dead, 'cause' | 'secondCause'>) {
	const gone = new Set(logged);
	return kindsOn(engineClass as EngineClass, fittings as Fitting[])
		.filter((each) => !gone.has(each.id) && !(each.partOf && gone.has(each.partOf)))
		.map(({ id }) => id);
}

const mayBeStock = (kind: string, { cause, secondCause }: Dead) =>
	whyNotStock(
		kind,
		[cause, secondCause].some((id) => id && isCauseId(id) && chanceLevel(kind, id) === 'ruined'),
		''
	) === null;

/** Donors not yet taken apart, with what they still carry. */
export async function donorThings(
	tx: Tx,
	ctx: Context,
	which: SQL | undefined
): Promise<DonorThing[]> {
	const {
		id,
		engineKey,
		searchWords: engineWords,
		engineClass,
		fittings,
		cause,
		secondCause
	} = donor;
	const rows = await tx
		.select({ id, engineKey, engineWords, engineClass, fittings, cause, secondCause, logged })
		.from(donor)
		.where(
			and(
				eq(donor.shopId, ctx.shopId),
				inArray(donor.state, ['whole', 'on the bench', 'parked']),
				isNotNull(donor.engineClass),
				which
			)
		);
	return rows.map((row) => ({
		id: row.id,
		engineKey: row.engineKey,
		engineWords: row.engineWords,
		kinds: kindsThere(row).filter((kind) => mayBeStock(kind, row))
	}));
}

/** A kind on a donor, as wants ask about it. */
export const onDonor = ({ engineKey, engineWords }: DonorThing, kind: string): Wantable => ({
	...{ kind, engineKey, engineWords },
	words: '',
	numberKeys: []
});
