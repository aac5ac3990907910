import { onceKey } from '$lib/people/once-key';
import type { BenchAnswer } from './answer';
import type { Store, Waiting } from './queue';
import type { Sent, Taken } from './send';

export interface Bench {
	shop: string;
	person: string;
	/** Left out: every donor's. */
	donor?: string;
}

interface Does {
	send(one: Waiting): Promise<Sent>;
	/** The shop has taken it; null: it was left on. */
	taken(one: Waiting, made: Taken | null): void;
	now(): number;
	/** Calls back later; returns how to think better of it. */
	later(work: () => void, ms: number): () => void;
}

const FIRST_WAIT_MS = 1_000;
const LONGEST_WAIT_MS = 30_000;

/**
 * The answers of one phone at the bench: shown at once, kept on the phone, sent one after the other in the
 * order they were given. What does not get through is sent again, with growing waits; what is refused
 * waits aside for a person and stops nobody.
 */
export class BenchAnswers {
	/** Oldest first. */
	list = $state<Waiting[]>([]);
	/** The last try got no answer. */
	cut = $state(false);

	#sending = false;
	#wait = FIRST_WAIT_MS;
	#callOff = () => {};
	#last = 0;

	constructor(
		private readonly bench: Bench,
		private readonly store: Store,
		private readonly does: Does
	) {}

	/** Picks up what this person left on this phone. */
	async load(): Promise<void> {
		const { shop, person, donor } = this.bench;
		this.list = (await this.store.all()).filter(
			(one) =>
				one.shop === shop && one.person === person && (donor === undefined || one.donor === donor)
		);
		void this.send();
	}

	/** Counts at once; on the phone before it is sent. */
	async add(donor: string, answer: BenchAnswer, kindName: string): Promise<string> {
		// two answers of one millisecond still stand in order
		this.#last = Math.max(this.does.now(), this.#last + 1);
		const { shop, person } = this.bench;
		const one = { key: onceKey(), shop, person, donor, answer, kindName, at: this.#last };
		this.list.push(one);
		await this.store.put(one);
		void this.send();
		return one.key;
	}

	/** Takes back an answer that the shop does not have. */
	async drop(key: string): Promise<void> {
		this.list = this.list.filter((one) => one.key !== key);
		await this.store.remove(key);
	}

	/** Once more, now. */
	async retry(key: string): Promise<void> {
		const one = this.list.find((each) => each.key === key);
		if (!one) return;
		delete one.refused;
		await this.store.put($state.snapshot(one));
		void this.send();
	}

	/** Sends what waits, now. */
	async send(): Promise<void> {
		if (this.#sending) return;
		this.#sending = true;
		this.#callOff();
		try {
			while (await this.#next());
		} finally {
			this.#sending = false;
		}
	}

	stop(): void {
		this.#callOff();
	}

	async #next(): Promise<boolean> {
		const one = this.list.find(({ refused }) => refused === undefined);
		if (!one) return false;
		const sent = await this.does.send($state.snapshot(one));
		if ('lost' in sent) return this.#tryLater();
		this.cut = false;
		this.#wait = FIRST_WAIT_MS;
		if ('refused' in sent) {
			one.refused = sent.refused;
			await this.store.put($state.snapshot(one));
			return true;
		}
		await this.store.remove(one.key);
		this.does.taken(one, sent.taken);
		this.list = this.list.filter(({ key }) => key !== one.key);
		return true;
	}

	#tryLater(): false {
		this.cut = true;
		this.#callOff = this.does.later(() => void this.send(), this.#wait);
		this.#wait = Math.min(this.#wait * 2, LONGEST_WAIT_MS);
		return false;
	}
}
