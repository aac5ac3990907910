import { gatesShut, type GateDonor, type GateRelease } from './state';
import { missingShots, SHOT_SAID } from './shots';
import type { DonorShot } from './words';

export interface Todo {
	id: 'cause' | 'release' | 'hold' | 'safe' | 'photos' | 'review';
	said: string;
}

const SHORT = {
	cause: 'Name the cause of death',
	release: 'Record the release',
	safe: 'Make it safe',
	hold: ''
};

/** What is still to be done for a donor before and beside stripping; empty once it is gone or stripped. */
export function todoOf(
	donor: GateDonor & { reviewOn?: string | null },
	release: GateRelease | null,
	shots: readonly DonorShot[],
	today: string
): Todo[] {
	if (donor.state === 'stripped' || donor.state === 'gone') return [];
	const todo: Todo[] = gatesShut(donor, release, today).map(({ gate, said }) => ({
		id: gate,
		said: SHORT[gate] || said
	}));
	if (donor.state === 'parked' && donor.reviewOn && donor.reviewOn <= today)
		todo.push({ id: 'review', said: 'Parked long: strip it, sell it or scrap it' });
	const missing = missingShots(shots);
	if (missing.length > 0) {
		const said = `Photos: ${missing.map((shot) => SHOT_SAID[shot]).join(', ')}`;
		todo.push({ id: 'photos', said });
	}
	return todo;
}
