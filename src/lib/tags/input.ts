import { z } from 'zod';

/** So many blank tags are made at once; so many may wait for their things. */
export const MOST_BLANKS = 200;
export const MOST_UNUSED = 2000;

const HOW_MANY = `Enter how many, from 1 to ${MOST_BLANKS}`;

export const BlanksInput = z.object({
	count: z.coerce
		.number({ error: HOW_MANY })
		.int(HOW_MANY)
		.min(1, HOW_MANY)
		.max(MOST_BLANKS, HOW_MANY)
});
export type BlanksInput = z.infer<typeof BlanksInput>;

/** The code of the blank tag that hangs on a new thing already. */
export const BlankTag = z.string().trim().max(20, 'Type the five characters of the tag').optional();

const WHICH = 'Type the number of the donor, like D12';

export const BoxForm = z.object({
	donor: z.string({ error: WHICH }).trim().min(1, WHICH).max(20, WHICH)
});
