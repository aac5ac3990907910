import type { Question } from './pull-choices';
import { goTogether, haulOf, type Donor, type Haul } from './pull-donor';

/**
 * Makes a plan that can be carried out from a set that may be too much: keeps what fits, dearest
 * minute first, then adds what else pays. Only a start for the search: good is enough.
 */
export function guessFrom(
	chosen: readonly boolean[],
	question: Question,
	donor: Donor,
	limit: number
): Haul {
	const all = question.choices.flatMap(({ keeps }, at) => (keeps === null ? [] : [{ keeps, at }]));
	let haul = haulOf([], donor);
	const worth = (part: number) => donor.net[part]! / (donor.minutes[part]! + 1);
	const fits = (part: number) => {
		const more = haulOf([...haul.kept, part], donor);
		return more.minutes <= limit && goTogether(more, donor) ? more : null;
	};
	const first = all.filter(({ at }) => chosen[at]).map(({ keeps }) => keeps);
	for (const part of first.sort((a, b) => worth(b) - worth(a))) haul = fits(part) ?? haul;
	haul = better(withoutLosers(haul, donor), haulOf([], donor));
	for (const { keeps } of all.sort((a, b) => worth(b.keeps) - worth(a.keeps))) {
		if (haul.kept.has(keeps)) continue;
		haul = better(haul, fits(keeps));
	}
	return haul;
}

function better(haul: Haul, other: Haul | null): Haul {
	return other && other.cents > haul.cents ? other : haul;
}

// what does not pay for the minutes that only it needs goes again
function withoutLosers(haul: Haul, donor: Donor): Haul {
	for (const part of haul.kept) {
		haul = better(
			haul,
			haulOf(
				[...haul.kept].filter((each) => each !== part),
				donor
			)
		);
	}
	return haul;
}
