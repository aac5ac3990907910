/** The verdict as it is stamped. */
export type VerdictWord = 'keep' | 'close call' | 'let it go' | 'needs a price' | 'never';

/** What is known of a part's worth, in cents; null or undefined = not known. */
export interface WorthFigures {
	scrapCents?: number | null;
	newCents?: number | null;
	copyCents?: number | null;
	askedCents?: number | null;
	payFromCents?: number | null;
}

export interface Mark {
	name: 'scrap' | 'pays from' | 'copy' | 'new' | 'asked';
	cents: number;
	/** Place on the line, 0 to 100. */
	at: number;
}

export interface Label {
	name: Mark['name'];
	text: string;
	x: number;
	anchor: 'start' | 'middle' | 'end';
	row: 'over' | 'under' | 'far';
}

// The narrowest line that is drawn, and the widths of the two faces on it, in pixels.
const NARROWEST = 280;
const SMALL = 7.7;
const BIG = 10.6;
const BETWEEN = 9;

const known = (cents: number | null | undefined): cents is number =>
	cents !== null && cents !== undefined && Number.isFinite(cents);

/** The marks in their places, left to right of the price; empty when nothing spans a line. */
export function marks(figures: WorthFigures): Mark[] {
	const given = (
		[
			['scrap', figures.scrapCents ?? 0],
			['pays from', figures.payFromCents],
			['copy', figures.copyCents],
			['new', figures.newCents],
			['asked', figures.askedCents]
		] as const
	).flatMap(([name, cents]) => (known(cents) ? [{ name, cents }] : []));
	if (!given.some(({ name }) => name === 'new' || name === 'copy' || name === 'asked')) return [];
	const low = Math.min(...given.map(({ cents }) => cents));
	const span = Math.max(...given.map(({ cents }) => cents)) - low;
	if (span <= 0) return [];
	return given.map((mark) => ({ ...mark, at: round(((mark.cents - low) / span) * 100) }));
}

/**
 * Labels for the marks such that none overlaps another on a line of 280 px or more. The asked price
 * always has its label; the others move to a free row, and the last of them goes without.
 */
export function labels(found: Mark[], say: (cents: number) => string): Label[] {
	const taken: { row: Label['row']; from: number; to: number }[] = [];
	const order: Mark['name'][] = ['asked', 'pays from', 'new', 'copy', 'scrap'];
	return order.flatMap((name) => {
		const mark = found.find((one) => one.name === name);
		if (!mark) return [];
		const text = say(mark.cents);
		const asked = name === 'asked';
		const width = (name.length + 1) * SMALL + text.length * (asked ? BIG : SMALL + 1);
		const place = spot(mark.at, width);
		const rows: Label['row'][] = asked ? ['over'] : ['under', 'over', 'far'];
		const row = rows.find((one) => taken.every((t) => t.row !== one || apart(t, place)));
		if (!row) return [];
		taken.push({ row, from: place.from, to: place.to });
		return [{ name, text, row, x: place.x, anchor: place.anchor }];
	});
}

function spot(at: number, width: number) {
	const centre = (at / 100) * NARROWEST;
	const half = width / 2;
	if (centre < half) return { x: 0, anchor: 'start' as const, from: 0, to: width };
	if (centre > NARROWEST - half)
		return { x: 100, anchor: 'end' as const, from: NARROWEST - width, to: NARROWEST };
	return { x: at, anchor: 'middle' as const, from: centre - half, to: centre + half };
}

const apart = (a: { from: number; to: number }, b: { from: number; to: number }) =>
	a.to + BETWEEN <= b.from || b.to + BETWEEN <= a.from;

const round = (value: number) => Math.round(value * 100) / 100;

/** The line in words, for those who do not see it. */
export function worthInWords(found: Mark[], say: (cents: number) => string): string {
	const told = found.map((mark) => `${mark.name} ${say(mark.cents)}`).join(', ');
	const asked = found.find((mark) => mark.name === 'asked');
	const from = found.find((mark) => mark.name === 'pays from');
	if (!asked || !from) return `Worth: ${told}.`;
	const over = asked.cents - from.cents;
	const where = over < 0 ? 'below' : 'above';
	return `Worth: ${told}. Asked is ${say(Math.abs(over))} ${where} where it pays.`;
}
