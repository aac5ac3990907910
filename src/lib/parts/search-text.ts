import { kind } from '../trade';

export interface Searchable {
	kind: string;
	label: string;
	numbers: readonly string[];
	note: string;
	engine: string;
	set: string;
}

export interface SearchableDonor {
	number: number;
	maker: string;
	model: string;
	typeCode: string;
}

/** Everything that a part may be found by in words, in lower case. */
export function searchText(part: Searchable, donor: SearchableDonor | null): string {
	const words = [
		part.label,
		kind(part.kind).name,
		...part.numbers,
		donor ? `${donor.maker} ${donor.model} ${donor.typeCode} D${donor.number}` : part.engine,
		part.note,
		part.set
	];
	return words.join(' ').toLowerCase().replace(/\s+/g, ' ').trim();
}
