import type { Level } from '$lib/trade';
import type { Item } from './market';
import type { Size } from './scenario';
import type { BenchPart } from './world';

/** A part that was logged and stands on the shelf. */
export interface Unit {
	part: BenchPart;
	tested: boolean;
	since: number;
	/** What the rule last thought it worth, once it did. */
	score: number;
	scored: boolean;
}

const RANK: Readonly<Record<Level, number>> = { high: 0, medium: 1, low: 2, ruined: 3 };

/** The better grade goes first, then the tested one, then the older. */
function goesBefore(a: Unit, b: Unit): boolean {
	const by = RANK[a.part.level] - RANK[b.part.level];
	if (by !== 0) return by < 0;
	if (a.tested !== b.tested) return a.tested;
	return a.since <= b.since;
}

export class Shelf {
	private readonly queues = new Map<Item, Unit[]>();
	private readonly sizes: Record<Size, Set<Unit>> = {
		s: new Set(),
		m: new Set(),
		l: new Set(),
		xl: new Set()
	};

	constructor(readonly places: Readonly<Record<Size, number>>) {}

	/** The ones that answer the same call, the first to go first. */
	queue(item: Item): readonly Unit[] {
		return this.queues.get(item) ?? [];
	}

	ofSize(size: Size): ReadonlySet<Unit> {
		return this.sizes[size];
	}

	all(): Unit[] {
		return Object.values(this.sizes).flatMap((units) => [...units]);
	}

	isFull(size: Size): boolean {
		return this.sizes[size].size >= this.places[size];
	}

	isOver(size: Size): boolean {
		return this.sizes[size].size > this.places[size];
	}

	put(unit: Unit): void {
		const { item } = unit.part;
		const queue = this.queues.get(item) ?? [];
		const before = queue.findIndex((other) => !goesBefore(other, unit));
		queue.splice(before < 0 ? queue.length : before, 0, unit);
		this.queues.set(item, queue);
		this.sizes[item.kind.size].add(unit);
	}

	take(unit: Unit): void {
		const queue = this.queues.get(unit.part.item) ?? [];
		const at = queue.indexOf(unit);
		if (at < 0) throw new Error('taken from the shelf twice');
		queue.splice(at, 1);
		this.sizes[unit.part.item.kind.size].delete(unit);
	}

	/** Place in the queue that a part of this level would get: equal or better ones go first. */
	placeFor(item: Item, level: Level): number {
		const rank = RANK[level];
		return 1 + this.queue(item).filter(({ part }) => RANK[part.level] <= rank).length;
	}
}
