import { numberKey } from '../codes/number';
import { tokensOf } from '../donors/lexemes';
import type { Plan } from './plan';

/** What a reason is read from. `tier` is how near the part came, 0 to 15. */
export interface Reasonable {
	tier: number;
	fits: boolean | null;
	tag: string;
	numbers: readonly string[];
	label: string;
	note: string;
	serial: string | null;
	cc: number | null;
}

const MOST = 3;

/** The part's own number that answers what was typed. */
function numberReason(
	{ numberKey: asked, doubtful }: Plan,
	{ tier, numbers, serial }: Reasonable
): string | null {
	if (tier === 6 && serial) return `serial ${serial}`;
	const known = numbers.map((said) => ({ said, key: numberKey(said) }));
	const same = known.find(({ key }) => key === asked);
	if (same) return `number ${same.said}`;
	if (tier === 2 && known[0]) return `number ${known[0].said} takes the place of it`;
	const part = known.find(({ key }) => asked && key.includes(asked));
	if (part) return `number ${part.said}`;
	return tier === 4 && doubtful && known[0] ? `number ${known[0].said}` : null;
}

/** Sizes, powers and other words of the question as the part's own words have them. */
function worded(plan: Plan, part: Reasonable): string[] {
	const written = tokensOf([part.label, part.note, ...part.numbers].join(' ; '));
	return plan.needs.flatMap(({ said, near }) => {
		const found = written.find(({ lexeme, pieces }) =>
			near.some((one) => one === lexeme || pieces.includes(one))
		);
		if (found) return [found.said === said ? said : `${found.said} for ${said}`];
		const cc = part.cc === null ? '' : `${Math.round(part.cc)}cc`;
		return cc && near.includes(cc) && said !== cc
			? [`${Math.round(part.cc ?? 0)} cc for ${said}`]
			: [];
	});
}

/** Why a part answers, in a few words; null where its kind and engine say it already. */
export function reasonFor(plan: Plan, part: Reasonable): string | null {
	const tried =
		part.fits === null ? null : part.fits ? 'tried there, fits' : 'tried there, does not fit';
	const tag = part.tier === 10 ? `tag ${part.tag}, one character off` : null;
	const reasons = [tried, tag, numberReason(plan, part), ...worded(plan, part)].filter(Boolean);
	return reasons.length === 0 ? null : [...new Set(reasons)].slice(0, MOST).join('; ');
}
