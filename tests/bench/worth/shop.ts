import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Books } from './books';
import { Counter } from './counter';
import type { Rule } from './rule';
import { minuteRate, seasonAt, WEEKS } from './season';
import { minutesFor, teardown, withoutPieces } from './teardown';
import type { BenchPart, Donor, World } from './world';

const PURGE_EVERY = WEEKS / 2;

/** A shop that lives through a world by a rule, week by week. */
class Shop {
	private readonly counter: Counter;
	private readonly yard: Donor[] = [];

	constructor(
		private readonly world: World,
		private readonly rule: Rule
	) {
		this.counter = new Counter(world, rule);
	}

	private log(part: BenchPart): void {
		const { counter } = this;
		const { shelf, books, at } = counter;
		books.logged++;
		const tested = counter.benchLeft > 0 && this.rule.cleanNow(part, counter.moment());
		if (tested && !counter.test(part)) return counter.gone(part, at, 'failed');
		shelf.put({ part, tested, since: at, score: 0, scored: false });
		counter.offer(part.item);
		const { size } = part.item.kind;
		while (shelf.isOver(size))
			counter.leave(this.rule.drop([...shelf.ofSize(size)], counter.moment()), 'dropped');
	}

	private scrapRest({ parts }: Donor, kept: ReadonlySet<BenchPart> = new Set()): void {
		const { books, at } = this.counter;
		for (const part of parts) if (!kept.has(part)) books.scrap(at, part.item.scrapCents);
	}

	private strip(donor: Donor): void {
		const off = teardown(donor.family);
		const alive = donor.parts.filter(({ diesAt }) => diesAt > this.counter.at);
		const placeOf = ({ item }: BenchPart) => donor.family.items.indexOf(item);
		const chosen = this.rule.keep(donor, alive, this.counter.moment());
		const places = new Set(withoutPieces(chosen.map(placeOf), off));
		const kept = chosen.filter((part) => places.has(placeOf(part)));
		this.counter.spend(minutesFor(places, off) + kept.length * DEFAULT_POLICY.keepMinutes);
		kept.forEach((part) => this.log(part));
		this.scrapRest(donor, new Set(kept));
	}

	private openBench(week: number): void {
		const { calendar, bench } = this.world.scenario;
		const season = seasonAt(week, calendar);
		this.counter.rate = minuteRate(season);
		// what was overspent is missing the next week; what was not used is lost
		this.counter.benchLeft = Math.min(this.counter.benchLeft, 0) + bench[season];
		if (this.counter.at >= this.world.years) {
			for (const donor of this.yard.splice(0)) this.scrapRest(donor);
			return;
		}
		while (season !== 'rush' && this.counter.benchLeft > 0) {
			const donor = this.yard.shift();
			if (!donor) return;
			this.strip(donor);
		}
	}

	private park(donor: Donor): void {
		this.yard.push(donor);
		const oldest = this.yard.length > this.world.scenario.yard ? this.yard.shift() : undefined;
		if (oldest) this.scrapRest(oldest);
	}

	private bury(until: number): void {
		for (const unit of this.counter.shelf.all())
			if (unit.part.diesAt < until)
				this.counter.leave(unit, 'died', Math.max(unit.part.diesAt, unit.since));
	}

	private purge(): void {
		for (const unit of this.rule.purge(this.counter.moment())) this.counter.leave(unit, 'dropped');
	}

	live(): Books {
		const { calls, donors, years, sellOff } = this.world;
		const { counter } = this;
		let nextCall = 0;
		let nextDonor = 0;
		for (let week = 0; week < (years + sellOff) * WEEKS; week++) {
			const end = (week + 1) / WEEKS;
			counter.at = week / WEEKS;
			if (week % PURGE_EVERY === 0) this.purge();
			this.openBench(week);
			for (let call = calls[nextCall]; call && call.at < end; call = calls[++nextCall])
				counter.take(call);
			counter.at = end;
			for (let donor = donors[nextDonor]; donor && donor.at < end; donor = donors[++nextDonor])
				this.park(donor);
			this.bury(end);
		}
		// with nothing sold off, the last donors still stand in the yard
		this.yard.forEach((donor) => this.scrapRest(donor));
		for (const unit of counter.shelf.all()) counter.leave(unit, 'left over');
		return counter.books;
	}
}

/** What became of the shop's money, minutes and parts. */
export const live = (world: World, rule: Rule): Books => new Shop(world, rule).live();
