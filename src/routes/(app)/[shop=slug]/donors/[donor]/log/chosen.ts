import { limitsOf } from '$lib/parts/limits';
import type { getDonor } from '$lib/server/donors';
import { binsFor, chanceOn } from '$lib/server/parts';
import { getPolicy } from '$lib/server/people';
import { checklist, isCauseId, kind, setOf, testFields, whyChance } from '$lib/trade';

type Ctx = Parameters<typeof chanceOn>[0];
type Donor = Awaited<ReturnType<typeof getDonor>>;

/** All that is said of the kind that is about to be logged off a donor. */
export async function chosenKind(ctx: Ctx, id: string, donor: Donor) {
	const { name, system, howTested } = kind(id);
	const { chance, level, never } = await chanceOn(ctx, id, donor);
	const why = donor.cause && isCauseId(donor.cause) ? whyChance(id, donor.cause) : null;
	return {
		kind: id,
		kindName: name,
		system,
		howTested,
		chance,
		level,
		never,
		why,
		bins: await binsFor(ctx, id),
		checklist: checklist(id),
		set: setOf(id),
		fields: testFields(id, limitsOf(await getPolicy(ctx), id))
	};
}
