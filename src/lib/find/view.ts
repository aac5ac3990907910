import type { PartItem } from '../parts/view';

export interface Facet {
	value: string;
	count: number;
	/** As people say it, where the value is an id. */
	said?: string;
}

export interface StillOnDonor {
	number: string;
	engine: string;
	minutes: number;
	kind: string;
	kindName: string;
	state: string;
}

export interface NearKind {
	kind: string;
	kindName: string;
	count: number;
}

export interface Found {
	items: PartItem[];
	total: number;
	facets: Record<'kind' | 'grade' | 'state' | 'bin', Facet[]>;
	donors: StillOnDonor[];
	nearest: NearKind[];
	next: string | null;
}
