import { whyNotStock } from '$lib/parts/keeping';
import { causeSaid, chanceGood, isCauseId, type ChanceGood } from '$lib/trade';
import { chancesFor } from '$lib/parts/learned';
import type { ShopFigures } from '$lib/parts/learned-view';
import type { Context } from '../context';
import type { donor } from '../donors/tables';
import { figuresFor } from './figures';

type Dead = Pick<typeof donor.$inferSelect, 'cause' | 'secondCause' | 'sureness'>;

const causeOf = (id: string | null | undefined) => (id && isCauseId(id) ? id : null);

/**
 * The chance that a kind is good before any test, by what killed its donor (null: old stock), the shop's
 * own figures and its history; `never` says why it cannot become stock.
 */
export const chanceOn = async (ctx: Context, kindId: string, donor: Dead | null) =>
	chanceBy(await figuresFor(ctx, [kindId]), kindId, donor);

/** The same for many kinds under figures that were read once. */
export function chanceBy(
	figures: Pick<ShopFigures, 'chances' | 'proofOdds' | 'taught'>,
	kindId: string,
	donor: Dead | null
): ChanceGood & { never: string | null } {
	const cause = causeOf(donor?.cause);
	const secondCause = causeOf(donor?.secondCause);
	const sureness = donor?.sureness ?? null;
	const chances = chancesFor(kindId, figures);
	const { proofOdds } = figures;
	const good = chanceGood({ kindId, cause, secondCause, sureness, proofs: [], chances, proofOdds });
	const said = [cause, secondCause].flatMap((id) => (id ? [causeSaid(id)] : [])).join('; ');
	return { ...good, never: whyNotStock(kindId, good.ruined, said || 'not known') };
}
