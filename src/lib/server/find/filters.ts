import { readTag } from '$lib/codes';
import { donorNumber } from '$lib/donors/reference';
import type { FindQuery } from '$lib/find/input';
import { sql, type SQL } from 'drizzle-orm';

export type Filter = 'kind' | 'grade' | 'state' | 'bin' | 'donor';

function atBin(bin: string): SQL {
	const read = readTag(bin);
	const at = sql`upper(place) = ${bin.toUpperCase()}`;
	return 'tag' in read ? sql`(${at} or bin_tag = ${read.tag})` : at;
}

function ofDonor(donor: string): SQL {
	const number = donorNumber(donor.replace(/^d0+/i, 'D'));
	const read = readTag(donor);
	const tag = 'tag' in read ? read.tag : '';
	return sql`(donor_number = ${number ?? 0} or box_tag = ${tag})`;
}

/** One condition for each filter; without a state what is scrapped or out is left out. */
export function filtersOf(query: FindQuery): Record<Filter, SQL> {
	const { kind, grade, state, bin, donor } = query;
	const all = sql`true`;
	return {
		kind: kind ? sql`kind = ${kind}` : all,
		grade: grade ? sql`grade = ${grade}` : all,
		state: state ? sql`state = ${state}` : sql`state not in ('scrapped', 'out')`,
		bin: bin ? atBin(bin) : all,
		donor: donor ? ofDonor(donor) : all
	};
}

/** All filters but one: what a facet counts. */
export const without = (filters: Record<Filter, SQL>, own?: Filter): SQL =>
	sql.join(
		Object.entries(filters)
			.filter(([name]) => name !== own)
			.map(([, fits]) => fits),
		sql` and `
	);
