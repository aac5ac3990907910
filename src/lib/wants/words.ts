/** Who waits: somebody the shop sells to, another shop, or the shop itself for a job on its bench. */
export const WAITERS = ['customer', 'neighbour shop', 'own job'] as const;
export type Waiter = (typeof WAITERS)[number];

export const WANT_STATES = [
	'waiting',
	'told',
	'said yes',
	'said no',
	'gone quiet',
	'got it',
	'taken off'
] as const;
export type WantState = (typeof WANT_STATES)[number];

/** How they are told. */
export const TELL_BY = ['e-mail', 'phone', 'text', 'in person'] as const;
export type TellBy = (typeof TELL_BY)[number];
