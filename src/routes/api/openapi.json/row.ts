import type { Ability } from '$lib/people/role';
import { extendZodWithOpenApi } from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';

// The schemas of answers below are given names, which zod learns here, before any of them is made.
extendZodWithOpenApi(z);

/** One call of the outside edge. */
export interface Row {
	method: 'get' | 'post' | 'put' | 'patch' | 'delete';
	/** As routes spell it, from /api/{shop} on; '' for a call outside a shop. */
	path: string;
	said: string;
	may: Ability;
	query?: z.ZodObject;
	body?: z.ZodType;
	/** Sent as a form with the file in the field `file` and these beside it. */
	form?: z.ZodObject;
	status?: 200 | 201;
	gives: z.ZodType | 'picture' | 'stream';
	/** Figures in, figures out: nothing changes, so no Idempotency-Key. */
	changesNothing?: boolean;
	/** Can be refused with 409: taken, changed meanwhile, a gate shut. */
	shut?: boolean;
}

export { z };
