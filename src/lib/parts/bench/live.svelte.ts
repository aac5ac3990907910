import type { Taken } from './send';
import type { Waiting } from './queue';
import type { BenchDone, BenchView } from './view';

const POLL_MS = 10_000;

interface Where {
	/** Where the bench is read. */
	api: string;
	/** Where a word comes from when something changed. */
	stream: string;
}

const doneOf = (one: Waiting, made: Taken): BenchDone => ({
	...{ tag: made.tag, kind: one.answer.kind, kindName: one.kindName },
	...{ grade: made.grade, state: made.state, place: made.bin, destroyed: made.destroyed },
	...{ by: '', mine: true, at: new Date(one.at), undo: made.history[0]?.id ?? null }
});

/** The bench as everybody's answers make it: read anew at a word from the shop, and now and then without one. */
export class LiveBench {
	view = $state.raw<BenchView>() as BenchView;

	#changes = 0;
	#reading = false;
	#end: (() => void)[] = [];

	constructor(
		view: BenchView,
		public where: Where,
		private readonly seen: (view: BenchView) => void
	) {
		this.view = view;
	}

	/** Counts an answer of this phone before the bench is read anew. */
	taken(one: Waiting, made: Taken | null): void {
		this.#changes++;
		const { kind } = one.answer;
		const { kinds, done, leftOn, logged } = this.view;
		this.view = {
			...this.view,
			kinds: kinds.filter((each) => each.kind !== kind),
			done: made ? [doneOf(one, made), ...done] : done,
			leftOn: made ? leftOn : [...leftOn, { kind, kindName: one.kindName, by: '' }],
			logged: logged + (made ? 1 : 0)
		};
		this.seen(this.view);
		void this.read();
	}

	/** Reads the bench; what changed while it was read is read again. Without a signal it stays as it is. */
	async read(): Promise<void> {
		this.#changes++;
		if (this.#reading) return;
		this.#reading = true;
		try {
			let at;
			do {
				at = this.#changes;
				const answer = await fetch(this.where.api);
				if (!answer.ok) break;
				const view: BenchView = await answer.json();
				if (at !== this.#changes) continue;
				this.view = view;
				this.seen(view);
			} while (at !== this.#changes);
		} catch {
			// no signal: the next word or the next look comes
		} finally {
			this.#reading = false;
		}
	}

	watch(): void {
		const stream = new EventSource(this.where.stream);
		const look = () => void this.read();
		const seen = () => document.visibilityState === 'visible' && look();
		stream.addEventListener('changed', look);
		// a proxy may hold the stream back, and a phone that slept has missed words
		const poll = setInterval(seen, POLL_MS);
		document.addEventListener('visibilitychange', seen);
		this.#end = [
			() => stream.close(),
			() => clearInterval(poll),
			() => document.removeEventListener('visibilitychange', seen)
		];
	}

	stop(): void {
		this.#end.forEach((each) => each());
	}
}
