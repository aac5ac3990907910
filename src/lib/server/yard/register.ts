import { sayNumber } from '$lib/donors/reference';
import { ROUTE_SAID } from '$lib/donors/words';
import { may } from '$lib/people/role';
import type { RegisterEntry } from '$lib/yard/view';
import { and, desc, eq, gte, like, lt, lte, or, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { donor, release } from '../donors/tables';
import { allow } from '../people';
import { member } from '../people/tables';

export interface RegisterFilter {
	/** A piece of a serial, or a donor's number. */
	q?: string | undefined;
	from?: string | undefined;
	to?: string | undefined;
	/** The entry seen last. */
	cursor?: number | undefined;
	limit?: number | undefined;
}

/** A serial as donors keep its key. */
const keyOf = (serial: typeof release.serial) =>
	sql`translate(regexp_replace(upper(${serial}), '[^0-9A-Z]', '', 'g'), 'OI', '01')`;

const serialKey = (typed: string) =>
	typed
		.toUpperCase()
		.replace(/[^0-9A-Z?]/g, '')
		.replaceAll('O', '0')
		.replaceAll('I', '1')
		.replaceAll('?', '_');

/** The book of releases, the newest entry first: numbered without gaps, nothing erased. */
export const listRegister = (
	ctx: Context,
	{ q = '', from, to, cursor, limit = 50 }: RegisterFilter = {}
): Promise<{ items: RegisterEntry[]; next: number | null }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const key = serialKey(q);
		const number = /^d?\s*(\d{1,9})$/i.exec(q.trim())?.[1];
		const rows = await tx
			.select({
				release,
				donor,
				by: member.name,
				replaced: sql<boolean>`exists (select 1 from ${release} newer where newer.shop_id = ${ctx.shopId}
					and newer.donor_id = ${release.donorId} and newer.id > ${release.id})`
			})
			.from(release)
			.innerJoin(donor, and(eq(donor.shopId, release.shopId), eq(donor.id, release.donorId)))
			.innerJoin(member, and(eq(member.shopId, release.shopId), eq(member.id, release.memberId)))
			.where(
				and(
					eq(release.shopId, ctx.shopId),
					from ? gte(release.on, from) : undefined,
					to ? lte(release.on, to) : undefined,
					cursor === undefined ? undefined : lt(release.number, cursor),
					key
						? or(
								like(donor.serialKey, `%${key}%`),
								like(keyOf(release.serial), `%${key}%`),
								number ? eq(donor.number, Number(number)) : undefined
							)
						: undefined
				)
			)
			.orderBy(desc(release.number))
			.limit(limit + 1);
		const shown = rows.slice(0, limit);
		return {
			items: shown.map(({ release: row, donor: of, by, replaced }) => ({
				...{ number: row.number, at: row.at.toISOString(), on: row.on },
				...{ donor: sayNumber(of.number), engine: row.engine, serial: row.serial },
				...{ route: ROUTE_SAID[row.route], document: row.document },
				...{ fromName: row.fromName, fromAddress: row.fromAddress, idSeen: row.idSeen },
				...{ holdUntil: row.holdUntil, because: row.because, photo: row.photoId, by, replaced },
				paidCents: may(ctx.role, 'see costs') ? of.paidCents : null
			})),
			next: rows.length > limit ? (shown.at(-1)?.release.number ?? null) : null
		};
	});
