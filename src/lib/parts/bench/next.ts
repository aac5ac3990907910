import type { BenchAnswer } from './answer';
import type { BenchKind, BenchView } from './view';

/** An answer that the server has not confirmed yet. */
export interface Pending {
	key: string;
	answer: BenchAnswer;
}

/** What stands on the bench once the answers that are still on their way count too. */
export function stillOn(view: BenchView, pending: readonly Pending[]): BenchKind[] {
	const answered = new Set(pending.map(({ answer }) => answer.kind));
	return view.kinds.filter(({ kind }) => !answered.has(kind));
}

/**
 * The kind to show. One that the person chose or has before them stays until it is answered, whatever
 * comes in meanwhile, so that no tap meets another part than the one that was read; then the plan's next.
 */
export function shown(
	kinds: readonly BenchKind[],
	before: string | null
): { next: BenchKind | null; gone: boolean } {
	const stays = kinds.find(({ kind }) => kind === before);
	if (stays) return { next: stays, gone: false };
	return { next: planned(kinds)[0] ?? null, gone: before !== null };
}

/** What the plan still has to take off, in the order of work; pieces go with their whole. */
export const planned = (kinds: readonly BenchKind[]): BenchKind[] =>
	kinds.filter(({ plan, goesWith }) => plan !== null && goesWith === null);

export interface Group {
	title: string;
	kinds: BenchKind[];
}

/** All that is still on, by where the bench looks for it. */
export function groupsOf(kinds: readonly BenchKind[], offMachine: string): Group[] {
	const pieces = kinds.filter(({ plan, goesWith }) => plan !== null && goesWith !== null);
	const onEngine = kinds.filter(({ machine, plan }) => !machine && plan === null);
	const machine = kinds.filter((one) => one.machine && one.plan === null);
	return [
		{ title: 'On the plan', kinds: planned(kinds) },
		{ title: 'Pieces that go with their whole', kinds: pieces },
		{ title: 'Below the stop line', kinds: onEngine },
		{
			title: offMachine ? `Off the machine: ${offMachine}` : 'Off the machine it came from',
			kinds: machine
		}
	].filter((group) => group.kinds.length > 0);
}
