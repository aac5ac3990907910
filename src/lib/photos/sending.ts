import type { Tools } from './tools';
import type { Upload } from './upload.svelte';
import { fateOf, type Fate } from './waiting';

const AT_ONCE = 2;
const SOON_MS = 5000;

/** Where the sender finds its photos, and whom it tells what became of them. */
export interface Desk {
	list: readonly Upload[];
	bytes(one: Upload): Promise<Blob | undefined>;
	stored(one: Upload): Promise<void>;
	failed(one: Upload, said: string): void;
	waits(one: Upload, said: string, due: number): void;
	/** Nothing of what this page shows is on its way now. */
	atRest(page: string): void;
}

/** Sends what is due, two at a time; what fails stops no other. */
export class Sending {
	#planned = Infinity;

	constructor(
		private readonly tools: Tools,
		private readonly desk: Desk
	) {}

	start(): void {
		const now = this.tools.now();
		const due = this.desk.list.filter((one) => one.state === 'waits' && one.photo.due <= now);
		const free = AT_ONCE - this.desk.list.filter((one) => one.state === 'going').length;
		for (const one of due.slice(0, Math.max(0, free))) void this.#run(one);
		this.#plan(now);
	}

	/** Looks again when the next one is due. */
	#plan(now: number): void {
		const waits = this.desk.list.filter((one) => one.state === 'waits' && one.photo.due > now);
		const next = Math.min(...waits.map((one) => one.photo.due));
		if (next >= this.#planned || next === Infinity) return;
		this.#planned = next;
		this.tools.later(next - now, () => {
			this.#planned = Infinity;
			this.start();
		});
	}

	async #run(one: Upload): Promise<void> {
		Object.assign(one, { state: 'going', share: 0, said: '' });
		const fate = await this.tools.alone(one.key, () => this.#send(one)).catch(() => null);
		if (fate?.what === 'stored') await this.desk.stored(one);
		else if (fate?.what === 'failed') this.desk.failed(one, fate.said);
		else this.desk.waits(one, fate?.said ?? '', this.tools.now() + (fate?.after ?? SOON_MS));
		if (
			!this.desk.list.some(({ state, photo }) => state === 'going' && photo.page === one.photo.page)
		)
			this.desk.atRest(one.photo.page);
		this.start();
	}

	async #send(one: Upload): Promise<Fate> {
		const body = await this.desk.bytes(one);
		// Another page of this phone has sent it.
		if (!body) return { what: 'stored' };
		one.photo.tries += 1;
		const answer = await this.tools.send(one.photo, body, (share) => (one.share = share));
		return fateOf(answer, one.photo.tries, this.tools.chance());
	}
}
