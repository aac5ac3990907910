import { matchKinds } from '../trade';
import type { KindStillOn } from './view';
import type { PartState } from './words';

export interface KindTile {
	kind: string;
	kindName: string;
	system: string;
	minutes?: number;
	verdict?: KindStillOn['verdict'];
	never?: string | null;
	waitingFor?: string | null;
}

/** The kinds that go by what was typed; what is still on the donor keeps its minutes and verdict. */
export const foundKinds = (typed: string, stillOn: readonly KindStillOn[] = []): KindTile[] =>
	matchKinds(typed)
		.slice(0, 12)
		.map(({ kind }) => {
			const there = stillOn.find((one) => one.kind === kind.id);
			return there ?? { kind: kind.id, kindName: kind.name, system: kind.system };
		});

interface Logged {
	tag: string;
	state: PartState;
	to: string | null;
}

/** What is said when a part was logged: its tag first, it is to be written on the part. */
export function loggedSaid(kindName: string, { tag, state, to }: Logged): string {
	if (state === 'scrapped') return `${kindName} logged as scrap`;
	if (state === 'back') return `${tag}: ${kindName} goes to ${to ?? 'the red bin'}`;
	return `${tag}: ${kindName} kept${to ? `, put in ${to}` : ''}`;
}
