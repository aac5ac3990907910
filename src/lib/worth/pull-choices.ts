import { goTogether, haulOf, type Donor } from './pull-donor';

/** A yes or no of the plan: taking a group of parts off, keeping one, or both at once. */
export interface Choice {
	/** The part that it keeps; null: it only takes off. */
	keeps: number | null;
	cents: number;
	minutes: number;
	/** Choices that must be a yes for this one to be. */
	needs: number[];
}

/** The whole question: choices in the list's order and pairs that cannot both be a yes. */
export interface Question {
	choices: Choice[];
	clashes: [number, number][];
}

/** Parts that may be worth keeping: with a gain, within the minutes, not spoiled on the way. */
function candidates(donor: Donor, limit: number): number[] {
	return donor.ids.flatMap((_id, part) => {
		if (donor.net[part]! <= 0) return [];
		const alone = haulOf([part], donor);
		return alone.minutes <= limit && goTogether(alone, donor) ? [part] : [];
	});
}

/** Parts that need one another come off together: the lowest number stands for the group. */
function groups(donor: Donor, relevant: Set<number>): Map<number, number> {
	const leader = (part: number) =>
		Math.min(...[...donor.closures[part]!].filter((each) => donor.closures[each]!.has(part)));
	return new Map([...relevant].map((part) => [part, leader(part)]));
}

interface Group {
	minutes: number;
	needs: Set<number>;
	keepers: number[];
	opens: boolean;
}

function gather(donor: Donor, wanted: number[], leaders: Map<number, number>): Map<number, Group> {
	const found = new Map<number, Group>();
	for (const leader of leaders.values()) {
		found.set(leader, { minutes: 0, needs: new Set(), keepers: [], opens: false });
	}
	for (const [part, leader] of leaders) {
		const group = found.get(leader)!;
		group.minutes += donor.minutes[part]!;
		for (const need of donor.needs[part]!) {
			const other = leaders.get(need)!;
			if (other !== leader) group.needs.add(other);
		}
	}
	for (const part of wanted) found.get(leaders.get(part)!)!.keepers.push(part);
	for (const group of found.values()) for (const need of group.needs) found.get(need)!.opens = true;
	return found;
}

/** Turns a donor into the question that the search answers. What cannot pay is left out. */
export function questionOf(donor: Donor, limit: number): Question {
	const wanted = candidates(donor, limit);
	const leaders = groups(donor, new Set(wanted.flatMap((part) => [...donor.closures[part]!])));
	const found = gather(donor, wanted, leaders);
	const choices: Choice[] = [];
	const off = new Map<number, number>();
	const keep = new Map<number, number>();
	const cost = (group: Group) => -donor.labour * group.minutes;
	for (const [leader, group] of found) {
		const [only] = group.keepers;
		const merged = !group.opens && group.keepers.length === 1 && only !== undefined;
		off.set(leader, choices.length);
		if (merged) keep.set(only, choices.length);
		choices.push({
			keeps: merged ? only : null,
			cents: cost(group),
			minutes: group.minutes,
			needs: []
		});
	}
	for (const [leader, group] of found) {
		choices[off.get(leader)!]!.needs = [...group.needs].map((need) => off.get(need)!);
		for (const part of group.keepers) {
			const at = keep.get(part) ?? choices.length;
			if (at === choices.length) {
				choices.push({ keeps: part, cents: 0, minutes: 0, needs: [off.get(leader)!] });
				keep.set(part, at);
			}
			choices[at]!.cents += donor.net[part]!;
			choices[at]!.minutes += donor.keepMinutes[part]!;
		}
	}
	return { choices, clashes: clashesOf(donor, leaders, off, keep) };
}

function clashesOf(
	donor: Donor,
	leaders: Map<number, number>,
	off: Map<number, number>,
	keep: Map<number, number>
): [number, number][] {
	const pairs = new Map<string, [number, number]>();
	const add = (one: number | undefined, other: number | undefined) => {
		if (one !== undefined && other !== undefined) pairs.set(`${one} ${other}`, [one, other]);
	};
	for (const [part, at] of keep) for (const whole of donor.wholes[part]!) add(at, keep.get(whole));
	for (const [part, leader] of leaders) {
		for (const spoiled of donor.ruins[part]!) add(off.get(leader), keep.get(spoiled));
	}
	return [...pairs.values()];
}
