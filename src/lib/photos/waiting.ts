/** What a photo belongs to, and where it goes. */
export interface Target {
	/** Where it is sent. */
	api: string;
	/** What it shows, where that is told apart. */
	shot: string;
	/** More that goes with it, by field. */
	fields?: Record<string, string>;
	/** In words: Donor D12. */
	about: string;
	/** The page of what it belongs to. */
	page: string;
}

/** Whose photos these are: they never go out under anybody else. */
export interface Account {
	person: string;
	name: string;
	shop: string;
}

/** A photo that lies on this phone until the shop has it. */
export interface WaitingPhoto extends Target, Account {
	/** Made once, before the first sending, so that a photo sent twice is kept once. */
	key: string;
	file: string;
	type: string;
	/** When it was taken. */
	at: number;
	/** Shrunk, or found not to need it: from here on its bytes stay the same. */
	ready: boolean;
	tries: number;
	/** Not to be tried again before. */
	due: number;
	/** Why it has not gone. */
	said: string;
	failed: boolean;
	dropped: boolean;
	thumb: ArrayBuffer | null;
}

/** What the shop said to a photo; status 0 where nothing came back. */
export interface Answer {
	status: number;
	message?: string;
	/** Seconds it asks to be left alone. */
	after?: number;
}

export type Fate =
	| { what: 'stored' }
	| { what: 'later'; said: string; after: number }
	| { what: 'failed'; said: string };

export const SAID = {
	signal: 'No signal. It goes by itself when there is some.',
	session: 'Sign in again, then it goes by itself.',
	busy: 'The shop did not answer. It goes again by itself.',
	lost: 'The photo did not arrive. Send it again.'
} as const;

/** A fault of the server is worth so many tries; then somebody has to look. */
const MOST_TRIES = 12;
const FIRST_MS = 2000;
const LONGEST_MS = 5 * 60_000;

/** How long to wait after so many tries, in ms; `chance` from 0 to 1 keeps phones from coming all at once. */
export const pauseMs = (tries: number, chance: number): number =>
	Math.round(Math.min(FIRST_MS * 2 ** Math.max(0, tries - 1), LONGEST_MS) * (0.8 + 0.4 * chance));

/** What becomes of a photo after an answer; `tries` counts the one just made. */
export function fateOf(
	{ status, message, after = 0 }: Answer,
	tries: number,
	chance: number
): Fate {
	if (status >= 200 && status < 300) return { what: 'stored' };
	const pause = Math.max(pauseMs(tries, chance), after * 1000);
	if (status === 0) return { what: 'later', said: SAID.signal, after: pause };
	if (status === 401) return { what: 'later', said: SAID.session, after: pause };
	const again = status === 408 || status === 429 || status >= 500;
	if (again && tries < MOST_TRIES) return { what: 'later', said: SAID.busy, after: pause };
	return { what: 'failed', said: message ?? SAID.lost };
}

/** What the address of an upload belongs to: '/api/shop/donors/D12/photos' is Donor D12. */
export function targetOf(api: string, shot: string): Target {
	const page = api.replace(/^\/api/, '').replace(/\/photos$/, '');
	const [what, name] = page.split('/').slice(-2);
	const about = `${what === 'donors' ? 'Donor' : 'Part'} ${name ?? ''}`;
	return { api, shot, about, page };
}
