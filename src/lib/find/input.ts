import { z } from 'zod';
import { GRADES, PART_STATES, PROOFS } from '../parts/words';

const filter = (most = 60) =>
	z.string().trim().max(most, `Keep it under ${most} characters`).optional();

/** Where a page of answers ended: the two figures that order them. */
export const CURSOR = /^-?\d{1,19}\.-?\d{1,19}$/;

/** How it was proved: one way, any test, or not at all. */
export const PROOF_FILTERS = [...PROOFS, 'tested', 'unproved'] as const;
export type ProofFilter = (typeof PROOF_FILTERS)[number];

/** What a list of answers can be put in order by; fit is how well each answers. */
export const SORTS = [
	'fit',
	'kind',
	'engine',
	'bin',
	'grade',
	'state',
	'asked',
	'new',
	'copy',
	'age'
] as const;
export type FindSort = (typeof SORTS)[number];

/** What is asked for a part, in whole money: 10-25, -50, 100- or none. */
export const PRICE = /^(?:\d{1,6}-\d{1,6}|\d{1,6}-|-\d{1,6}|none)$/;

/** What may be asked of the shelf. The words are cut, not refused: whatever is pasted is looked for. */
export const FindQuery = z.object({
	q: z
		.string()
		.transform((typed) => typed.slice(0, 200).trim())
		.optional(),
	kind: filter(),
	grade: z.enum(GRADES, { error: `Choose a grade: ${GRADES.join(', ')}` }).optional(),
	bin: filter(),
	state: z.enum(PART_STATES, { error: `Choose a state: ${PART_STATES.join(', ')}` }).optional(),
	donor: filter(20),
	engine: filter(120),
	price: z.string().regex(PRICE, 'Enter the price like 10-25, -50, 100- or none').optional(),
	proof: z
		.enum(PROOF_FILTERS, { error: `Choose how it was proved: ${PROOF_FILTERS.join(', ')}` })
		.optional(),
	/** One of a group of the same things, as `group.same` says it. */
	same: z
		.string()
		.regex(/^-?\d{1,19}$/, 'Take the group as it was given')
		.optional(),
	/** Whether the same things stand as one answer. */
	together: z.enum(['yes', 'no'], { error: 'Enter yes or no' }).optional(),
	sort: z.enum(SORTS, { error: `Choose an order: ${SORTS.join(', ')}` }).optional(),
	down: z.enum(['yes', 'no'], { error: 'Enter yes or no' }).optional(),
	limit: z.coerce
		.number({ error: 'Enter the limit as a whole number' })
		.int('Enter the limit as a whole number')
		.min(1, 'Enter a limit of 1 to 100')
		.max(100, 'Enter a limit of 1 to 100')
		.default(25),
	cursor: z.string().regex(CURSOR, 'Start the list again from its beginning').optional()
});
export type FindQuery = z.infer<typeof FindQuery>;

/** The question in an address; what was left empty was not asked. */
export const readQuestion = (params: URLSearchParams): FindQuery =>
	FindQuery.parse(Object.fromEntries([...params].filter(([, value]) => value !== '')));

/** The same as a page shows it: as tags the same things stand together, in a table each by itself. */
export function readPageQuestion(params: URLSearchParams) {
	const view = params.get('view') === 'table' ? 'table' : '';
	const together: FindQuery['together'] = view === '' && !params.get('same') ? 'yes' : 'no';
	const columns = (params.get('columns') ?? '').slice(0, 200);
	return { query: { ...readQuestion(params), together }, view, columns };
}
