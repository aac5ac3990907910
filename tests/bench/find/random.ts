/** Numbers that look random and are the same on every run. */
export class Random {
	#state: number;

	constructor(seed: number) {
		this.#state = seed >>> 0 || 1;
	}

	next(): number {
		this.#state = (this.#state + 0x6d2b79f5) >>> 0;
		let t = this.#state;
		t = Math.imul(t ^ (t >>> 15), t | 1);
		t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
		return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
	}

	below(count: number): number {
		return Math.floor(this.next() * count);
	}

	chance(share: number): boolean {
		return this.next() < share;
	}

	pick<T>(list: readonly T[]): T {
		return list[this.below(list.length)]!;
	}

	/** One of a list, the first ones far more often. */
	early<T>(list: readonly T[]): T {
		return list[Math.floor(list.length * this.next() ** 2.2)]!;
	}

	letters(count: number, of = 'ABCDEFGHJKLMNPQRSTUVWXYZ'): string {
		return Array.from({ length: count }, () => of[this.below(of.length)]).join('');
	}

	digits(count: number): string {
		return this.letters(count, '0123456789');
	}
}
