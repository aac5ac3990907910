import { z } from 'zod';
import { GRADES, PART_STATES } from '../parts/words';

const filter = (most = 60) =>
	z.string().trim().max(most, `Keep it under ${most} characters`).optional();

/** Where a page of answers ended: the five figures that order them. */
export const CURSOR = /^\d{1,2}\.\d{1,2}\.\d{1,6}\.\d{1,20}\.\d{1,18}$/;

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
