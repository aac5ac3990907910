import type { Tools } from './tools';
import type { Upload } from './upload.svelte';

/** Puts photos on the phone, then makes them small, one after the other. */
export class Taking {
	#queue: Promise<void> = Promise.resolve();

	constructor(
		private readonly tools: Tools,
		private readonly onReady: () => void
	) {}

	/** A photo that was just taken. */
	take(one: Upload, file: File, whole: boolean): void {
		const kept = this.#keep(one, file);
		this.#next(() => this.#shrink(one, file, whole, kept));
	}

	/** One that lies on the phone and was not made small before its page was left. */
	again(one: Upload): void {
		this.#next(async () => {
			const file = await this.bytes(one);
			if (file) await this.#shrink(one, file, false);
		});
	}

	/** What would be sent; undefined where the phone has it no more. */
	async bytes(one: Upload): Promise<Blob | undefined> {
		if (!one.kept) return one.body;
		const bytes = await this.tools.phone.body(one.key);
		return bytes && new Blob([bytes], { type: one.photo.type });
	}

	#next(work: () => Promise<void>): void {
		this.#queue = this.#queue.then(work).catch(() => undefined);
	}

	async #keep(one: Upload, file: Blob): Promise<void> {
		one.body = file;
		try {
			await this.tools.phone.put(one.photo, await file.arrayBuffer());
			one.kept = true;
			one.body = undefined;
			this.tools.tell();
		} catch {
			// No room, or a window that keeps nothing: it goes from memory.
			one.kept = false;
		}
	}

	async #shrink(one: Upload, file: Blob, whole: boolean, kept?: Promise<void>): Promise<void> {
		if (one.state !== 'shrinking') return;
		let thumb: Promise<ArrayBuffer> | undefined;
		const small = await this.tools.shrink(file, whole, (picture) => {
			this.tools.unlink(one.preview);
			one.preview = this.tools.link(picture);
			thumb = picture.arrayBuffer();
		});
		await kept;
		if (one.state !== 'shrinking') return;
		await this.#finish(one, small ?? file, (await thumb) ?? one.photo.thumb);
	}

	/** From here on its bytes stay the same. */
	async #finish(one: Upload, body: Blob, thumb: ArrayBuffer | null): Promise<void> {
		Object.assign(one.photo, { ready: true, type: body.type, thumb });
		if (!one.kept) one.body = body;
		else await this.tools.phone.finish(one.photo, await body.arrayBuffer());
		one.state = 'waits';
		this.onReady();
	}
}
