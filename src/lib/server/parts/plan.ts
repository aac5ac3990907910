import { plannable, planOf } from '$lib/parts/plan';
import type { PlanView } from '$lib/parts/plan-view';
import type { EngineClass } from '$lib/trade';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow, type DonorRow } from '../donors';
import { kindsLeftOn, withoutLeftOn } from './left-on';
import { kindsThere } from './still-on';
import { kindSubjects } from './verdicts';

/** The kinds that a plan for this donor counts with, and the figures that it counts by. */
export async function toPlan(tx: Tx, ctx: Context, donor: DonorRow) {
	const ids = (await kindsThere(tx, ctx, donor)).map(({ id }) => id);
	const { subjects, ...shop } = await kindSubjects(ctx, donor.id, ids);
	const engineClass = donor.engineClass as EngineClass;
	const left = (await kindsLeftOn(tx, ctx, donor.id)).map((one) => one.kind);
	const counted = withoutLeftOn([...subjects.values()], left);
	return { ...shop, engineClass, subjects: plannable(counted, engineClass) };
}

/** What to take off a donor in the minutes at hand (null: no limit), as it stands now. */
export const planFor = (
	ctx: Context,
	donorRef: string,
	minutes: number | null = null
): Promise<PlanView> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, donorRef);
		const { subjects, policy, season } = await toPlan(tx, ctx, donor);
		return planOf(subjects, policy, season, minutes);
	});
