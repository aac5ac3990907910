import { DEFAULT_POLICY } from '$lib/people/policy';
import { assign } from './assignment';
import { Books, discount } from './books';
import type { Item } from './market';
import type { Scenario } from './scenario';
import { minuteRate, seasonAt, WEEKS } from './season';
import type { BenchPart, Call, World } from './world';

/** A part that is good and stays sold, with when it could come off its donor. */
interface Sound {
	part: BenchPart;
	ready: number;
}

const rateAt = (at: number, { calendar }: Scenario): number =>
	minuteRate(seasonAt(Math.floor(at * WEEKS + 1e-9), calendar));

/** The first week outside the rush after it came in. */
function readyAt(at: number, { calendar }: Scenario): number {
	let week = Math.ceil(at * WEEKS);
	while (seasonAt(week, calendar) === 'rush') week++;
	return week / WEEKS;
}

const saleAt = ({ part, ready }: Sound, call: Call): number | null => {
	if (call.at > ready) return call.at < part.diesAt ? call.at : null;
	return call.takes && call.openUntil > ready ? ready : null;
};

/** Writes into the books what this part brings with this call; says what it is worth together. */
function book(sound: Sound, call: Call, scenario: Scenario, books: Books): number {
	const at = saleAt(sound, call);
	if (at === null) return 0;
	const { item, level } = sound.part;
	const { kind } = item;
	const later = kind.cleanMinutes + kind.testMinutes;
	const now = rateAt(sound.ready, scenario);
	const cheaper =
		kind.cleanKeeps && now * discount(sound.ready) < rateAt(at, scenario) * discount(at);
	books.work(sound.ready, kind.pullMinutes + DEFAULT_POLICY.keepMinutes, now);
	if (cheaper) books.work(sound.ready, later, now);
	else books.work(at, later, rateAt(at, scenario));
	books.stood(sound.ready, at, item.shelfCents);
	books.flow(at, item.usedCents[level] * call.pays - kind.kitCents);
	books.flow(sound.ready, -item.scrapCents);
	return books.since(0);
}

function byItem<Value>(values: readonly Value[], itemOf: (value: Value) => Item) {
	const found = new Map<Item, Value[]>();
	for (const value of values) {
		const item = itemOf(value);
		found.set(item, [...(found.get(item) ?? []), value]);
	}
	return found;
}

function sounds({ donors, scenario, years }: World, books: Books): Sound[] {
	return donors.flatMap(({ at, parts }) => {
		const ready = readyAt(at, scenario);
		for (const { item } of parts) books.scrap(Math.min(ready, years), item.scrapCents);
		if (ready >= years) return [];
		return parts
			.filter(({ good, comesBack, diesAt }) => good && !comesBack && diesAt > ready)
			.map((part) => ({ part, ready }));
	});
}

/**
 * The bound that nobody can reach: knows which part is good, when it dies and who will call, pulls
 * exactly what will be sold at its own minutes, and is held up by no bench, shelf or access.
 */
export function clairvoyant(world: World): Books {
	const years = world.years + world.sellOff;
	const books = new Books(years);
	const calls = byItem(world.calls, ({ item }) => item);
	for (const [item, group] of byItem(sounds(world, books), ({ part }) => part.item)) {
		const asked = calls.get(item) ?? [];
		const worth = (sound: Sound, call: Call) =>
			Math.max(0, book(sound, call, world.scenario, new Books(years)));
		const taken = assign(asked.map((call) => group.map((sound) => worth(sound, call))));
		asked.forEach((call, row) => {
			const sound = group[taken[row] ?? -1];
			if (!sound) return;
			book(sound, call, world.scenario, books);
			books.logged++;
			books.fates.sold++;
		});
	}
	return books;
}
