import type { Outcome, WalkWhat } from './words';

export const WALK_SAID: Record<WalkWhat, { title: string; lead: string }> = {
	'put away': { title: 'Put away', lead: 'What was pulled and lies about, each to its best bin' },
	fetch: { title: 'Fetch', lead: 'What is held, for jobs and customers' },
	count: { title: 'Count', lead: 'Is it still there? Ten bins, those not counted for longest' },
	purge: { title: 'Purge', lead: 'What nobody calls for, or is not worth its place' }
};

/** What the buttons at a stop say. */
export const ANSWER_SAID: Record<Outcome, string> = {
	found: 'There',
	'not there': 'Not there',
	'put away': 'Put it there',
	'moved here': 'Put right',
	empty: 'Nothing here',
	scrapped: 'Scrap it',
	'price down': 'Price down',
	kept: 'Keep it',
	'no longer made': 'Keep: no longer made'
};

/** The one answer for all at a place, as its button says it. */
export function allSaid(what: WalkWhat, open: number, empty: boolean, address: string): string {
	if (empty) return 'Nothing here: right';
	if (what === 'put away') return open === 1 ? `Put in ${address}` : `All ${open} in ${address}`;
	if (what === 'fetch') return open === 1 ? 'Got it' : `Got all ${open}`;
	return open === 1 ? 'It is there' : `All ${open} are there`;
}
