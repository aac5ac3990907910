import { whyNotStock } from '$lib/parts/keeping';
import { causeSaid, chanceGood, isCauseId, type ChanceGood } from '$lib/trade';
import type { Policy } from '$lib/people/policy';
import type { Context } from '../context';
import type { donor } from '../donors/tables';
import { getPolicy } from '../people';

type Dead = Pick<typeof donor.$inferSelect, 'cause' | 'secondCause' | 'sureness'>;

const causeOf = (id: string | null | undefined) => (id && isCauseId(id) ? id : null);

/**
 * The chance that a kind is good before any test, by what killed its donor (null: old stock) and the shop's
 * own figures; `never` says why it cannot become stock.
 */
export const chanceOn = async (ctx: Context, kindId: string, donor: Dead | null) =>
	chanceBy(await getPolicy(ctx), kindId, donor);

/** The same for many kinds under a policy that was read once. */
export function chanceBy(
	{ chances, proofOdds }: Pick<Policy, 'chances' | 'proofOdds'>,
	kindId: string,
	donor: Dead | null
): ChanceGood & { never: string | null } {
	const cause = causeOf(donor?.cause);
	const secondCause = causeOf(donor?.secondCause);
	const sureness = donor?.sureness ?? null;
	const good = chanceGood({ kindId, cause, secondCause, sureness, proofs: [], chances, proofOdds });
	const said = [cause, secondCause].flatMap((id) => (id ? [causeSaid(id)] : [])).join('; ');
	return { ...good, never: whyNotStock(kindId, good.ruined, said || 'not known') };
}
