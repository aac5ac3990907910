import { z } from 'zod';
import { STOCK_IDS, type StockId } from './stocks';

/** So many labels go into one file. */
export const MOST_LABELS = 500;
const MOST_COPIES = 20;

const from = (what: string, most: number) => {
	const say = `Enter ${what} as a whole number from 1 to ${most}`;
	return z.coerce.number({ error: say }).int(say).min(1, say).max(most, say).default(1);
};

const name = z.string().trim().max(60).optional();

/** What is to be printed and on what, as an address says it. */
export const LabelChoice = z.object({
	/** Tags of parts, boxes, bins or blanks. */
	tag: z.array(z.string().max(20)).max(MOST_LABELS).default([]),
	/** Parts logged and boxes tagged today. */
	today: z.literal('yes').optional(),
	/** Everything in a bin. */
	bin: name,
	/** The signs of the bins: of a rack by its letters, or all. */
	signs: name,
	/** The boxes of a donor and its parts. */
	donor: name,
	/** Blank tags: of one batch by its number, or unused. */
	blanks: name,
	/** A search of the shelf, as its address carries it. */
	found: z.string().max(1000).optional(),
	stock: z.enum(STOCK_IDS, { error: 'Choose what the labels are printed on' }).optional(),
	copies: from('how many of each', MOST_COPIES),
	first: from('the place of the first label', 480)
});
export type LabelChoice = z.infer<typeof LabelChoice>;

/**
 * The choice in an address; tags may stand in one field with spaces or commas between. What cannot be read is
 * said and left out, so that the rest of what was chosen stays.
 */
export function readChoice(params: URLSearchParams): {
	choice: LabelChoice;
	problems: { field: string; message: string }[];
} {
	const said = Object.fromEntries([...params].filter(([, value]) => value.trim() !== ''));
	const tag = params.getAll('tag').flatMap((typed) => typed.split(/[\s,;]+/).filter(Boolean));
	const read = LabelChoice.safeParse({ ...said, tag });
	if (read.success) return { choice: read.data, problems: [] };
	const problems = read.error.issues.map(({ path, message }) => ({
		field: String(path[0]),
		message
	}));
	const wrong = problems.map((one) => one.field);
	const rest = Object.entries({ ...said, tag }).filter(([field]) => !wrong.includes(field));
	return { choice: LabelChoice.parse(Object.fromEntries(rest)), problems };
}

const WHAT = ['today', 'bin', 'signs', 'donor', 'blanks', 'found'] as const;

export const choosesSomething = (choice: LabelChoice): boolean =>
	choice.tag.length > 0 || WHAT.some((one) => choice[one] !== undefined);

/** What was chosen, as hidden fields of a form and as the address of its labels. */
export const choiceFields = (choice: LabelChoice): [name: string, value: string][] => [
	...choice.tag.map((tag): [string, string] => ['tag', tag]),
	...WHAT.flatMap((one): [string, string][] => (choice[one] ? [[one, choice[one]]] : []))
];

/** The address's search part for these labels on a stock. */
export const choiceSearch = (choice: LabelChoice, stock: StockId): string => {
	const { copies, first } = choice;
	const on: [string, string][] = [['stock', stock]];
	if (copies > 1) on.push(['copies', String(copies)]);
	if (first > 1) on.push(['first', String(first)]);
	return new URLSearchParams([...choiceFields(choice), ...on]).toString();
};
