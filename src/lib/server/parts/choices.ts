import { choicesOf } from '$lib/parts/choices';
import type { ChoicesView, GivenFigures } from '$lib/parts/choices-view';
import { planOf } from '$lib/parts/plan';
import { may } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { isCauseId } from '$lib/trade';
import { inShop, type Context } from '../context';
import { donorRow } from '../donors';
import { toPlan } from './plan';

const causeOf = (id: string | null) => (id && isCauseId(id) ? id : null);

/** Fix, park, strip, sell whole or scrap: the figures of each for a donor as it stands, best first. */
export const choicesFor = (
	ctx: Context,
	donorRef: string,
	given: GivenFigures = {}
): Promise<ChoicesView> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, donorRef);
		if (!donor.engineClass)
			throw new Refused('gate', 'Say the class of the engine first: its figures follow from it.');
		const { policy, season, subjects, engineClass } = await toPlan(tx, ctx, donor);
		const asked = {
			engineClass,
			cause: causeOf(donor.cause),
			secondCause: causeOf(donor.secondCause),
			family: policy.families[donor.engineKey] ?? 'some',
			subjects,
			stripTotalCents: planOf(subjects, policy, season).totalCents
		};
		const view = choicesOf(asked, policy, season, given);
		return may(ctx.role, 'see terms') ? view : { ...view, figures: null };
	});
