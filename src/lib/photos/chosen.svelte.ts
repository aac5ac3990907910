import { onceKey } from '$lib/people/once-key';
import { drafts, type Draft } from './on-phone';
import { shrinkPhoto } from './shrink';

export interface Chosen {
	key: string;
	file: File;
	preview: string;
}

/** The photos chosen in a form that is still being filled: made small, and kept on this phone until it is sent. */
export class ChosenPhotos {
	list = $state.raw<Chosen[]>([]);
	/** What was chosen here before the page was left. */
	before = $state.raw<Draft[]>([]);

	constructor(
		private readonly place: string,
		private readonly person: string,
		/** Hears of every change; the files are for the form's own field. */
		private readonly onChange: (files: File[]) => void
	) {}

	async look(): Promise<void> {
		await drafts.tidy(Date.now()).catch(() => undefined);
		this.before = await drafts.list(this.place, this.person).catch(() => []);
	}

	add(files: Iterable<File>): void {
		for (const file of files) {
			const one = { key: onceKey(), file, preview: URL.createObjectURL(file) };
			this.#set([...this.list, one]);
			void this.#keep(one, Date.now());
		}
	}

	/** What was chosen before goes into the form again. */
	useBefore(): void {
		const again = this.before.map(({ key, file, type, bytes }) => {
			const back = new File([bytes], file, { type });
			return { key, file: back, preview: URL.createObjectURL(back) };
		});
		this.before = [];
		this.#set([...this.list, ...again]);
	}

	async dropBefore(): Promise<void> {
		const keys = this.before.map(({ key }) => key);
		this.before = [];
		await Promise.all(keys.map(drafts.drop)).catch(() => undefined);
	}

	leaveOut(key: string): void {
		for (const one of this.list) if (one.key === key) URL.revokeObjectURL(one.preview);
		this.#set(this.list.filter((one) => one.key !== key));
		void drafts.drop(key).catch(() => undefined);
	}

	/** The form was sent, or emptied. */
	clear(): void {
		for (const { key } of this.list) this.leaveOut(key);
	}

	letGo(): void {
		for (const { preview } of this.list) URL.revokeObjectURL(preview);
	}

	#set(list: Chosen[]): void {
		this.list = list;
		this.onChange(list.map(({ file }) => file));
	}

	async #keep(one: Chosen, at: number): Promise<void> {
		await this.#put(one, at);
		const small = await shrinkPhoto(one.file, false, () => {});
		if (!small || !this.list.some(({ key }) => key === one.key)) return;
		const file = new File([small], one.file.name, { type: small.type });
		this.#set(this.list.map((each) => (each.key === one.key ? { ...each, file } : each)));
		await this.#put({ ...one, file }, at);
	}

	/** Where the phone keeps nothing, the form holds it all the same. */
	async #put({ key, file }: Chosen, at: number): Promise<void> {
		const { place, person } = this;
		const draft = { key, place, person, at, file: file.name, type: file.type };
		await file
			.arrayBuffer()
			.then((bytes) => drafts.put({ ...draft, bytes }))
			.catch(() => undefined);
	}
}
