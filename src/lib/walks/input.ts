import { z } from 'zod';
import { OUTCOMES, WALKS } from './words';

const short = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters`);

export const StartWalk = z.object({
	what: z.enum(WALKS, { error: 'Choose what to walk for' }),
	/** Fetch: only what is held for these. */
	for: short(80).optional()
});
export type StartWalk = z.infer<typeof StartWalk>;

const again = 'Reload the page and answer again';
const stop = z.coerce.number({ error: again }).int(again).positive(again);
/** The bin that one stands before, by its id; 0 for what lies nowhere. */
const place = z.coerce.number({ error: again }).int(again).min(0, again);

export const Answer = z.object({
	stop,
	outcome: z.enum(OUTCOMES, { error: 'Say what you found' }),
	/** Put away: where, if not where the list says. */
	bin: short(40).optional()
});
export type Answer = z.infer<typeof Answer>;

export const Stop = z.object({ stop });
export type Stop = z.infer<typeof Stop>;

export const AtPlace = z.object({ place });
export type AtPlace = z.infer<typeof AtPlace>;

const code = z
	.string({ error: 'Scan the tag, or type it' })
	.trim()
	.min(1, 'Scan the tag, or type it')
	.max(60, 'Scan the tag, or type it');

/** A part that lies where it does not belong: it stays here from now on, or goes back to its bin. */
export const Here = z.object({
	place,
	code,
	then: z.enum(['here', 'home'], { error: 'Say where it goes' })
});
export type Here = z.infer<typeof Here>;
