import { onceKey } from '$lib/people/once-key';
import type { Outgoing } from './send';

export interface Upload extends Outgoing {
	preview: string;
	state: 'waits' | 'going' | 'sent' | 'failed';
	share: number;
	said: string;
}

export type Send = (photo: Outgoing, onShare: (share: number) => void) => Promise<void>;

/** The tray of photos on their way: two at a time, each on its own, a failed one stops no other. */
export class Uploads {
	list = $state<Upload[]>([]);

	constructor(
		private readonly send: Send,
		private readonly onIdle: () => void = () => {},
		private readonly atOnce = 2
	) {}

	add(files: Iterable<File>, shot: string, preview: (file: File) => string): void {
		for (const file of files)
			this.list.push({
				key: onceKey(),
				file,
				shot,
				preview: preview(file),
				state: 'waits',
				share: 0,
				said: ''
			});
		this.#start();
	}

	retry(key: string): void {
		const upload = this.list.find((one) => one.key === key);
		if (upload?.state !== 'failed') return;
		upload.state = 'waits';
		this.#start();
	}

	/** Takes the sent ones off the tray. Returns them, so that their previews can be let go. */
	clear(): Upload[] {
		const sent = this.list.filter((one) => one.state === 'sent');
		this.list = this.list.filter((one) => one.state !== 'sent');
		return sent;
	}

	#count = (state: Upload['state']) => this.list.filter((one) => one.state === state).length;

	#start(): void {
		while (this.#count('going') < this.atOnce) {
			const next = this.list.find((one) => one.state === 'waits');
			if (!next) break;
			void this.#run(next);
		}
		if (this.#count('going') === 0 && this.#count('sent') > 0) this.onIdle();
	}

	async #run(upload: Upload): Promise<void> {
		Object.assign(upload, { state: 'going', share: 0, said: '' });
		try {
			await this.send(upload, (share) => (upload.share = share));
			upload.state = 'sent';
		} catch (fault) {
			upload.state = 'failed';
			upload.said = fault instanceof Error ? fault.message : String(fault);
		}
		this.#start();
	}
}
