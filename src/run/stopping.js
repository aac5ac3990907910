import { endRunning } from './processes.js';

/** @typedef {(now: boolean) => Promise<unknown>} Halt */

/** What has to be stopped, in the order opposite to its start. */
export class Stopping {
	/** @type {Halt[]} */
	#halts = [];
	/** @type {Promise<void> | null} */
	#done = null;
	#signalled = 0;

	/** @param {Halt} halt */
	add(halt) {
		this.#halts.push(halt);
	}

	/**
	 * The same for what is only starting: a stop in the meantime waits for it and stops it.
	 * @template {{ stop: Halt }} T
	 * @param {Promise<T>} starting
	 * @returns {Promise<T>}
	 */
	whenUp(starting) {
		this.add(async (now) => (await starting.catch(() => null))?.stop(now));
		return starting;
	}

	get begun() {
		return this.#done !== null;
	}

	/** @param {boolean} [now] without waiting for anything @returns {Promise<void>} */
	stop(now = false) {
		this.#done ??= this.#all(now);
		return this.#done;
	}

	/** @param {boolean} now */
	async #all(now) {
		for (let halt = this.#halts.pop(); halt; halt = this.#halts.pop()) {
			await halt(now).catch((error) => console.error('stopping:', error.message));
		}
	}

	/**
	 * The first Ctrl-C stops in order, the second one ends at once. Both npm and the terminal hand on the
	 * same Ctrl-C, so what follows within half a second is still the first.
	 * @param {() => void} [atOnce] what the second one kills
	 */
	onSignals(atOnce = () => {}) {
		for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
			process.on(signal, () => {
				const first = this.#signalled === 0;
				if (!first && performance.now() - this.#signalled < 500) return;
				if (!first) {
					atOnce();
					process.exit(130);
				}
				this.#signalled = performance.now();
				console.log('\nStopping ...');
				endRunning();
				this.stop().finally(() => process.exit(signal === 'SIGTERM' ? 0 : 130));
			});
		}
	}
}
