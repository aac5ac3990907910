import { sayNumber } from '$lib/donors/reference';
import type { Plan } from '$lib/find/plan';
import { reasonFor } from '$lib/find/reason';
import type { FoundItem } from '$lib/find/view';
import type { ShopFigures } from '$lib/parts/learned-view';
import { verdictInShort } from '$lib/parts/verdict-short';
import type { VerdictSubject } from '$lib/parts/verdict-view';
import type { Season } from '$lib/people/settings';
import { photoLinks } from '$lib/photos/links';
import { isCauseId, kind } from '$lib/trade';
import type { Hit } from './answer';

/** What the figures of the shop are when an answer is put into words. */
export interface Said {
	plan: Plan;
	/** Parts that somebody waits for. */
	waited: ReadonlySet<number>;
	slug: string;
	policy: ShopFigures;
	season: Season;
}

const causeOf = (id: string | null) => (id && isCauseId(id) ? id : null);

/** A list shows the word, the gain and the price: where a price was seen says nothing there. */
const priceOf = ({ newCents, copyCents }: Hit) =>
	newCents === null ? null : { newCents, copyCents, source: '', seenOn: '', stale: false };

const subjectOf = (part: Hit, { policy, waited }: Said): VerdictSubject => ({
	kind: part.kind,
	grade: part.grade,
	cause: causeOf(part.cause),
	secondCause: causeOf(part.secondCause),
	sureness: part.sureness,
	proofs: part.proofs ?? [],
	place: part.before + 1,
	have: part.before + 1,
	price: priceOf(part),
	massGrams: part.mass,
	litres: null,
	bin: null,
	stillOn: false,
	family: policy.families[part.engineKey] ?? 'some',
	engineKey: part.engineKey,
	waiting: waited.has(part.id)
});

const outOf = (part: Hit): FoundItem['out'] =>
	part.state === 'out' && part.outAs
		? { as: part.outAs, to: part.outTo, on: part.changedAt }
		: null;

/** A hit as a list shows it, with its verdict and why it stands there. */
export function itemOf(part: Hit, said: Said): FoundItem {
	const { verdict, gainCents, askedCents } = verdictInShort(
		subjectOf(part, said),
		said.policy,
		said.season
	);
	const engine = part.donor === null ? part.engine : `${part.maker} ${part.model}`.trim();
	return {
		id: part.id,
		tag: part.tag,
		kind: part.kind,
		kindName: kind(part.kind).name,
		label: part.label,
		grade: part.grade,
		state: part.state,
		bin: part.bin,
		donor: part.donor === null ? null : sayNumber(part.donor),
		engine: engine || (part.donor === null ? '' : 'Engine not read yet'),
		askedCents,
		copyCents: part.copyCents,
		newCents: part.newCents,
		verdict,
		gainCents,
		photo: part.photo === null ? null : photoLinks(said.slug, part.photo).thumb,
		heldBy: part.heldFor,
		setMissing: part.missing ?? '',
		heldUntil: part.heldUntil,
		out: outOf(part),
		reason: reasonFor(said.plan, part),
		group: part.count > 1 ? { same: part.same, count: part.count } : null
	};
}
