import { readTag, TAG_LENGTH } from '$lib/codes';
import { engineKey } from '$lib/codes/number';
import { donorNumber } from '$lib/donors/reference';
import { gradeNo, priceRange, proofRange, saidFilters, standsNo } from '$lib/find/filters';
import type { FindQuery } from '$lib/find/input';
import type { Plan } from '$lib/find/plan';
import { soughtBy } from '$lib/find/sought';
import { shareFor } from '$lib/parts/learned';
import type { ShopFigures } from '$lib/parts/learned-view';
import { GRADES } from '$lib/parts/words';
import { kinds } from '$lib/trade';

/** What asked prices are worked out by, as the search function takes it. */
const pricing = (policy: ShopFigures) => [
	...GRADES.map((grade) => shareFor(grade, policy)),
	...[policy.copyCap, policy.stepLimitCents, policy.stepLowCents, policy.stepHighCents]
];
const byName = Object.fromEntries(
	[...kinds].sort((a, b) => a.name.localeCompare(b.name)).map(({ id }, at) => [id, at])
);

function prices(plan: Plan, query: FindQuery) {
	const said = saidFilters(plan, query).price;
	if (said) return { f_low: said.low, f_high: said.high };
	if (!query.price) return {};
	const range = priceRange(query.price);
	return range ? { f_low: range.low, f_high: range.high } : { f_unpriced: true };
}

function only(plan: Plan, query: FindQuery) {
	const said = saidFilters(plan, query);
	const grade = query.grade ?? said.grade;
	const proof = query.proof ?? said.proof;
	const [proofLow, proofHigh] = proof ? proofRange(proof) : [];
	const bin = query.bin ? readTag(query.bin) : {};
	return {
		f_kind: query.kind,
		f_grade: grade ? gradeNo(grade) : undefined,
		f_stands: query.state ? standsNo(query.state) : undefined,
		f_place: query.bin?.toUpperCase(),
		f_bin_tag: 'tag' in bin ? bin.tag : undefined,
		f_engine: query.engine ? engineKey(query.engine) : undefined,
		...prices(plan, query),
		f_proof_low: proofLow,
		f_proof_high: proofHigh,
		f_same: query.same
	};
}

/** The donor that the filter names, else the one that was typed; its box may be named by its tag. */
function donor(plan: Plan, query: FindQuery) {
	if (!query.donor) return { donor: plan.donorNumber };
	const read = readTag(query.donor);
	return {
		donor: donorNumber(query.donor.replace(/^d0+/i, 'D')) ?? 0,
		box_tag: 'tag' in read ? read.tag : undefined
	};
}

/** A question as the database's own search takes it. */
export function questionOf(
	shopId: number,
	plan: Plan,
	query: FindQuery,
	policy: ShopFigures
): string {
	const { text, tag, nearTags, numberKey, doubtful, bin, kinds: named, engine } = plan;
	const { strict, strictWord, loose, looseWord, ...sought } = soughtBy(shopId, plan);
	const [afterOrd, afterId] = query.cursor?.split('.') ?? [];
	return JSON.stringify({
		...sought,
		needs: strict,
		needs_word: strictWord,
		near: loose,
		near_word: looseWord,
		number: numberKey,
		doubtful: doubtful?.like,
		run: doubtful?.run,
		tags: tag ? [tag] : [],
		near_tags: nearTags,
		slips: numberKey?.length === TAG_LENGTH && nearTags.length > 0,
		address: text && text.length <= 40 ? text.toUpperCase() : undefined,
		place: bin,
		...donor(plan, query),
		kinds: named,
		engine,
		...only(plan, query),
		policy: pricing(policy),
		most: query.limit,
		together: query.together === 'yes',
		sort: query.sort ?? 'fit',
		down: query.down === 'yes',
		by_name: query.sort === 'kind' ? byName : undefined,
		after_ord: afterOrd,
		after_id: afterId
	});
}
