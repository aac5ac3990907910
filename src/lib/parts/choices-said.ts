import { percent } from '$lib/format';
import type { ChoiceName, DecisionInput, Tip } from '$lib/worth';
import type { ChoicesView } from './choices-view';

type Say = (cents: number) => string;

export const CHOICE_SAID: Record<ChoiceName, string> = {
	fix: 'Fix',
	park: 'Park',
	strip: 'Strip',
	whole: 'Sell whole',
	scrap: 'Scrap'
};

const DOING: Record<ChoiceName, string> = {
	fix: 'fixing',
	park: 'parking',
	strip: 'stripping',
	whole: 'selling it whole',
	scrap: 'scrapping'
};

/** What tips the choice, as the end of a sentence; what a shop cannot change is not said. */
const UNTIL: Partial<Record<keyof DecisionInput, string>> = {
	newPartsCents: 'until the repair costs',
	fixedPriceCents: 'until it would sell running for',
	wholePriceCents: 'until somebody pays for it dead',
	fixChance: 'until the chance that the repair holds is',
	stripTotalCents: 'until its parts bring',
	yardCents: 'until two years in the yard cost'
};

/** A price beyond any engine tips nothing. */
const DEAREST = 1_000_000_00;

function tipSaid({ input, at, choice, when }: Tip, best: ChoiceName, say: Say): string | null {
	const until = UNTIL[input];
	if (!until || at <= 0 || at > DEAREST) return null;
	const share = input === 'fixChance';
	const bound = share ? percent(at) : say(Math.round(at));
	const side = when === 'above' ? 'over' : 'under';
	const first = DOING[best].charAt(0).toUpperCase() + DOING[best].slice(1);
	return `${first} beats ${DOING[choice]} ${until} ${side} ${bound}.`;
}

/** What would tip the choice, the cost of the repair first: one sentence for each rival. */
export function tipsSaid(view: ChoicesView, say: Say): string[] {
	const best = view.choices[0]?.choice ?? 'scrap';
	const inputs = Object.keys(UNTIL).filter((input) => input !== 'newPartsCents');
	const tips = [
		...view.repairTips,
		...inputs.flatMap((input) => view.tips.filter((tip) => tip.input === input))
	];
	const said = new Map<ChoiceName, string>();
	for (const tip of tips) {
		const words = tipSaid(tip, best, say);
		if (words && !said.has(tip.choice)) said.set(tip.choice, words);
	}
	return [...said.values()];
}

/** Every choice with what it is made of. */
export function choiceRows(figures: DecisionInput, say: Say) {
	const row = (what: string, value: string, source: string) => ({ what, value, source });
	const less = (cents: number) => say(-cents);
	return [
		row('Chance that the repair holds', percent(figures.fixChance), 'Fix'),
		row('Sold running', say(figures.fixedPriceCents), 'Fix'),
		row('A buyer of the running engine comes in time', percent(figures.fixReach), 'Fix'),
		row('New parts', less(figures.newPartsCents), 'Fix'),
		row('Labour of the repair', less(figures.labourCents), 'Fix'),
		row('Its parts, each pulled when somebody calls', say(figures.parkCents), 'Park'),
		row('Yard until it is looked at again', less(figures.yardCents), 'Park, two years'),
		row('Best set of parts, pulled now', say(figures.stripTotalCents), 'Strip'),
		row('Sold dead, as it stands', say(figures.wholePriceCents), 'Sell whole'),
		row('A buyer of the dead engine comes in time', percent(figures.wholeReach), 'Sell whole'),
		row('Handling', less(figures.handlingCents), 'Sell whole'),
		row('Scrap of all of it', say(figures.scrapAllCents), 'Fix that fails, park, strip, scrap')
	];
}
