import { amount, check, type Figure } from './figures';
import { WorthError } from './worth-error';

/** A part on a donor. Ids in `behind`, `partOf` and `ruins` count as far as they are on the list. */
export interface PullPart {
	id: string;
	/** What has to come off first. */
	behind?: readonly string[] | null;
	/** The whole that it is a piece of. */
	partOf?: string | null;
	/** What taking it off spoils. */
	ruins?: readonly string[] | null;
	/** Bench minutes to take it off once all before it is off. */
	minutes: number;
	/** Look, photo and tag, spent only when it is kept. */
	keepMinutes?: number | null;
	/** What keeping it is worth in cents, before any of those minutes; below nil counts as nil. */
	gainCents: number;
}

export interface PullInput {
	parts: readonly PullPart[];
	/** Minutes at hand; no limit when left out. */
	minutes?: number | null;
	/** Cents per minute. */
	labourNow: number;
}

const MOST = 1e12;
const MOST_PARTS = 1000;

const figures: Record<string, Figure> = {
	minutes: amount('minutes to take it off'),
	keepMinutes: { unit: 'minutes to keep it', optional: true },
	gainCents: { unit: 'gain in cents', least: -MOST, most: MOST }
};

const isIds = (value: unknown): boolean =>
	value == null || (Array.isArray(value) && value.every((id) => typeof id === 'string'));

function checkPart(part: PullPart, at: string, seen: Set<string>): void {
	if (typeof part !== 'object' || part === null || typeof part.id !== 'string' || !part.id) {
		throw new WorthError(`${at}.id`, `${at}.id: the id of the part, text`);
	}
	if (seen.has(part.id))
		throw new WorthError(`${at}.id`, `${at}.id: ${part.id} stands there twice`);
	seen.add(part.id);
	for (const field of ['behind', 'ruins'] as const) {
		const name = `${at}.${field}`;
		if (!isIds(part[field])) throw new WorthError(name, `${name}: a list of ids`);
	}
	if (part.partOf != null && typeof part.partOf !== 'string') {
		throw new WorthError(`${at}.partOf`, `${at}.partOf: the id of the whole, text`);
	}
	for (const [field, figure] of Object.entries(figures)) {
		const name = `${at}.${field}`;
		check({ [name]: part[field as keyof PullPart] }, { [name]: figure });
	}
}

/** Throws WorthError naming the first field that is missing, no figure or out of its range. */
export function checkPull(input: PullInput): void {
	check(input, {
		labourNow: amount('labour now in cents per minute'),
		minutes: { unit: 'minutes at hand', optional: true }
	});
	const { parts } = input;
	if (!Array.isArray(parts) || parts.length > MOST_PARTS) {
		throw new WorthError('parts', `parts: a list of parts, ${MOST_PARTS} at most`);
	}
	const seen = new Set<string>();
	for (const [index, part] of parts.entries()) checkPart(part, `parts[${index}]`, seen);
}
