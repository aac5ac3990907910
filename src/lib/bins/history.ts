interface Happened {
	what: string;
	detail: Record<string, unknown>;
}

const listOf = (value: unknown) => (Array.isArray(value) ? value : []);
const word = (value: unknown) => (typeof value === 'string' ? value : '');

function edited(detail: Record<string, unknown>): string {
	const before = (detail.before ?? {}) as Record<string, unknown>;
	const was = word(before.address);
	return was ? `Renamed from ${was} to ${word(detail.address)}` : 'Changed';
}

const SAID: Record<string, (detail: Record<string, unknown>) => string> = {
	added: () => 'Added',
	'rack made': (d) => `Rack ${word(d.rack)} made: ${listOf(d.tags).length} bins`,
	edited,
	retired: () => 'Taken out of use',
	'in use again': () => 'In use again',
	merged: (d) => `Merged into ${word(d.to)}: ${listOf(d.moves).length} parts moved`,
	'took in': (d) => `Took in what was in ${word(d.from)}`,
	undone: (d) => `Undone: ${word(d.said)}`
};

/** An event of a bin in words. */
export const binHappened = ({ what, detail }: Happened): string => SAID[what]?.(detail) ?? what;

export const BIN_UNDO_DAYS = 30;
/** What can be taken back while nothing came after it. */
export const mayUndoBin = (what: string): boolean =>
	['rack made', 'edited', 'retired', 'merged'].includes(what);
