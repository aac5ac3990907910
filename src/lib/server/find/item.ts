import { sayNumber } from '$lib/donors/reference';
import type { Plan } from '$lib/find/plan';
import { reasonFor } from '$lib/find/reason';
import type { FoundItem } from '$lib/find/view';
import type { ShopFigures } from '$lib/parts/learned-view';
import { verdictOf } from '$lib/parts/verdict';
import type { VerdictSubject } from '$lib/parts/verdict-view';
import type { Season } from '$lib/people/settings';
import { photoLinks } from '$lib/photos/links';
import { isStale } from '$lib/prices/stale';
import { isCauseId, kind } from '$lib/trade';
import type { FoundPart, Hit } from './answer';

/** What the figures of the shop are when an answer is put into words. */
export interface Said {
	plan: Plan;
	slug: string;
	policy: ShopFigures;
	season: Season;
	now: Date;
}

const causeOf = (id: string | null) => (id && isCauseId(id) ? id : null);

function subjectOf(part: FoundPart, { policy, now }: Said): VerdictSubject {
	const [others, before] = part.queue;
	return {
		kind: part.kind,
		grade: part.grade,
		cause: causeOf(part.cause),
		secondCause: causeOf(part.secondCause),
		sureness: part.sureness,
		proofs: part.proofs ?? [],
		place: before + 1,
		have: others + (part.stands ? 1 : 0),
		price: part.price && {
			...part.price,
			stale: isStale(part.price.seenOn, now, policy.staleDays)
		},
		massGrams: part.mass,
		litres: null,
		bin: { yearlyCostCents: part.binCost, litres: part.binLitres },
		stillOn: false,
		family: policy.families[part.engineKey] ?? 'some',
		engineKey: part.engineKey,
		waiting: false
	};
}

const placeOf = ({ bin, box }: FoundPart) => bin ?? (box === null ? null : `box ${sayNumber(box)}`);

const outOf = (part: FoundPart): FoundItem['out'] =>
	part.state === 'out' && part.outAs
		? { as: part.outAs, to: part.outTo, on: part.changedAt }
		: null;

/** A hit as a list shows it, with its verdict and why it stands there. */
export function itemOf({ part, tier, fits, same, count }: Hit, said: Said): FoundItem {
	const worth = verdictOf(subjectOf(part, said), said.policy, said.season, false);
	const engine = part.donor === null ? part.engine : `${part.maker} ${part.model}`.trim();
	return {
		id: part.id,
		tag: part.tag,
		kind: part.kind,
		kindName: kind(part.kind).name,
		label: part.label,
		grade: part.grade,
		state: part.state,
		bin: placeOf(part),
		donor: part.donor === null ? null : sayNumber(part.donor),
		engine: engine || (part.donor === null ? '' : 'Engine not read yet'),
		askedCents: worth.askedCents,
		copyCents: worth.copyCents,
		newCents: worth.newCents,
		verdict: worth.verdict,
		gainCents: worth.gainCents,
		photo: part.photo === null ? null : photoLinks(said.slug, part.photo).thumb,
		heldBy: part.heldFor,
		heldUntil: part.heldUntil,
		out: outOf(part),
		reason: reasonFor(said.plan, { ...part, tier, fits }),
		group: count > 1 ? { same, count } : null
	};
}
