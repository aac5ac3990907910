import { isSafeToStore, SAFE_TICKS } from '$lib/trade';
import { sayDay } from './day';
import type { DonorState } from './words';

export type DonorMove = 'strip' | 'park' | 'finish' | 'reopen' | 'scrap' | 'sell';

/** What may follow what: the one table of a donor's life. */
const MOVES: Record<DonorMove, Partial<Record<DonorState, DonorState>>> = {
	strip: { whole: 'on the bench', parked: 'on the bench' },
	park: { whole: 'parked' },
	finish: { 'on the bench': 'stripped', parked: 'stripped' },
	reopen: { stripped: 'on the bench', parked: 'whole' },
	scrap: { whole: 'gone', parked: 'gone', stripped: 'gone' },
	sell: { whole: 'gone', parked: 'gone', 'on the bench': 'gone', stripped: 'gone' }
};

export interface GateDonor {
	state: DonorState;
	cause: string | null;
	safeTicks: readonly string[];
	/** The owner passed the release that stands, with a reason. */
	gateOverruled?: boolean;
}

export interface GateRelease {
	holdUntil: string | null;
}

export interface Gate {
	gate: 'cause' | 'release' | 'hold' | 'safe';
	said: string;
	/** The owner may pass it with a reason. */
	overrulable: boolean;
}

/** The state that a move leads to, or null when it does not start here. */
export const afterMove = (state: DonorState, move: DonorMove): DonorState | null =>
	MOVES[move][state] ?? null;

/** Why a move does not start from a state. */
export function noMoveSaid(state: DonorState, move: DonorMove): string {
	const from = Object.keys(MOVES[move]).join(' or ');
	return `It is ${state}. Only a donor that is ${from} can do this.`;
}

/** The release and its hold date, before the engine or anything off it may be stripped, sold or scrapped. */
export function releaseGate(
	{ gateOverruled }: Pick<GateDonor, 'gateOverruled'>,
	release: GateRelease | null,
	today: string
): Gate[] {
	if (gateOverruled) return [];
	if (!release)
		return [
			{
				gate: 'release',
				said: 'Record the release first: nobody has said yet that it may be taken apart.',
				overrulable: true
			}
		];
	const { holdUntil } = release;
	if (holdUntil === null || holdUntil <= today) return [];
	const said = `Hold date is ${sayDay(holdUntil, today)}: not before then.`;
	return [{ gate: 'hold', said, overrulable: true }];
}

/**
 * The gates before stripping that are still shut, each with what opens it.
 * In: the donor, the newest release or null, the day it is in the shop. Out: empty when it may be stripped.
 */
export function gatesShut(donor: GateDonor, release: GateRelease | null, today: string): Gate[] {
	const gates = releaseGate(donor, release, today);
	if (donor.cause === null || donor.cause === 'unknown')
		gates.push({ gate: 'cause', said: 'Name the cause of death first.', overrulable: false });
	if (!isSafeToStore(donor.safeTicks)) {
		const left = SAFE_TICKS.filter((tick) => !donor.safeTicks.includes(tick.id));
		const said = `Make it safe first: ${left.map((tick) => tick.said).join(', ')}.`;
		gates.push({ gate: 'safe', said, overrulable: false });
	}
	return gates;
}

/**
 * Whether a part may be pulled: from a donor on the bench, or from a parked one whose release is in order.
 * In: the donor, the newest release or null, the day it is in the shop. Out: true, or why not.
 */
export function canPull(
	donor: GateDonor,
	release: GateRelease | null,
	today: string
): true | string {
	if (donor.state === 'on the bench') return true;
	if (donor.state !== 'parked')
		return `The donor is ${donor.state}. Put it on the bench before pulling parts.`;
	return releaseGate(donor, release, today)[0]?.said ?? true;
}

/** The state that a donor's events lead to; equal to its row at all times. */
export const replay = (events: { toState: string | null }[]): string | null =>
	events.reduce<string | null>((state, event) => event.toState ?? state, null);
