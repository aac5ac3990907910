import type { Plan } from '$lib/find/plan';
import type { StillOnDonor } from '$lib/find/view';
import { sayEngine, sayNumber } from '$lib/donors/reference';
import { whyNotStock } from '$lib/parts/keeping';
import {
	chanceLevel,
	findKind,
	isCauseId,
	kindsOn,
	minutesToPull,
	type EngineClass,
	type Fitting,
	type Kind
} from '$lib/trade';

/** An open donor as the database's own search gives it. */
export interface OpenDonor {
	number: number;
	maker: string;
	model: string;
	class: EngineClass;
	fittings: Fitting[];
	state: string;
	cause: string | null;
	secondCause: string | null;
	/** The words name its engine. */
	named: boolean;
	/** Kinds that were logged off it. */
	logged: string[];
}

const MOST = 8;

/** The kinds that donors are asked about; a filter counts before words. */
export const askedKinds = (plan: Plan, kind: string | undefined): Kind[] =>
	(kind ? [kind] : plan.kinds).map(findKind).filter((one) => one !== null);

/** The kinds that are still there, a piece having gone with its whole. */
function left({ class: engineClass, fittings, logged }: OpenDonor): string[] {
	const gone = new Set(logged);
	return kindsOn(engineClass, fittings)
		.filter((each) => !gone.has(each.id) && !(each.partOf && gone.has(each.partOf)))
		.map((each) => each.id);
}

/** Whether what killed the donor left something of the kind that may be stock. */
function mayBeStock(kind: string, { cause, secondCause }: OpenDonor): boolean {
	const ruined = [cause, secondCause].some(
		(id) => id && isCauseId(id) && chanceLevel(kind, id) === 'ruined'
	);
	return whyNotStock(kind, ruined, '') === null;
}

function stillOn(donor: OpenDonor, asked: readonly Kind[]): StillOnDonor | null {
	const present = left(donor);
	const first = asked.find(({ id }) => present.includes(id) && mayBeStock(id, donor));
	if (!first) return null;
	return {
		number: sayNumber(donor.number),
		engine: sayEngine(donor),
		minutes: minutesToPull(first.id, present),
		kind: first.id,
		kindName: first.name,
		state: donor.state
	};
}

/** Donors not yet taken apart that still carry one of the kinds asked for, the quickest to pull first. */
export function donorsWith(open: readonly OpenDonor[], asked: readonly Kind[]): StillOnDonor[] {
	const named = open.filter((donor) => donor.named);
	const found = (named.length > 0 ? named : open).map((donor) => stillOn(donor, asked));
	return found
		.filter((one) => one !== null)
		.sort((a, b) => a.minutes - b.minutes)
		.slice(0, MOST);
}
