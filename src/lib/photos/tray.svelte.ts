import { onceKey } from '$lib/people/once-key';
import { PHOTO_BYTES, PHOTO_SAID, PHOTOS_AT_ONCE } from './limits';
import { Sending, type Desk } from './sending';
import { Taking } from './taking';
import type { Tools } from './tools';
import { Upload } from './upload.svelte';
import { SAID, type Account, type Target, type WaitingPhoto } from './waiting';

/** Another page may still be making small what it took so lately. */
const FRESH_MS = 30_000;
/** What was thrown away is forgotten by the next page that opens after so long. */
const REGRET_MS = 10 * 60_000;

/** The photos on this phone that the shop has not got yet. */
export class Tray implements Desk {
	list = $state.raw<Upload[]>([]);
	/** What other people took on this phone; it waits for them. */
	others = $state.raw<WaitingPhoto[]>([]);
	count = $derived(this.list.filter((one) => one.waiting).length);

	#taking: Taking;
	#sending: Sending;
	#listeners: Record<string, (() => void) | undefined> = {};

	constructor(
		private readonly account: Account,
		private readonly tools: Tools
	) {
		this.#sending = new Sending(tools, this);
		this.#taking = new Taking(tools, () => this.#sending.start());
	}

	/** Finds what lies on the phone: on opening, and when another page has changed it. */
	async look(): Promise<void> {
		const { person, shop } = this.account;
		const there = (await this.tools.phone.list().catch(() => [])).sort((a, b) => a.at - b.at);
		const mine = there.filter((one) => one.person === person && one.shop === shop);
		this.others = there.filter((one) => one.person !== person && !one.dropped);
		const old = this.tools.now() - REGRET_MS;
		await this.#forget(mine.filter((one) => one.dropped && one.due < old));
		for (const one of this.list)
			if (one.kept && one.state === 'waits' && !mine.some(({ key }) => key === one.key))
				one.state = 'sent';
		for (const photo of mine) if (!photo.dropped && !this.#find(photo.key)) this.#resume(photo);
		this.#sending.start();
	}

	#find = (key: string) => this.list.find((one) => one.key === key);

	#forget = (photos: WaitingPhoto[]) =>
		this.tools.phone.remove(photos.map(({ key }) => key)).catch(() => undefined);

	#resume(photo: WaitingPhoto): void {
		const done = photo.ready || photo.failed;
		if (!done && this.tools.now() - photo.at < FRESH_MS)
			return this.tools.later(FRESH_MS, () => void this.look());
		const one = new Upload(photo);
		one.kept = true;
		if (photo.thumb) one.preview = this.tools.link(new Blob([photo.thumb]));
		this.list = [...this.list, one];
		if (!done) this.#taking.again(one);
	}

	/** Takes photos onto the tray: kept on the phone, made small, sent. Returns how many were too many. */
	add(files: Iterable<File>, target: Target, whole = false): number {
		const all = [...files];
		for (const file of all.slice(0, PHOTOS_AT_ONCE)) this.#take(file, target, whole);
		return Math.max(0, all.length - PHOTOS_AT_ONCE);
	}

	#take(file: File, target: Target, whole: boolean): void {
		const one = new Upload({
			...{ ...target, ...this.account, key: onceKey(), file: file.name, type: file.type },
			...{ at: this.tools.now(), ready: false, tries: 0, due: 0, said: '', failed: false },
			...{ dropped: false, thumb: null }
		});
		this.list = [...this.list, one];
		if (file.size > PHOTO_BYTES) this.failed(one, PHOTO_SAID.size);
		else this.#taking.take(one, file, whole);
	}

	bytes = (one: Upload): Promise<Blob | undefined> => this.#taking.bytes(one);

	async stored(one: Upload): Promise<void> {
		await this.#forget([one.photo]);
		Object.assign(one, { state: 'sent', body: undefined });
		this.tools.tell();
	}

	failed(one: Upload, said: string): void {
		Object.assign(one, { state: 'failed', said });
		this.#note(one, { said, failed: true });
	}

	waits(one: Upload, said: string, due: number): void {
		Object.assign(one, { state: 'waits', said });
		this.#note(one, { said, due });
	}

	#note(one: Upload, change: Partial<WaitingPhoto>): void {
		Object.assign(one.photo, change);
		if (one.kept) void this.tools.phone.note(one.photo).then(this.tools.tell, () => undefined);
	}

	/** Tries a photo again now, under its own key. */
	retry(key: string): void {
		const one = this.#find(key);
		if (!one?.photo.ready || (one.state !== 'failed' && one.state !== 'waits')) return;
		Object.assign(one, { state: 'waits', said: '' });
		this.#note(one, { said: '', failed: false, tries: 0, due: 0 });
		this.#sending.start();
	}

	/** There may be a signal again: what waits for one goes now; what a busy shop put off stays put off. */
	wake(): void {
		for (const one of this.list)
			if (one.state === 'waits' && one.said !== SAID.busy) one.photo.due = 0;
		this.#sending.start();
	}

	/** Somebody wants all of them gone now. */
	retryAll(): void {
		for (const one of this.list) if (one.state === 'waits') this.retry(one.key);
	}

	/** Throws a photo away; for some minutes it can be taken back. */
	drop(key: string): void {
		const one = this.#find(key);
		if (!one?.waiting || one.state === 'going') return;
		one.state = 'dropped';
		this.#note(one, { dropped: true, due: this.tools.now() });
	}

	/** Takes back one that was thrown away. */
	undrop(key: string): void {
		const one = this.#find(key);
		if (one?.state !== 'dropped') return;
		this.#note(one, { dropped: false, due: 0 });
		one.state = one.photo.failed ? 'failed' : one.photo.ready ? 'waits' : 'shrinking';
		if (one.state === 'shrinking') this.#taking.again(one);
		this.#sending.start();
	}

	/** Hears when the photos of what a page shows are at rest after some of them have gone. */
	listen(page: string, call: () => void): () => void {
		this.#listeners[page] = call;
		return () => {
			if (this.#listeners[page] === call) this.#listeners[page] = undefined;
		};
	}

	atRest(page: string): void {
		if (this.list.some(({ state, photo }) => state === 'sent' && photo.page === page))
			this.#listeners[page]?.();
	}

	/** Takes what has gone to what a page shows off the tray. */
	clear(page: string): void {
		const gone = (one: Upload) => one.state === 'sent' && one.photo.page === page;
		for (const one of this.list.filter(gone)) this.tools.unlink(one.preview);
		this.list = this.list.filter((one) => !gone(one));
	}

	/** Throws away everything of this account, or of the others: somebody has been asked. */
	async empty(whose: 'mine' | 'others'): Promise<void> {
		const photos = whose === 'mine' ? this.list.map((one) => one.photo) : this.others;
		if (whose === 'mine') for (const one of this.list) one.state = 'dropped';
		else this.others = [];
		await this.#forget(photos);
		this.tools.tell();
	}
}
