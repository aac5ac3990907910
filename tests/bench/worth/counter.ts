import { Books, type Fate } from './books';
import type { Item } from './market';
import type { Moment, Rule } from './rule';
import { NORMAL_RATE } from './season';
import { Shelf, type Unit } from './shelf';
import type { BenchPart, Call, World } from './world';

const COMES_BACK_AFTER = 20 / 365;

/** Answers calls from the shelf and keeps the books; the clock is set from outside. */
export class Counter {
	at = 0;
	/** Labour now, cents a minute. */
	rate = NORMAL_RATE;
	/** Minutes left on the bench this week; below nil where more was needed. */
	benchLeft = 0;
	readonly books: Books;
	readonly shelf: Shelf;
	private readonly wants = new Map<Item, Call[]>();

	constructor(
		world: World,
		private readonly rule: Rule
	) {
		this.books = new Books(world.years + world.sellOff);
		this.shelf = new Shelf(world.scenario.places);
	}

	moment(): Moment {
		return {
			at: this.at,
			rate: this.rate,
			shelf: this.shelf,
			waiting: (item) => this.openWants(item).length > 0
		};
	}

	private openWants(item: Item): Call[] {
		return (this.wants.get(item) ?? []).filter(({ openUntil }) => openUntil > this.at);
	}

	leave(unit: Unit, fate: Fate, at = this.at): void {
		this.shelf.take(unit);
		this.gone(unit.part, unit.since, fate, at);
	}

	gone({ item }: BenchPart, since: number, fate: Fate, at = this.at): void {
		this.books.fates[fate]++;
		this.books.stood(since, at, item.shelfCents);
		if (fate !== 'sold') this.books.scrap(at, item.scrapCents);
	}

	spend(minutes: number): void {
		this.benchLeft -= minutes;
		this.books.work(this.at, minutes, this.rate);
	}

	/** Cleans and tests; says whether it is good. */
	test({ item, level, good }: BenchPart): boolean {
		this.spend(item.kind.cleanMinutes + item.kind.testMinutes);
		this.rule.tested(item, level, good);
		return good;
	}

	private sell({ item, level, comesBack }: BenchPart, call: Call): void {
		const paid = item.usedCents[level] * call.pays;
		this.books.flow(this.at, paid - item.kind.kitCents);
		this.rule.sold(item, level, paid, comesBack);
		if (!comesBack) return;
		this.books.comeBacks++;
		this.books.flow(this.at + COMES_BACK_AFTER, -paid - item.comeBackCents);
	}

	private isReady({ part, tested }: Unit): boolean {
		if (!tested) return this.test(part);
		const { cleanKeeps, cleanMinutes } = part.item.kind;
		if (!cleanKeeps) this.spend(cleanMinutes);
		return true;
	}

	/** Goes through the queue until one is good. */
	private answer(call: Call): boolean {
		for (const unit of [...this.shelf.queue(call.item)]) {
			if (unit.part.diesAt <= this.at) continue;
			const ready = this.isReady(unit);
			this.leave(unit, ready ? 'sold' : 'failed');
			if (!ready) continue;
			this.sell(unit.part, call);
			return true;
		}
		return false;
	}

	take(call: Call): void {
		this.at = call.at;
		this.rule.called(call.item);
		if (!this.answer(call)) this.wants.set(call.item, [...this.openWants(call.item), call]);
	}

	/** A part came in: the customers who wait for one are asked in turn. */
	offer(item: Item): void {
		const [first, ...later] = this.openWants(item);
		if (!first) return;
		this.wants.set(item, later);
		if (!first.takes || !this.answer(first)) this.offer(item);
	}
}
