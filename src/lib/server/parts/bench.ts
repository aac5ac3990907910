import type { BenchView } from '$lib/parts/bench/view';
import { plannable, planOf } from '$lib/parts/plan';
import { canPull } from '$lib/donors/state';
import { sayEngine, sayNumber } from '$lib/donors/reference';
import { causeSaid, isCauseId, type EngineClass } from '$lib/trade';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow, getTriage, newestRelease, todayIn, type DonorRow } from '../donors';
import { benchKind, type OnBench } from './bench-kinds';
import { partsDone } from './bench-done';
import { kindsLeftOn, withoutLeftOn } from './left-on';
import { offDonor } from './off-donor';
import { kindsThere } from './still-on';
import { part } from './tables';
import { kindSubjects } from './verdicts';

async function onBench(
	tx: Tx,
	ctx: Context,
	donor: DonorRow,
	left: readonly string[],
	minutes: number | null
): Promise<OnBench> {
	const ids = (await kindsThere(tx, ctx, donor)).map(({ id }) => id);
	const { subjects, ...shop } = await kindSubjects(ctx, donor.id, ids);
	const counted = withoutLeftOn([...subjects.values()], left);
	const engineClass = donor.engineClass as EngineClass;
	const plan = planOf(plannable(counted, engineClass), shop.policy, shop.season, minutes);
	const { inPlace } = await getTriage(ctx, sayNumber(donor.number));
	return { ...shop, donor, ids, subjects, plan, inPlace };
}

const worth = (cents: number | null) => cents ?? -Infinity;

/** The plan's own order, then what stays on, most worthwhile first, never-reuse kinds last. */
function inOrder(bench: OnBench, left: readonly string[]) {
	const steps = new Map(bench.plan.order.map((step, at) => [step.id, { step, at }]));
	const kinds = bench.ids
		.filter((id) => !left.includes(id) || steps.has(id))
		.map((id) => ({ at: steps.get(id)?.at, one: benchKind(id, bench, steps.get(id)?.step) }));
	return kinds
		.sort(
			(a, b) =>
				(a.at ?? Infinity) - (b.at ?? Infinity) ||
				Number(a.one.never !== null) - Number(b.one.never !== null) ||
				worth(b.one.gainCents) - worth(a.one.gainCents) ||
				0
		)
		.map(({ one }) => one);
}

const causesOf = ({ cause, secondCause }: DonorRow) =>
	[cause, secondCause].flatMap((one) => (one && isCauseId(one) ? [causeSaid(one)] : []));

/** A donor as the one who strips it needs it: the plan, what is still on, what came off and what was left. */
export const benchFor = (
	ctx: Context,
	ref: string,
	minutes: number | null = null
): Promise<BenchView> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, ref);
		const leftOn = await kindsLeftOn(tx, ctx, donor.id);
		const left = leftOn.map((one) => one.kind);
		const bench = await onBench(tx, ctx, donor, left, minutes);
		const release = await newestRelease(tx, ctx, donor.id);
		const onPlan = new Set(bench.plan.order.map(({ id }) => id));
		return {
			asOf: ctx.now.toISOString(),
			number: sayNumber(donor.number),
			engine: sayEngine(donor),
			causeSaid: causesOf(donor).join(' and '),
			offMachine: donor.offMachine,
			state: donor.state,
			open: canPull(donor, release, await todayIn(ctx)),
			minutesAtHand: minutes,
			planMinutes: bench.plan.minutes,
			planCents: bench.plan.totalCents,
			kinds: inOrder(bench, left),
			leftOn: leftOn.filter((one) => bench.ids.includes(one.kind) && !onPlan.has(one.kind)),
			done: await partsDone(tx, ctx, donor.id),
			logged: await tx.$count(part, offDonor(ctx, donor.id))
		};
	});
