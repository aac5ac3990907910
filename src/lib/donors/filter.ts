import { z } from 'zod';
import { DONOR_STATES } from './words';

/** What a list of donors is asked for, as an address carries it. */
export const DonorFilter = z.object({
	state: z.enum(DONOR_STATES, { error: 'Choose a state of donors' }).optional(),
	q: z.string().max(120).optional(),
	cursor: z.coerce.number().int().positive().optional(),
	limit: z.coerce.number().int().min(1).max(100).optional()
});
export type DonorFilter = z.infer<typeof DonorFilter>;
