export const WALKS = ['put away', 'fetch', 'count', 'purge'] as const;
export type WalkWhat = (typeof WALKS)[number];

/** How a stop of a walk ended. */
export const OUTCOMES = [
	'found',
	'not there',
	'put away',
	'moved here',
	'empty',
	'scrapped',
	'price down',
	'kept',
	'no longer made'
] as const;
export type Outcome = (typeof OUTCOMES)[number];

/** What may be said at a stop of each walk. */
export const ANSWERS: Record<WalkWhat, readonly Outcome[]> = {
	'put away': ['put away', 'not there'],
	fetch: ['found', 'not there'],
	count: ['found', 'not there', 'empty', 'moved here'],
	purge: ['scrapped', 'price down', 'kept', 'no longer made', 'not there']
};

export const OUTCOME_SAID: Record<Outcome, string> = {
	found: 'there',
	'not there': 'not there: missing',
	'put away': 'put away',
	'moved here': 'lay here, put right',
	empty: 'nothing should lie here',
	scrapped: 'scrapped',
	'price down': 'price down',
	kept: 'kept',
	'no longer made': 'kept: no longer made'
};
