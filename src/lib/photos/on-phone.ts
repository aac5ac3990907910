import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import type { WaitingPhoto } from './waiting';

/** A photo chosen in a form that has not been sent. */
export interface Draft {
	key: string;
	/** Which form: the address of its page. */
	place: string;
	person: string;
	file: string;
	type: string;
	at: number;
	bytes: ArrayBuffer;
}

interface Shelf extends DBSchema {
	photo: { key: string; value: WaitingPhoto };
	body: { key: string; value: ArrayBuffer };
	draft: { key: string; value: Draft; indexes: { place: string } };
}

let opened: Promise<IDBPDatabase<Shelf>> | undefined;

const shelf = () =>
	(opened ??= openDB<Shelf>('endplay-photos', 1, {
		upgrade(db) {
			db.createObjectStore('photo', { keyPath: 'key' });
			db.createObjectStore('body');
			db.createObjectStore('draft', { keyPath: 'key' }).createIndex('place', 'place');
		},
		blocking: (_old, _new, event) => {
			opened = undefined;
			(event.target as IDBDatabase).close();
		},
		terminated: () => (opened = undefined)
	}));

/** Where photos lie on this phone until the shop has them. Each call fails where the phone keeps nothing. */
export const onPhone = {
	list: async (): Promise<WaitingPhoto[]> => (await shelf()).getAll('photo'),

	body: async (key: string): Promise<ArrayBuffer | undefined> => (await shelf()).get('body', key),

	/** The photo and its bytes, in one go. */
	async put(photo: WaitingPhoto, bytes: ArrayBuffer): Promise<void> {
		const tx = (await shelf()).transaction(['photo', 'body'], 'readwrite');
		await Promise.all([
			tx.objectStore('photo').put(photo),
			tx.objectStore('body').put(bytes, photo.key),
			tx.done
		]);
	},

	/** Puts the final bytes in place of the first; not once they are final, since they may be on their way. */
	async finish(photo: WaitingPhoto, bytes: ArrayBuffer): Promise<boolean> {
		const tx = (await shelf()).transaction(['photo', 'body'], 'readwrite');
		const there = await tx.objectStore('photo').get(photo.key);
		const open = there !== undefined && !there.ready && !there.dropped;
		if (open) {
			await tx.objectStore('photo').put(photo);
			await tx.objectStore('body').put(bytes, photo.key);
		}
		await tx.done;
		return open;
	},

	/** What became of it; nothing where another page has removed it. */
	async note(photo: WaitingPhoto): Promise<void> {
		const tx = (await shelf()).transaction('photo', 'readwrite');
		if (await tx.store.get(photo.key)) await tx.store.put(photo);
		await tx.done;
	},

	async remove(keys: string[]): Promise<void> {
		const tx = (await shelf()).transaction(['photo', 'body'], 'readwrite');
		for (const key of keys) {
			await tx.objectStore('photo').delete(key);
			await tx.objectStore('body').delete(key);
		}
		await tx.done;
	}
};

export type OnPhone = typeof onPhone;

/** Photos of forms that have not been sent, by the place of the form. */
export const drafts = {
	list: async (place: string, person: string): Promise<Draft[]> =>
		(await (await shelf()).getAllFromIndex('draft', 'place', place))
			.filter((one) => one.person === person)
			.sort((a, b) => a.at - b.at),

	async put(draft: Draft): Promise<void> {
		await (await shelf()).put('draft', draft);
	},

	async clear(place: string): Promise<void> {
		const tx = (await shelf()).transaction('draft', 'readwrite');
		for (const key of await tx.store.index('place').getAllKeys(place)) await tx.store.delete(key);
		await tx.done;
	},

	async drop(key: string): Promise<void> {
		await (await shelf()).delete('draft', key);
	},

	/** What was chosen a week ago and never sent is forgotten. */
	async tidy(now: number): Promise<void> {
		const tx = (await shelf()).transaction('draft', 'readwrite');
		for (const one of await tx.store.getAll())
			if (one.at < now - 7 * 86_400_000) await tx.store.delete(one.key);
		await tx.done;
	}
};
