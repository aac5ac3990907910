import { gradesFor } from '$lib/parts/bench/grade';
import type { BenchKind } from '$lib/parts/bench/view';
import { figuresOf } from '$lib/parts/kind-figures';
import { limitsOf } from '$lib/parts/limits';
import type { PlanStep, PlanView } from '$lib/parts/plan-view';
import { stepSaid } from '$lib/parts/plan-said';
import { verdictOf } from '$lib/parts/verdict';
import type { VerdictSubject } from '$lib/parts/verdict-view';
import {
	checklist,
	isCauseId,
	kind,
	minutesToPull,
	setOf,
	standsBefore,
	testFields,
	testsHot,
	whyChance
} from '$lib/trade';
import type { DonorRow } from '../donors';
import type { InPlace } from '../donors/tables';
import { chanceBy } from './chance-on';
import type { Shop } from './verdicts';

export interface OnBench extends Shop {
	donor: DonorRow;
	/** What is still on. */
	ids: readonly string[];
	subjects: ReadonlyMap<string, VerdictSubject>;
	plan: PlanView;
	inPlace: Readonly<Record<string, InPlace>>;
}

const nameOf = (id: string) => kind(id).name;

function why(id: string, { cause, secondCause }: DonorRow): string[] {
	return [cause, secondCause].flatMap((one) => {
		const said = one && isCauseId(one) ? whyChance(id, one) : null;
		return said ? [said] : [];
	});
}

/** What the kind is and needs, whatever the shop counts with. */
function facts(id: string, ids: readonly string[]) {
	const { name, system, ruins = [], howTested, reuse } = kind(id);
	return {
		kind: id,
		kindName: name,
		system,
		machine: system === 'Machine parts (common)',
		minutesAll: minutesToPull(id, ids),
		behind: standsBefore(id, ids).map(nameOf),
		ruins: ruins.filter((each) => ids.includes(each)).map(nameOf),
		howTested: reuse === 'never' ? '' : howTested,
		hot: testsHot(id),
		checklist: checklist(id),
		set: [...setOf(id)]
	};
}

const proofOf = (tried: InPlace | undefined): BenchKind['proof'] =>
	tried ? { how: 'worked in place', ...tried } : null;

/** All that is said at the bench about one kind that is still on. */
export function benchKind(id: string, bench: OnBench, step: PlanStep | undefined): BenchKind {
	const { donor, ids, plan, policy, season, inPlace } = bench;
	const { chance, level, never } = chanceBy(policy, id, donor);
	const subject = bench.subjects.get(id)!;
	const { verdict, gainCents, have, keepUpTo, waitingFor } = verdictOf(
		subject,
		policy,
		season,
		false
	);
	return {
		...facts(id, ids),
		plan: step ? (step.keep ? 'keep' : 'way') : null,
		planSaid: step ? stepSaid(step) : null,
		goesWith: step?.goesWith ?? null,
		pieces: plan.order.filter((each) => each.goesWith === nameOf(id)).map((each) => each.kindName),
		minutes: figuresOf(id, policy).pullMinutes,
		...{ chance, level, never, why: why(id, donor) },
		...{ verdict, gainCents: never ? null : gainCents, have, keepUpTo, waitingFor },
		fields: testFields(id, limitsOf(policy, id)),
		proof: proofOf(inPlace[id]),
		grades: gradesFor(level, kind(id).reuse)
	};
}
