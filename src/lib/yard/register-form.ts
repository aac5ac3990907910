import { z } from 'zod';

const day = z.iso.date().optional().catch(undefined);

/** What the register is narrowed to; stands in the address of the page. */
const Asked = z.object({
	q: z.string().trim().max(60).optional().catch(undefined),
	from: day,
	to: day,
	cursor: z.coerce.number().int().positive().optional().catch(undefined)
});

export const registerAsked = (params: URLSearchParams) =>
	Asked.parse(Object.fromEntries([...params].filter(([, value]) => value !== '')));
