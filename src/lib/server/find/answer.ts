import type { PartState, Grade, ProofWay } from '$lib/parts/words';
import type { Sureness } from '$lib/donors/words';

/** A part as the database's own search gives it, and how it came to answer. */
export interface Hit {
	/** Where it stands in the order of answers, as a cursor says it. */
	at: string;
	/** How near it comes: 0 a tag, 1 a number, 2 what replaced it, 7 to the letter, 15 known not to fit. */
	tier: number;
	fits: boolean | null;
	same: string;
	count: number;
	id: number;
	tag: string;
	kind: string;
	label: string;
	grade: Grade;
	state: PartState;
	bin: string | null;
	donor: number | null;
	maker: string | null;
	model: string | null;
	engine: string;
	engineKey: string;
	serial: string | null;
	cc: number | null;
	cause: string | null;
	secondCause: string | null;
	sureness: Sureness | null;
	numbers: string[];
	note: string;
	/** What is missing from its set. */
	missing?: string;
	mass: number | null;
	heldFor: string | null;
	heldUntil: string | null;
	outAs: 'fitted' | 'sold' | null;
	outTo: string | null;
	changedAt: string;
	newCents: number | null;
	copyCents: number | null;
	photo: number | null;
	proofs: { how: ProofWay; passed: boolean }[] | null;
	/** How many that would answer the same call go first. */
	before: number;
}

interface Counted {
	value: number | string;
	count: number;
	said?: string;
}

export type Counts = Record<
	'kind' | 'grade' | 'state' | 'proof' | 'price' | 'bin' | 'engine',
	Counted[] | null
>;

export interface Answer extends Counts {
	/** 1 to the letter, 2 spelling forgiven, 3 some words left out. */
	level: 1 | 2 | 3;
	total: number;
	page: Hit[] | null;
	gone: Hit[] | null;
}
