import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Level } from '$lib/trade';
import { pullPlan, type PullPart } from '$lib/worth';
import { appraise } from './appraisal';
import type { Knowledge } from './knowledge';
import type { Item } from './market';
import type { Moment, Rule } from './rule';
import type { Size } from './scenario';
import type { Unit } from './shelf';
import { teardown } from './teardown';
import type { BenchPart, Donor } from './world';

/** The shop that goes by the calculator. */
export class Calculator implements Rule {
	constructor(private readonly knows: Knowledge) {}

	called = (item: Item) => this.knows.called(item);
	tested = (item: Item, level: Level, passed: boolean) => this.knows.tested(item, level, passed);
	sold = (item: Item, level: Level, paid: number, back: boolean) =>
		this.knows.sold(item, level, paid, back);

	private incoming({ item, level }: BenchPart, moment: Moment) {
		const place = moment.shelf.placeFor(item, level);
		const waiting = moment.shelf.queue(item).length === 0 && moment.waiting(item);
		return appraise(this.knows, { item, level, tested: false, place, waiting }, moment);
	}

	/** A gain is never above price times chance: the rest need not be worked out. */
	private cannotPay({ item, level }: BenchPart, { rate }: Moment): boolean {
		const most = this.knows.price(item, level) * this.knows.chance(item, level);
		return most <= rate * DEFAULT_POLICY.keepMinutes;
	}

	/** What the part that would have to make room is worth. */
	private displaced(size: Size, moment: Moment): number {
		if (!moment.shelf.isFull(size)) return 0;
		let least = Infinity;
		for (const { score } of moment.shelf.ofSize(size)) least = Math.min(least, score);
		return Math.max(0, least);
	}

	keep(donor: Donor, alive: readonly BenchPart[], moment: Moment): BenchPart[] {
		const byId = new Map(alive.map((part) => [part.item.kind.id, part]));
		const room = { s: 0, m: 0, l: 0, xl: 0 };
		for (const size of ['s', 'm', 'l', 'xl'] as const) room[size] = this.displaced(size, moment);
		const gains = donor.family.items.map(({ kind }) => {
			const part = byId.get(kind.id);
			if (!part || this.cannotPay(part, moment)) return -1;
			return this.incoming(part, moment).cents - room[kind.size];
		});
		const plan = pullPlan({
			labourNow: moment.rate,
			parts: this.worthAsking(donor, gains, moment)
		});
		return plan.order.flatMap(({ id, keep }) => (keep ? (byId.get(id) ?? []) : []));
	}

	/** The parts that may pay with what stands before them; the others cannot be in any plan. */
	private worthAsking({ family }: Donor, gains: readonly number[], { rate }: Moment): PullPart[] {
		const keepMinutes = DEFAULT_POLICY.keepMinutes;
		const { needs } = teardown(family);
		const asked = new Set<number>();
		gains.forEach((cents, place) => {
			if (cents > rate * keepMinutes) needs[place]?.forEach((need) => asked.add(need));
		});
		return family.items.flatMap(({ kind: { id, behind, partOf, pullMinutes } }, place) =>
			asked.has(place)
				? [{ id, behind, partOf, minutes: pullMinutes, keepMinutes, gainCents: gains[place] ?? -1 }]
				: []
		);
	}

	cleanNow(part: BenchPart, moment: Moment): boolean {
		return this.incoming(part, moment).cleanNow;
	}

	private score(unit: Unit, place: number, moment: Moment): number {
		const { item, level } = unit.part;
		unit.score = appraise(
			this.knows,
			{ item, level, tested: unit.tested, place, waiting: false },
			moment
		).cents;
		unit.scored = true;
		return unit.score;
	}

	drop(units: readonly Unit[], moment: Moment): Unit {
		for (const unit of units)
			if (!unit.scored)
				this.score(unit, 1 + moment.shelf.queue(unit.part.item).indexOf(unit), moment);
		return units.reduce((least, unit) => (unit.score < least.score ? unit : least));
	}

	purge(moment: Moment): Unit[] {
		const items = new Set(moment.shelf.all().map(({ part }) => part.item));
		return [...items].flatMap((item) => {
			const queue = moment.shelf.queue(item);
			// a part that is let go does not stand before the next
			let place = 1;
			return queue.filter((unit) => {
				const worthless = this.score(unit, place, moment) < 0;
				if (!worthless) place++;
				return worthless;
			});
		});
	}
}
