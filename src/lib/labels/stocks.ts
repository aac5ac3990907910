/** Millimetres: the page, the label on it, how many there are and how far from one to the next. */
export interface Measures {
	pageWidth: number;
	pageHeight: number;
	width: number;
	height: number;
	across: number;
	down: number;
	left: number;
	top: number;
	pitchX: number;
	pitchY: number;
}

export const STOCK_IDS = [
	...(['roll-62x29', 'roll-2x1', 'roll-4x6', 'a4', 'letter', 'cut-a4', 'cut-letter'] as const)
];
export type StockId = (typeof STOCK_IDS)[number];

export interface Stock {
	id: StockId;
	said: string;
	hint: string;
	measures: Measures;
	/** Several on a page. */
	sheet: boolean;
	/** Plain paper: lines show where to cut. */
	cut: boolean;
}

const roll = (width: number, height: number): Measures => ({
	...{ pageWidth: width, pageHeight: height, width, height },
	...{ across: 1, down: 1, left: 0, top: 0, pitchX: width, pitchY: height }
});
const A4 = { pageWidth: 210, pageHeight: 297 };
const LETTER = { pageWidth: 215.9, pageHeight: 279.4 };

const of = (
	id: StockId,
	said: string,
	hint: string,
	measures: Measures,
	kind: '' | 'sheet' | 'cut' = ''
): Stock => ({ id, said, hint, measures, sheet: kind !== '', cut: kind === 'cut' });

export const STOCKS: readonly Stock[] = [
	of('roll-62x29', 'Roll, 62 × 29 mm', 'one label a page', roll(62, 29)),
	of('roll-2x1', 'Roll, 2 × 1 in', 'one label a page', roll(50.8, 25.4)),
	of('roll-4x6', 'Roll or card, 4 × 6 in', 'one large label a page', roll(101.6, 152.4)),
	of(
		'a4',
		'A4 sheet of labels',
		'14 labels of 99.1 × 38.1 mm, or your own measures',
		{
			...{ ...A4, width: 99.1, height: 38.1, across: 2, down: 7 },
			...{ left: 4.65, top: 15.15, pitchX: 101.6, pitchY: 38.1 }
		},
		'sheet'
	),
	of(
		'letter',
		'Letter sheet of labels',
		'10 labels of 4 × 2 in, or your own measures',
		{
			...{ ...LETTER, width: 101.6, height: 50.8, across: 2, down: 5 },
			...{ left: 3.96, top: 12.7, pitchX: 106.4, pitchY: 50.8 }
		},
		'sheet'
	),
	of(
		'cut-a4',
		'Plain A4 paper to cut',
		'10 tags of 90 × 54 mm with lines to cut along',
		{
			...{ ...A4, width: 90, height: 54, across: 2, down: 5 },
			...{ left: 15, top: 13.5, pitchX: 90, pitchY: 54 }
		},
		'cut'
	),
	of(
		'cut-letter',
		'Plain Letter paper to cut',
		'8 tags of 3.5 × 2.4 in with lines to cut along',
		{
			...{ ...LETTER, width: 88.9, height: 61, across: 2, down: 4 },
			...{ left: 19.05, top: 17.7, pitchX: 88.9, pitchY: 61 }
		},
		'cut'
	)
];

export const isStockId = (word: string): word is StockId => STOCK_IDS.some((id) => id === word);

/** The measures that a shop keeps of its own sheets; what it has not set is as it is sold. */
export type OwnMeasures = Partial<Record<StockId, Measures>>;

export function stockOf(id: StockId, own: OwnMeasures = {}): Stock {
	const stock = STOCKS.find((one) => one.id === id)!;
	return { ...stock, measures: own[id] ?? stock.measures };
}

export const perPage = ({ across, down }: Measures): number => across * down;

/** Where the labels of a page lie, row by row, in mm from its upper left corner. */
export const placesOn = (m: Measures): { x: number; y: number }[] =>
	Array.from({ length: perPage(m) }, (_, at) => ({
		x: m.left + (at % m.across) * m.pitchX,
		y: m.top + Math.floor(at / m.across) * m.pitchY
	}));

export interface Placed {
	page: number;
	x: number;
	y: number;
}

/** Where so many labels go, page after page, from the place on the first sheet where labels are left. */
export function placesFor(count: number, first: number, m: Measures): Placed[] {
	const places = placesOn(m);
	return Array.from({ length: count }, (_, at) => {
		const nth = first - 1 + at;
		const place = places[nth % places.length]!;
		return { page: Math.floor(nth / places.length), ...place };
	});
}
