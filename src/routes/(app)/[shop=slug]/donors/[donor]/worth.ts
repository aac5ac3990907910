import type { DonorView } from '$lib/donors/view';
import { CHOICE_FIELDS } from '$lib/parts/choice-fields';
import { minutesIn, typedFigures } from '$lib/parts/choices-form';
import type { Context } from '$lib/server/context';
import { choicesFor, planFor } from '$lib/server/parts';
import { getShop } from '$lib/server/people';

/** Before it is opened the five choices, on the bench the pull plan for the minutes at hand. */
export async function donorWorth(ctx: Context, donor: DonorView, { searchParams }: URL) {
	const { given, problems } = typedFigures(searchParams, (await getShop(ctx)).currency);
	const unopened = donor.state === 'whole' || donor.state === 'parked';
	const plans = donor.class !== null && donor.state === 'on the bench';
	return {
		choices: donor.class && unopened ? await choicesFor(ctx, donor.number, given) : null,
		figures: {
			problems,
			typed: Object.fromEntries(
				CHOICE_FIELDS.map(({ field }) => [field, searchParams.get(field) ?? ''])
			)
		},
		plan: plans ? await planFor(ctx, donor.number, minutesIn(searchParams)) : null
	};
}
