import { openDB, type IDBPDatabase } from 'idb';
import type { BenchAnswer } from './answer';
import type { BenchView } from './view';

/** An answer on this phone, kept until the shop has it. */
export interface Waiting {
	/** Also its idempotency key: sent twice, it counts once. */
	key: string;
	/** Whose it is: it is only ever sent to this shop, by this person. */
	shop: string;
	person: string;
	donor: string;
	answer: BenchAnswer;
	kindName: string;
	/** When it was given; answers are sent in this order. */
	at: number;
	/** Why the shop did not take it, in words; it waits for a decision. */
	refused?: string;
}

/** Where waiting answers lie: the phone's own storage, or memory where a browser has none. */
export interface Store {
	all(): Promise<Waiting[]>;
	put(one: Waiting): Promise<void>;
	remove(key: string): Promise<void>;
	/** The bench as this phone saw it last, for where there is no signal. */
	seen(whose: string): Promise<BenchView | null>;
	see(whose: string, view: BenchView): Promise<void>;
}

const DATABASE = 'endplay-bench';
const ANSWERS = 'answers';
const SEEN = 'seen';

const MOST_SEEN = 20;

const inOrder = (list: Waiting[]) => list.sort((a, b) => a.at - b.at);

/** Nothing lasts here; for browsers that give a page no storage. */
export function memoryStore(): Store {
	const kept = new Map<string, Waiting>();
	const views = new Map<string, BenchView>();
	return {
		all: async () => inOrder([...kept.values()]),
		put: async (one) => void kept.set(one.key, structuredClone(one)),
		remove: async (key) => void kept.delete(key),
		seen: async (whose) => views.get(whose) ?? null,
		see: async (whose, view) => void views.set(whose, view)
	};
}

const phoneStore = (base: IDBPDatabase): Store => ({
	all: async () => inOrder(await base.getAll(ANSWERS)),
	put: async (one) => void (await base.put(ANSWERS, structuredClone(one))),
	remove: (key) => base.delete(ANSWERS, key),
	seen: async (whose) => (await base.get(SEEN, whose)) ?? null,
	see: async (whose, view) => {
		await base.put(SEEN, view, whose);
		const old = (await base.getAllKeys(SEEN)).filter((key) => key !== whose).slice(MOST_SEEN);
		for (const key of old) await base.delete(SEEN, key);
	}
});

async function opened(): Promise<Store> {
	try {
		const upgrade = (base: IDBPDatabase) => {
			base.createObjectStore(ANSWERS, { keyPath: 'key' });
			base.createObjectStore(SEEN);
		};
		return phoneStore(await openDB(DATABASE, 1, { upgrade }));
	} catch {
		return memoryStore();
	}
}

/** The phone's storage, where answers outlive the page, the battery and the signal; opened at first use. */
export function onPhone(): Store {
	let store: Promise<Store> | undefined;
	const open = () => (store ??= opened());
	return {
		all: async () => (await open()).all(),
		put: async (one) => (await open()).put(one),
		remove: async (key) => (await open()).remove(key),
		seen: async (whose) => (await open()).seen(whose),
		see: async (whose, view) => (await open()).see(whose, view)
	};
}
